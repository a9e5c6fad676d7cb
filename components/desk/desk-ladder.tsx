import { View } from 'react-native'
import { rhythmChoices } from '@/components/ladder/bar-draft'
import { Ladder } from '@/components/ladder/ladder'
import { RhythmRow } from '@/components/ladder/rhythm-row'
import { firstPitch } from '@/components/lesson/spoken'
import { space, TOUCH_TARGET_PX, useTheme } from '@/components/theme'
import { Button, Txt } from '@/components/ui'
import { useRungWays } from '@/components/ways/use-rung-ways'
import { useWords } from '@/components/words'
import { pitchOf } from '@/shared/theory/pitch'
import { ClosedBar } from './closed-bar'
import type { DeskModel } from './use-desk'

/** The bar in hand: what it stands against, the ladder, and what stood there before. */
export function DeskLadder({
  model,
  onHearRung,
  onSettings,
}: Readonly<{ model: DeskModel; onHearRung: (index: number) => void; onSettings: () => void }>) {
  const words = useWords()
  const { colors } = useTheme()
  const { bar, ladder, hand, view } = model
  const cantus = view.exercise.cantus[hand - 1]
  const ways = useRungWays(view, model.desk.own, hand, model.pitches)
  const earlier = bar?.kind === 'open' && !bar.notes ? bar.earlier : null
  const earlierPitch = firstPitch(earlier)
  return (
    <View style={{ flex: 1, minHeight: 5 * TOUCH_TARGET_PX }}>
      <View
        style={{
          minHeight: TOUCH_TARGET_PX,
          flexDirection: 'row',
          alignItems: 'center',
          paddingLeft: space.one,
          paddingRight: space.small,
          borderBottomWidth: 1,
          borderColor: colors.hairline,
        }}
      >
        <Txt kind="note" tone="lead" style={{ flex: 1, minWidth: 0 }} lines={1}>
          {cantus ? words.desk.against(hand, words.lesson.pitchPrinted(cantus)) : ''}
        </Txt>
        {ladder ? (
          <View>
            <Button
              kind="quiet"
              label={words.desk.ladder.eraseShort}
              hint={words.desk.ladder.erase}
              isDisabled={ladder.chosen === null && !model.draft?.pitches.some((pitch) => pitch !== null)}
              onPress={model.erase}
            />
          </View>
        ) : null}
        <View>
          <Button kind="quiet" label={words.desk.settings.open} hasPopup="dialog" onPress={onSettings} />
        </View>
      </View>
      {earlier && earlierPitch ? (
        <View
          style={{
            paddingHorizontal: space.one,
            paddingVertical: space.small,
            borderBottomWidth: 1,
            borderColor: colors.hairline,
            flexDirection: 'row',
            alignItems: 'center',
            gap: space.half,
          }}
        >
          <Txt kind="note" style={{ flex: 1, minWidth: 0 }}>
            {words.desk.earlier(words.lesson.pitchPrinted(earlierPitch))}
          </Txt>
          <Button
            label={words.desk.again}
            hint={words.desk.offerAgain(words.lesson.pitchSpoken(earlierPitch))}
            onPress={() => model.offerAgain(hand, earlier)}
          />
        </View>
      ) : null}
      {ladder && model.draft ? (
        <RhythmRow
          draft={model.draft}
          choices={rhythmChoices(view.exercise.species, hand, view.barCount)}
          names={model.draft.pitches.map((name) => (name ? words.lesson.pitchPrinted(pitchOf(name)) : null))}
          onRhythm={model.chooseRhythm}
          onPlace={model.choosePlace}
        />
      ) : null}
      {ladder ? (
        <Ladder
          label={words.desk.ladder.label(hand)}
          hint={words.desk.ladder.hint}
          rungs={ladder.rungs}
          ways={ways}
          chosen={ladder.chosen}
          home={ladder.home}
          bar={hand}
          onChoose={model.proposeRung}
          onHear={onHearRung}
          onErase={model.erase}
          onStep={model.step}
          rungOfLetter={model.letterRung}
        />
      ) : bar ? (
        <ClosedBar bar={bar} hasOpen={view.released.length > 0} />
      ) : null}
    </View>
  )
}
