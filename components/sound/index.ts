export { usePlayer, usePlayhead, useStopOnLeave, useVolume, type PlayerControls } from './use-player'
export type { PlayRequest } from './player'
export { TempoControl } from './tempo-control'
export { VolumeControl } from './volume-control'
