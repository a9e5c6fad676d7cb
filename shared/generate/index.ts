export type { GenerationProblem } from './generation-problem'
export {
  generateCanti,
  LEAST_CANTUS_BARS,
  MOST_CANTUS_BARS,
  USUAL_CANTUS_BARS,
  type CantusRequest,
  type GeneratedCanti,
} from './generate-canti'
export {
  generateFaults,
  MOST_FAULTS,
  prepareFaults,
  USUAL_APART,
  type Fault,
  type FaultExercise,
  type FaultRequest,
  type FaultSource,
} from './generate-faults'
export { generateSolutions, type GeneratedSolutions } from './generate-solutions'
