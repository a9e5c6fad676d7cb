export type {
  AnyRule,
  Breach,
  Example,
  Exercise,
  Explanation,
  Finding,
  Level,
  Position,
  RuleId,
  RuleSet,
  RuleSetting,
  Species,
  Voice,
} from './rule'
export { checkCantus, checkLine, createChecker, type Checker, type Proposal } from './checker'
export { checkThreeVoices } from './check-three-voices'
export { describeFinding, type Description } from './describe'
export { judgeExample, readExample, type ReadExample } from './example'
export { readExercise, type WrittenExercise } from './exercise'
export { createLadder, ladderChoices, type Ladder, type LadderChoice } from './ladder-choices'
export { findPreset, PRESETS } from './presets'
export { createCore1 } from './presets/core-1'
export { createCore2 } from './presets/core-2'
export { type SetAside } from './reading'
export { findRule, RULES } from './registry'
export { ruleSetProblems, type RuleSetProblem } from './rule-set'
