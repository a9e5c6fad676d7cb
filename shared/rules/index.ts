export type { RuleSet, RuleId, Level, Finding, Exercise, Species, Position, Voice } from './rule'
