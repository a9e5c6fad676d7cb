import { View } from 'react-native'
import type { WaysAnswer } from '@/components/ways/ways-messages'
import type { Selection } from '@/components/lesson/bars'
import { RubricLine } from '@/components/lesson/rubric-line'
import type { Rubric } from '@/components/lesson/rubrics'
import { Why } from '@/components/rules/why'
import { space } from '@/components/theme'
import { Heading, Txt } from '@/components/ui'
import { useWords } from '@/components/words'
import { LineWays } from './line-ways'

/** What is said of the class's own line. Pointing at a finding tints its bars in the score, pressing it selects them. */
export function LineFindings({
  rubrics,
  hasLine,
  ways,
  onPoint,
  onSelect,
}: Readonly<{
  rubrics: readonly Rubric[]
  hasLine: boolean
  /** Null while it is being counted. */
  ways: WaysAnswer | null
  onPoint: (rubric: Rubric | null) => void
  onSelect: (selection: Selection) => void
}>) {
  const words = useWords().lectern.line
  return (
    <View role="region" aria-label={words.title} style={{ gap: space.small }}>
      <View style={{ flexDirection: 'row', flexWrap: 'wrap', alignItems: 'baseline', columnGap: space.one }}>
        <Heading level={2}>{words.title}</Heading>
        <LineWays ways={ways} />
      </View>
      {rubrics.length === 0 ? <Txt tone="lead">{hasLine ? words.none : words.empty}</Txt> : null}
      {rubrics.map((rubric) => (
        <View key={rubric.id} style={{ flexDirection: 'row', alignItems: 'center', gap: space.small }}>
          <button
            type="button"
            onClick={() => onSelect({ anchor: rubric.bars[0] ?? 1, head: rubric.bars.at(-1) ?? 1 })}
            onPointerEnter={() => onPoint(rubric)}
            onPointerLeave={() => onPoint(null)}
            onFocus={() => onPoint(rubric)}
            onBlur={() => onPoint(null)}
            style={{
              background: 'none',
              border: 0,
              padding: `${space.small}px 0`,
              minHeight: 44,
              textAlign: 'left',
              cursor: 'pointer',
              flex: 1,
              minWidth: 0,
            }}
          >
            <RubricLine rubric={rubric} kind="note" />
          </button>
          {rubric.ruleId ? <Why ruleId={rubric.ruleId} /> : null}
        </View>
      ))}
    </View>
  )
}
