import { memo, useMemo } from 'react'
import { Pressable, ScrollView, View } from 'react-native'
import { PaintedMarks } from '@/components/score/painted-marks'
import { createStyles, RULE_PX, space, TOUCH_TARGET_PX, useTheme } from '@/components/theme'
import { Txt } from '@/components/ui'
import { useWords } from '@/components/words'
import { paintRhythm } from '@/shared/notation/rhythm-picture'
import { isReachable, isSameRhythm, type BarDraft, type RhythmChoice } from './bar-draft'

type RowProps = Readonly<{
  draft: BarDraft
  choices: readonly RhythmChoice[]
  /** Each written pitch of the bar, as the student has pitches named. */
  names: readonly (string | null)[]
  onRhythm: (rhythm: RhythmChoice) => void
  onPlace: (place: number) => void
}>

/** The rhythms a bar may have, drawn as notes, and the notes of the one that was chosen: which is written, which is in hand. */
export const RhythmRow = memo(function RhythmRow({ draft, choices, names, onRhythm, onPlace }: RowProps) {
  const words = useWords().desk.rhythm
  const styles = useRowStyles()
  const isKnown = choices.some((known) => isSameRhythm(known, draft.rhythm))
  const offered = isKnown ? choices : [draft.rhythm, ...choices]
  return (
    <View style={styles.rows}>
      {offered.length > 1 ? (
        <ScrollView horizontal showsHorizontalScrollIndicator={false}>
          <View role="radiogroup" aria-label={words.label} style={styles.row}>
            {offered.map((rhythm) => (
              <RhythmButton
                key={words.rhythmSpoken(rhythm.values, rhythm.tieOut)}
                rhythm={rhythm}
                isOn={isSameRhythm(rhythm, draft.rhythm)}
                onPress={() => onRhythm(rhythm)}
              />
            ))}
          </View>
        </ScrollView>
      ) : null}
      {draft.rhythm.values.length > 1 ? (
        <View role="radiogroup" aria-label={words.places} style={styles.row}>
          {draft.rhythm.values.map((value, place) => {
            const isOn = place === draft.place
            const name = names[place] ?? null
            return (
              <Pressable
                key={place}
                role="radio"
                aria-checked={isOn}
                aria-label={words.placeSpoken(value, place, name)}
                disabled={!isReachable(draft, place)}
                onPress={() => onPlace(place)}
                style={[styles.place, isOn && styles.inHand]}
              >
                <Txt kind="text" tone={name ? 'azurite' : 'lead'} isStrong={isOn}>
                  {value.isRest ? words.restPrinted : (name ?? words.unwritten)}
                </Txt>
              </Pressable>
            )
          })}
        </View>
      ) : null}
    </View>
  )
})

function RhythmButton({
  rhythm,
  isOn,
  onPress,
}: Readonly<{ rhythm: RhythmChoice; isOn: boolean; onPress: () => void }>) {
  const words = useWords().desk.rhythm
  const { colors } = useTheme()
  const styles = useRowStyles()
  const picture = useMemo(() => paintRhythm(rhythm.values, rhythm.tieOut), [rhythm])
  return (
    <Pressable
      role="radio"
      aria-checked={isOn}
      aria-label={words.rhythmSpoken(rhythm.values, rhythm.tieOut)}
      onPress={onPress}
      style={[styles.rhythm, isOn && styles.inHand]}
    >
      <svg width={picture.widthPx} height={picture.heightPx} aria-hidden>
        <PaintedMarks painted={picture.painted} colors={colors} ground={colors.vellum} />
      </svg>
    </Pressable>
  )
}

const useRowStyles = createStyles((colors) => ({
  rows: { borderBottomWidth: 1, borderBottomColor: colors.hairline },
  row: { flexDirection: 'row', paddingHorizontal: space.small },
  rhythm: {
    minHeight: TOUCH_TARGET_PX,
    minWidth: TOUCH_TARGET_PX,
    paddingHorizontal: space.small,
    justifyContent: 'center',
    alignItems: 'center',
    borderBottomWidth: 2 * RULE_PX,
    borderBottomColor: 'transparent',
    outlineOffset: -3,
    cursor: 'pointer',
  },
  place: {
    flex: 1,
    minHeight: TOUCH_TARGET_PX,
    justifyContent: 'center',
    alignItems: 'center',
    borderBottomWidth: 2 * RULE_PX,
    borderBottomColor: 'transparent',
    outlineOffset: -3,
    cursor: 'pointer',
  },
  inHand: { backgroundColor: colors.leaf, borderBottomColor: colors.azurite },
}))
