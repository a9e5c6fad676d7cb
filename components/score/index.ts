export { Score, type ScoreProps } from './score'
export { type Highlight } from './system-drawing'
export { describeBar } from './describe-bar'
