import {
  judgeExample,
  type AnyRule,
  type Breach,
  type Example,
  type Level,
  type RuleSetting,
} from '@/shared/rules'
import type { RulePage } from '@/shared/rules/rule-book'

/** What a rule may be tried on. `fux`: a whole exercise out of a book. */
export type Ground = 'right' | 'wrong' | 'fux'

/** Source: J. J. Fux, Gradus ad Parnassum (Vienna 1725), Book II, figure 5: cantus in D, counterpoint above. */
export const FUX_EXAMPLE: Example = {
  cantus: 'D4 F4 E4 D4 G4 F4 A4 G4 F4 E4 D4',
  line: 'A4 A4 G4 A4 B4 C5 C5 B4 D5 C#5 D5',
  mode: 'dorian',
  final: 'D',
  breaches: [],
}

/** What a rule says under one setting; `null` where the setting has a value that the rule cannot take. */
export type Trial = Readonly<{ level: Level; breaches: readonly Breach[] | null }>

/** What there is to try a rule on. An exercise of first species says nothing of a rule of another. */
export const groundsFor = (rule: AnyRule): readonly Ground[] =>
  rule.species.has(1) ? ['wrong', 'right', 'fux'] : ['wrong', 'right']

export const exampleOn = (ground: Ground, page: Pick<RulePage, 'right' | 'wrong'>): Example =>
  ground === 'fux' ? FUX_EXAMPLE : page[ground]

/** Asks one rule, as it is set, about an example. A rule that is off is asked nothing. */
export function tryRule(rule: AnyRule, example: Example, setting: RuleSetting | undefined): Trial {
  const level = setting?.level ?? 'off'
  if (level === 'off') return { level, breaches: [] }
  const params = setting?.params ?? {}
  if (!rule.params.safeParse(params).success) return { level, breaches: null }
  return { level, breaches: judgeExample(rule, { ...example, params }) }
}

/** True where two trials would be told in the same words. */
export const isSameTrial = (a: Trial, b: Trial): boolean => JSON.stringify(a) === JSON.stringify(b)
