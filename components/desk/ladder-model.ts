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

export type LadderModel = Readonly<{ rungs: readonly LadderRung[]; chosen: number | null; home: number }>

/** Every rung for a bar: what the pitch would be against the cantus, how it is come to, and what the rules say. */
export function readLadder(
  {
    view,
    own,
    bar,
    pitches,
    judge,
    naming,
    isTold,
  }: Readonly<{
    view: LessonView
    own: Line
    bar: number
    pitches: readonly Pitch[]
    judge: Judge
    naming: Naming
    /** Whether findings may be told. */
    isTold: boolean
  }>,
  words: Words,
): LadderModel {
  const cantus = view.exercise.cantus[bar - 1] as Pitch
  const read = lineWith(view.line, own)
  const tries = pitches.map((pitch) => ({ ...own, [bar]: wholeNote(pitch) }))
  if (isTold) judge.ofAll(tries)
  const rungs = pitches.map((pitch, index): LadderRung => {
    const motion = motionInto(view.exercise, read, view.setAside, bar, pitch)
    const findings = isTold
      ? judge
          .ofNotes(tries[index] as Line)
          .filter((finding) => completedAt(finding, tries[index] as Line) === bar)
      : null
    const sentence = speakSounding({ bar, pitch, cantus, motion, findings }, words)
    return {
      name: nameOf(pitch, view, naming, words),
      letter: pitch.letter,
      interval: intervalWord(cantus, pitch),
      motion,
      mark: findings && markOf(findings),
      spoken:
        naming === 'degrees'
          ? `${words.desk.ladder.degreeSpoken(
              degreeOf(pitch, view.exercise.final),
              alterationInMode(pitch, view.exercise.mode, view.exercise.final),
            )}: ${sentence}`
          : sentence,
    }
  })
  const written = firstPitch(own[bar])
  const chosen = written ? pitches.findIndex((pitch) => comparePitches(pitch, written) === 0) : -1
  const before = barReadBefore(bar, view.setAside)
  const near = written ?? firstPitch(before === null ? null : read[before])
  return {
    rungs,
    chosen: chosen < 0 ? null : chosen,
    home: homeRung(pitches, near, cantus, view.exercise.position),
  }
}
