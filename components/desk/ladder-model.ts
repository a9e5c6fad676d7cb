import type { LadderRung } from '@/components/ladder/ladder'
import { homeRung } from '@/components/ladder/rungs'
import type { Judge } from '@/components/lesson/judge'
import type { LessonView } from '@/components/lesson/lesson-view'
import { lineWith } from '@/components/lesson/line-with'
import { barReadBefore, motionInto } from '@/components/lesson/rail'
import { completedAt } from '@/components/lesson/room'
import { firstPitch, intervalWord, speakSounding } from '@/components/lesson/spoken'
import type { Words } from '@/components/words'
import type { Finding } from '@/shared/rules'
import { WHOLE_TICKS } from '@/shared/theory/duration'
import type { BarNotes, Line } from '@/shared/theory/note'
import { motionBetween } from '@/shared/theory/motion'
import { comparePitches, formatPitch, type Pitch } from '@/shared/theory/pitch'
import { alterationInMode, degreeOf } from '@/shared/theory/scale'

/** How a student has the pitches named. */
export type Naming = 'letters' | 'degrees'

/** First species: one whole note a bar. */
export const wholeNote = (pitch: Pitch): BarNotes => [{ pitch: formatPitch(pitch), ticks: WHOLE_TICKS }]

const SIGNS: Readonly<Record<number, string>> = { [-2]: '♭♭', [-1]: '♭', 0: '', 1: '♯', 2: '♯♯' }

function nameOf(pitch: Pitch, view: LessonView, naming: Naming, words: Words): string {
  if (naming === 'letters') return words.lesson.pitchPrinted(pitch)
  const { mode, final } = view.exercise
  return (SIGNS[alterationInMode(pitch, mode, final)] ?? '') + String(degreeOf(pitch, final))
}

const markOf = (findings: readonly Finding[]): LadderRung['mark'] => {
  if (findings.length === 0) return null
  return findings.some(({ level }) => level === 'law') ? 'breach' : 'remark'
}

export type LadderQuestion = Readonly<{
  view: LessonView
  /** Own notes in the other bars: what stands in this one changes nothing about its rungs. */
  elsewhere: Line
  bar: number
  pitches: readonly Pitch[]
  judge: Judge
  naming: Naming
  /** Whether findings may be told. */
  isTold: boolean
  /** The bar with a pitch at the value in hand, and the pitch before it in the bar; left out where the bar is one whole note. */
  inHand?: Readonly<{ notesWith: (pitch: Pitch) => BarNotes; before: Pitch | null }> | undefined
}>

/** Every rung for a bar: what the pitch would be against the cantus, how it is come to, and what the rules say. */
export function readRungs(
  { view, elsewhere, bar, pitches, judge, naming, isTold, inHand }: LadderQuestion,
  words: Words,
): readonly LadderRung[] {
  const cantus = view.exercise.cantus[bar - 1] as Pitch
  const read = lineWith(view.line, elsewhere)
  const tries = pitches.map((pitch): Line => ({
    ...elsewhere,
    [bar]: inHand?.notesWith(pitch) ?? wholeNote(pitch),
  }))
  if (isTold) judge.ofAll(tries)
  return pitches.map((pitch, index): LadderRung => {
    const tried = tries[index] as Line
    const motion = inHand?.before
      ? motionBetween(cantus, cantus, inHand.before, pitch)
      : motionInto(view.exercise, read, view.setAside, bar, pitch)
    const findings = isTold
      ? judge.ofNotes(tried).filter((finding) => completedAt(finding, tried) === bar)
      : null
    const sentence = speakSounding({ bar, pitch, cantus, motion, findings }, words)
    return {
      name: nameOf(pitch, view, naming, words),
      letter: pitch.letter,
      interval: intervalWord(cantus, pitch),
      motion,
      mark: findings && markOf(findings),
      spoken: naming === 'degrees' ? `${speakDegree(pitch, view, words)}: ${sentence}` : sentence,
    }
  })
}

function speakDegree(pitch: Pitch, { exercise: { mode, final } }: LessonView, words: Words): string {
  return words.desk.ladder.degreeSpoken(degreeOf(pitch, final), alterationInMode(pitch, mode, final))
}

export type LadderPlaces = Readonly<{
  /** The rung that is written, or null. */
  chosen: number | null
  /** The rung to open the ladder at. */
  home: number
}>

/** Where the hand is on the ladder of a bar, and where it would begin. */
export function placeOnLadder(
  view: LessonView,
  own: Line,
  bar: number,
  pitches: readonly Pitch[],
  inHand?: Readonly<{ written: Pitch | null; before: Pitch | null }>,
): LadderPlaces {
  const written = inHand ? inHand.written : firstPitch(own[bar])
  const chosen = written ? pitches.findIndex((pitch) => comparePitches(pitch, written) === 0) : -1
  const before = barReadBefore(bar, view.setAside)
  const near =
    written ?? inHand?.before ?? firstPitch(before === null ? null : (own[before] ?? view.line[before]))
  return {
    chosen: chosen < 0 ? null : chosen,
    home: homeRung(pitches, near, view.exercise.cantus[bar - 1] as Pitch, view.exercise.position),
  }
}
