import { memo } from 'react'
import { Pressable, Text, View } from 'react-native'
import { createStyles, fonts, leading, space, type, useTheme } from '@/components/theme'
import { Lozenge } from '@/components/ui/lozenge'
import type { BarMotion } from '@/shared/notation/score-input'
import { MotionGlyph } from './motion-glyph'

export const RUNG_PX = 46

/** Accidentals, which stand beside a letter and before a degree. */
const SIGNS = /[♭♯♮𝄫𝄪]+/u

export type RungProps = Readonly<{
  index: number
  /** Letter or degree, as the student chose. */
  name: string
  interval: string
  motion: BarMotion | null
  /** What the rules say of it, where they may be told. */
  mark: 'breach' | 'remark' | null
  /** In how many ways the line may be finished from here, where that is told. */
  ways: string | null
  /** Proposed by this student. */
  isOn: boolean
  /** The one rung that the Tab key reaches. */
  isTabStop: boolean
  /** Not proposed, and the rules speak against it. */
  isFaint: boolean
  spoken: string
  onPress: (index: number) => void
}>

/** One pitch at hand. Redrawn only when what it says changes. */
export const Rung = memo(function Rung(props: RungProps) {
  const { index, name, interval, motion, mark, ways, isOn, isFaint, spoken } = props
  const { colors } = useTheme()
  const styles = useRungStyles()
  const ink = isOn ? styles.inkOn : isFaint ? styles.inkFaint : styles.ink
  const sign = SIGNS.exec(name)?.[0]
  const strokes = isOn ? colors.vellum : isFaint ? colors.lead : colors.lampblack
  return (
    <Pressable
      role="radio"
      aria-checked={isOn}
      aria-label={ways === null ? spoken : `${spoken}; ${ways}`}
      tabIndex={props.isTabStop ? 0 : -1}
      {...({ dataSet: { rung: index } } as object)}
      onPress={() => props.onPress(index)}
      style={[styles.rung, isOn && styles.on]}
    >
      <Text style={[styles.name, ink]}>
        {name.replace(SIGNS, '')}
        {sign ? <Text style={[styles.sign, ink]}>{sign}</Text> : null}
      </Text>
      <Text numberOfLines={1} style={[styles.interval, ink]}>
        {interval}
      </Text>
      <View style={styles.motion}>{motion ? <MotionGlyph motion={motion} color={strokes} /> : null}</View>
      {ways === null ? null : (
        <Text numberOfLines={1} style={[styles.ways, isOn ? styles.inkOn : styles.inkFaint]}>
          {ways}
        </Text>
      )}
      <View style={styles.mark}>
        {mark ? (
          <Lozenge
            kind={mark === 'breach' ? 'filled' : 'hollow'}
            tone={isOn ? 'vellum' : mark === 'breach' ? 'minium' : 'orpiment'}
            sizePx={12}
          />
        ) : null}
      </View>
    </Pressable>
  )
})

const useRungStyles = createStyles((colors) => ({
  rung: {
    height: RUNG_PX,
    paddingHorizontal: space.one,
    flexDirection: 'row',
    alignItems: 'center',
    cursor: 'pointer',
    borderBottomWidth: 1,
    borderBottomColor: colors.hairline,
    outlineOffset: -3,
  },
  on: { backgroundColor: colors.azurite, borderBottomColor: 'transparent' },
  name: {
    width: 54,
    fontFamily: fonts.AlegreyaMedium,
    fontSize: type.title,
    lineHeight: leading.title,
    fontVariant: ['lining-nums'],
    userSelect: 'none',
  },
  sign: { fontSize: type.large, lineHeight: leading.title, marginLeft: 2 },
  interval: {
    flex: 1,
    minWidth: 0,
    fontFamily: fonts.AlegreyaSans,
    fontSize: type.text,
    lineHeight: leading.text,
    userSelect: 'none',
  },
  motion: { width: 40, alignItems: 'center' },
  ways: {
    fontFamily: fonts.AlegreyaSans,
    fontSize: type.note,
    lineHeight: leading.note,
    fontVariant: ['tabular-nums'],
    marginLeft: space.small,
    userSelect: 'none',
  },
  mark: { width: 30, alignItems: 'flex-end' },
  ink: { color: colors.lampblack },
  inkOn: { color: colors.vellum },
  inkFaint: { color: colors.lead },
}))
