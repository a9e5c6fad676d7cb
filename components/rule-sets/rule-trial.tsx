import { useMemo, useState } from 'react'
import { View } from 'react-native'
import { RubricLine } from '@/components/lesson/rubric-line'
import { rubricOf } from '@/components/lesson/rubrics'
import { HearExample } from '@/components/rules/hear-example'
import { findingsOfBreaches, playbackOfExample, scoreOfExample } from '@/components/rules/score-of-example'
import { Score } from '@/components/score'
import { space } from '@/components/theme'
import { Choice, Txt } from '@/components/ui'
import { useWords } from '@/components/words'
import { readExample, type AnyRule, type RuleSetting } from '@/shared/rules'
import type { RulePage } from '@/shared/rules/rule-book'
import { exampleOn, groundsFor, isSameTrial, tryRule, type Ground, type Trial } from './try-rule'

/** What a change to a rule does, on an example: its findings before and as it is set now. */
export function RuleTrial({
  rule,
  page,
  before,
  now,
  widthPx,
}: Readonly<{
  rule: AnyRule
  page: RulePage
  before: RuleSetting | undefined
  now: RuleSetting | undefined
  widthPx: number
}>) {
  const words = useWords()
  const say = words.ruleSets
  const grounds = groundsFor(rule)
  const [ground, setGround] = useState<Ground>('wrong')
  const written = exampleOn(ground, page)
  const example = useMemo(() => readExample(written), [written])
  const playback = useMemo(() => playbackOfExample(example), [example])
  const was = useMemo(() => tryRule(rule, written, before), [rule, written, before])
  const is = useMemo(() => tryRule(rule, written, now), [rule, written, now])
  const input = useMemo(() => scoreOfExample(example, is.breaches ?? [], is.level), [example, is])
  const isSame = isSameTrial(was, is)
  return (
    <View role="group" aria-label={say.tryItSpoken(rule.explain.title)} style={{ gap: space.half }}>
      <Choice<Ground>
        label={say.examples}
        isLabelHidden
        value={ground}
        options={grounds.map((value) => ({ value, label: say.exampleOf[value] }))}
        onChange={setGround}
      />
      <Score
        input={input}
        size="page"
        width={widthPx}
        maxHeight={240}
        accessibilityLabel={say.exampleOf[ground]}
      />
      <View
        aria-live="polite"
        style={{ flexDirection: 'row', flexWrap: 'wrap', columnGap: space.double, rowGap: space.half }}
      >
        {isSame ? null : <Said title={say.before} trial={was} rule={rule} />}
        <Said title={isSame ? say.same : say.now} trial={is} rule={rule} />
      </View>
      <HearExample score={playback} barCount={example.barCount} name={say.exampleOf[ground]} />
    </View>
  )
}

function Said({ title, trial, rule }: Readonly<{ title: string; trial: Trial; rule: AnyRule }>) {
  const words = useWords()
  const say = words.ruleSets
  const rubrics = findingsOfBreaches(trial.breaches ?? [], rule.id, trial.level).map((finding) =>
    rubricOf(finding, words),
  )
  return (
    <View style={{ gap: space.tiny, flexGrow: 1, flexShrink: 1, flexBasis: 240, minWidth: 0 }}>
      <Txt kind="note" tone="lead" isStrong>
        {title}
      </Txt>
      {rubrics.map((rubric, index) => (
        <RubricLine key={`${rubric.id}/${index}`} rubric={rubric} kind="note" isMendTold={false} />
      ))}
      {rubrics.length === 0 ? (
        <Txt kind="note">
          {trial.breaches === null ? say.badValue : trial.level === 'off' ? say.isOff : say.saysNothing}
        </Txt>
      ) : null}
    </View>
  )
}
