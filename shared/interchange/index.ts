export {
  formatCantusWords,
  formatLineText,
  lastBarOf,
  MAX_TEXT_CHARACTERS,
  parseCantusWords,
  parseLineText,
} from './line-text'
export type { ReadingProblem } from './reading-problem'
