import { useMemo } from 'react'
import { View } from 'react-native'
import { RubricLine } from '@/components/lesson/rubric-line'
import { rubricOf } from '@/components/lesson/rubrics'
import { Score } from '@/components/score'
import { space } from '@/components/theme'
import { Heading, Txt } from '@/components/ui'
import { useWords } from '@/components/words'
import { findRule, judgeExample, readExample, type Example } from '@/shared/rules'
import type { RulePage } from '@/shared/rules/rule-book'
import { HearExample } from './hear-example'
import { findingsOfBreaches, pairsOfExample, playbackOfExample, scoreOfExample } from './score-of-example'

/** One of a rule's two small examples: drawn, to be heard, and judged by the rule itself as it would be in a lesson. */
export function ExampleFigure({
  page,
  which,
  widthPx,
}: Readonly<{ page: RulePage; which: 'right' | 'wrong'; widthPx: number }>) {
  const words = useWords()
  const say = words.rules
  const written: Example = page[which]
  const { pairs, rubrics } = useMemo(() => {
    const rule = findRule(page.id)
    const breaches = rule ? judgeExample(rule, written) : []
    return {
      pairs: pairsOfExample(readExample(written)).map((example) => ({
        example,
        input: scoreOfExample(example, breaches, page.level),
        playback: playbackOfExample(example),
      })),
      rubrics: findingsOfBreaches(breaches, page.id, page.level).map((finding) => rubricOf(finding, words)),
    }
  }, [page, written, words])
  return (
    <View role="figure" aria-label={say.exampleSpoken(say[which], page.title)} style={{ gap: space.small }}>
      <Heading level={2} kind="text">
        {say[which]}
      </Heading>
      {pairs.map(({ example, input, playback }, index) => {
        const name = pairs.length > 1 ? `${say[which]}: ${say.againstCantus[index] ?? ''}` : say[which]
        return (
          <View key={index} style={{ gap: space.small }}>
            {pairs.length > 1 ? (
              <Txt kind="note" tone="lead">
                {say.againstCantus[index]}
              </Txt>
            ) : null}
            <Score input={input} size="page" width={widthPx} maxHeight={260} accessibilityLabel={name} />
            <HearExample score={playback} barCount={example.barCount} name={name} />
          </View>
        )
      })}
      {rubrics.length === 0 ? (
        <Txt kind="note" tone="lead">
          {say.rightNone}
        </Txt>
      ) : (
        rubrics.map((rubric) => <RubricLine key={rubric.id} rubric={rubric} kind="note" isMendTold={false} />)
      )}
    </View>
  )
}
