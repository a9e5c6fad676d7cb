import { readTrio, readVoice, type SetAside } from '@/shared/rules/reading'
import { resolveRuleSet, rulesInForce, type ActiveRule } from '@/shared/rules/rule-set'
import type { Breach, Exercise, Finding, Moment, RuleSet, Voice } from '@/shared/rules/rule'
import type { Line } from '@/shared/theory/note'

/**
 * Judges two lines with a cantus, note against note: the three voices together by the rules of three voices, and each
 * line by the rules of any melody. The rules of two voices are not asked; those of three take their place.
 */
export function checkThreeVoices(
  exercise: Exercise,
  lines: readonly [line: Line, second: Line],
  ruleSet: RuleSet,
  { setAside }: Readonly<{ setAside?: SetAside }> = {},
): readonly Finding[] {
  const { active } = resolveRuleSet(ruleSet)
  const together = active.filter(({ rule }) => rule.scope === 'trio')
  const alone = rulesInForce(active, 1).filter(({ rule }) => rule.scope === 'melody' || rule.scope === 'line')
  const trio = readTrio(exercise, lines, setAside)
  const [line, second] = lines.map((one) => readVoice(exercise.cantus.length, one, setAside))
  const findings = [
    ...together.flatMap((one) => run(one, exercise, trio, 'line')),
    ...alone.flatMap((one) => run(one, exercise, line as readonly Moment[], 'line')),
    ...alone.flatMap((one) => run(one, exercise, second as readonly Moment[], 'second')),
  ]
  return findings.sort((a, b) => lastBarOf(a) - lastBarOf(b))
}

function run(
  { rule, level, params }: ActiveRule,
  exercise: Exercise,
  moments: readonly Moment[],
  voice: Voice,
): readonly Finding[] {
  const findings: Finding[] = []
  const tell = (breach: Breach | null): void => {
    if (breach === null) return
    // Rules of a line name their notes by the line they were made for.
    const notes = voice === 'second' ? breach.notes.map((note) => ({ ...note, voice })) : breach.notes
    findings.push({
      ...breach,
      notes,
      ruleId: rule.id,
      level: breach.isRemark ? 'preference' : level,
      voice,
    })
  }
  let state: unknown = rule.start(exercise, params, voice)
  for (const moment of moments) {
    const next = rule.step(state, moment, params)
    state = next.state
    tell(next.breach)
  }
  // Every line is whole on its own account: in a reading of three a bar is whole when both lines have a note there.
  const isComplete = moments.every(({ note, third }) => note !== null && third !== null)
  tell(rule.finish(state, params, isComplete))
  return findings
}

const lastBarOf = ({ bars }: Finding): number => bars[bars.length - 1] ?? 0
