import { View } from 'react-native'
import { useTheme } from '@/components/theme'
import { Button, Txt } from '@/components/ui'
import { formatWays } from '@/components/ways/format-ways'
import type { WaysAnswer } from '@/components/ways/ways-messages'
import { useWords } from '@/components/words'
import type { WallMeasure } from './wall-measure'
import { promptSizePx } from './wall-model'

/** Lines of like length, so that no word is left alone in the last one. */
const BALANCED = { textWrap: 'balance' } as object

/** The task, and how much of the room has answered it. */
export function WallFooter({
  prompt,
  released,
  offered,
  here,
  ways,
  notice,
  onLetSound,
  measure,
}: Readonly<{
  prompt: string
  released: readonly number[]
  offered: number
  here: number
  /** Null where the teacher does not let the wall tell; no answer while it is counted. */
  ways: Readonly<{ answer: WaysAnswer | null }> | null
  notice: string | null
  onLetSound: (() => void) | null
  measure: WallMeasure
}>) {
  const words = useWords()
  const { colors } = useTheme()
  const { px, isStacked } = measure
  const sizePx = isStacked ? 27 : px(promptSizePx(prompt))
  return (
    <View
      style={{
        minHeight: isStacked ? undefined : measure.footerPx,
        height: isStacked ? undefined : measure.footerPx,
        borderTopWidth: 1,
        borderColor: colors.hairline,
        flexDirection: isStacked ? 'column' : 'row',
        alignItems: isStacked ? 'stretch' : 'center',
        gap: isStacked ? 16 : px(64),
        paddingVertical: isStacked ? 16 : 0,
        marginTop: isStacked ? 20 : 0,
      }}
    >
      <View style={{ flex: isStacked ? undefined : 1, minWidth: 0 }}>
        <Txt
          kind="head"
          isStrong
          role="status"
          lines={4}
          style={[{ fontSize: sizePx, lineHeight: Math.round(sizePx * 1.1) }, BALANCED]}
        >
          {prompt}
        </Txt>
        {notice || onLetSound ? (
          <View style={{ flexDirection: 'row', alignItems: 'center', gap: 12, paddingTop: 6 }}>
            {onLetSound ? <Button label={words.wall.letSound} onPress={onLetSound} /> : null}
            <Txt tone="lead" role="status">
              {notice ?? words.wall.letSoundHint}
            </Txt>
          </View>
        ) : null}
      </View>
      <View role="status" style={{ alignItems: isStacked ? 'flex-start' : 'flex-end' }}>
        {released.length > 0 ? (
          <>
            <Txt kind="head" isStrong isTabular style={{ fontSize: px(74), lineHeight: px(80) }}>
              {String(offered)}
              <Txt kind="head" isStrong tone="lead" style={{ fontSize: px(40), lineHeight: px(80) }}>
                {` ${words.wall.of(here)}`}
              </Txt>
            </Txt>
            <Caption px={px} text={words.wall.offered(released.length > 1)} />
          </>
        ) : here > 0 ? (
          <>
            <Txt kind="head" isStrong isTabular style={{ fontSize: px(74), lineHeight: px(80) }}>
              {String(here)}
            </Txt>
            <Caption px={px} text={words.wall.here} />
          </>
        ) : (
          <Caption px={px} text={words.wall.nobodyHere} />
        )}
      </View>
      {ways ? (
        <View role="status" style={{ minWidth: px(200), alignItems: isStacked ? 'flex-start' : 'flex-end' }}>
          <Txt
            kind="head"
            isStrong
            isTabular
            tone={ways.answer?.deadEnd ? 'minium' : 'verdigris'}
            style={{ fontSize: px(74), lineHeight: px(80) }}
          >
            {ways.answer ? formatWays(ways.answer) : ' '}
          </Txt>
          <Caption
            px={px}
            text={
              ways.answer === null
                ? words.ways.counting
                : ways.answer.deadEnd
                  ? words.ways.stuckAt(ways.answer.deadEnd.bar)
                  : words.ways.toFinish(ways.answer.count === '1')
            }
          />
        </View>
      ) : null}
    </View>
  )
}

function Caption({ text, px }: Readonly<{ text: string; px: (drawn: number) => number }>) {
  return (
    <Txt tone="lead" style={{ fontSize: Math.max(15, px(24)), lineHeight: Math.max(20, px(32)) }}>
      {text}
    </Txt>
  )
}
