export { createTimeline } from './create-timeline'
export { positionAt } from './position-at'
export { DEFAULT_TEMPO, MAX_TEMPO, MIN_TEMPO } from './playback'
export type {
  BarSpan,
  PlaybackPosition,
  PlaybackRequest,
  PlaybackScore,
  PlaybackVoices,
  SoundEvent,
  Timeline,
} from './playback'
