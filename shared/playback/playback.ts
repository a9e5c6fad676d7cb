import type { Line } from '@/shared/theory/note'
import type { PitchName } from '@/shared/theory/pitch'

/** Slowest and fastest hearing, in quarter notes a minute: a whole note lasts 12 seconds, or one. */
export const MIN_TEMPO = 20
export const MAX_TEMPO = 240
export const DEFAULT_TEMPO = 120

export type PlaybackVoices = 'cantus' | 'line' | 'both'

/** What may be heard: the cantus, one whole note a bar, and the line (or a proposal laid over it) against it. */
export type PlaybackScore = Readonly<{
  /** One pitch a bar, from bar 1. */
  cantus: readonly PitchName[]
  /** Bars that are missing are silent in this voice. */
  line: Line
  /** 1-based bars that are skipped: the rest is heard as a reduction, without a gap. */
  setAside: readonly number[]
}>

export type PlaybackRequest = Readonly<{
  voices: PlaybackVoices
  /** 1-based, both included; bars beyond the score are left out. */
  fromBar: number
  toBar: number
  /** Quarter notes a minute, kept within `MIN_TEMPO` and `MAX_TEMPO`. */
  tempo: number
}>

/** One sounding note. Tied notes are one event. */
export type SoundEvent = Readonly<{
  voice: 'cantus' | 'line'
  /** Bar in which it is struck. */
  bar: number
  startSeconds: number
  durationSeconds: number
  midi: number
  hertz: number
}>

/** When one bar of the score is heard. */
export type BarSpan = Readonly<{ bar: number; startSeconds: number; durationSeconds: number }>

/** A hearing laid out in time from 0. Events are in order of their starts; bars follow each other without gaps. */
export type Timeline = Readonly<{
  events: readonly SoundEvent[]
  bars: readonly BarSpan[]
  totalSeconds: number
}>

/** Where a hearing stands: the bar, and how much of it has passed, from 0 to just under 1. */
export type PlaybackPosition = Readonly<{ bar: number; fraction: number }>
