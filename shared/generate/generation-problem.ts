import type { RuleId } from '@/shared/rules/rule'

/** Why nothing could be made, in one sentence, with the rules that stand in the way where they are known. */
export type GenerationProblem = Readonly<{
  code:
    | 'no-spelling'
    | 'bad-length'
    | 'bad-compass'
    | 'rule-not-in-set'
    | 'rule-of-another-voice'
    | 'bad-request'
    | 'impossible'
    | 'impossible-together'
    | 'not-found'
  message: string
  rules: readonly RuleId[]
}>
