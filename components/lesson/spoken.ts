import type { Words } from '@/components/words'
import { describeFinding, type Finding } from '@/shared/rules'
import type { BarMotion } from '@/shared/notation/score-input'
import { intervalBetween, qualityOf } from '@/shared/theory/interval'
import { nameInterval, nameSize } from '@/shared/theory/interval-name'
import type { BarNotes, Line } from '@/shared/theory/note'
import { comparePitches, parsePitch, pitchOf, type Pitch } from '@/shared/theory/pitch'
import type { LessonView } from './lesson-view'
import { railOf } from './rail'

/** The first pitch of a bar, or null where there is none. */
export function firstPitch(notes: BarNotes | null | undefined): Pitch | null {
  const name = notes?.find(({ pitch }) => pitch !== null)?.pitch
  if (!name) return null
  const parsed = parsePitch(name)
  return parsed.ok ? parsed.value : null
}

/** `fifth`, `minor third`: a perfect interval needs no telling, an altered one does. */
export function intervalWord(a: Pitch, b: Pitch): string {
  const interval = intervalBetween(a, b)
  return qualityOf(interval) === 'P' ? nameSize(interval.steps) : nameInterval(interval)
}

/**
 * One sounding for a screen reader: "bar 4, A, minor tenth above F sharp, contrary motion; no finding." Without findings
 * (`null`) nothing is said of them.
 */
export function speakSounding(
  {
    bar,
    pitch,
    cantus,
    motion,
    findings,
  }: Readonly<{
    bar: number
    pitch: Pitch
    cantus: Pitch
    motion: BarMotion | null
    findings: readonly Finding[] | null
  }>,
  words: Words,
): string {
  const order = comparePitches(pitch, cantus)
  return words.lesson.soundingSpoken({
    bar,
    pitch: words.lesson.pitchSpoken(pitch),
    interval: intervalWord(cantus, pitch),
    cantus: words.lesson.pitchSpoken(cantus),
    isAbove: order >= 0,
    isUnison: order === 0,
    motion: motion && words.lesson.motion[motion],
    findings: findings && findings.map((finding) => describeFinding(finding).spoken),
  })
}

/** The whole score as text, a sentence a bar, for those who hear it read. */
export function speakScore(
  view: LessonView,
  read: Line,
  findings: readonly Finding[] | null,
  words: Words,
): readonly Readonly<{ bar: number; sentence: string }>[] {
  const rail = railOf(view.exercise, read, view.setAside)
  return view.exercise.cantus.map((cantus, index) => {
    const bar = index + 1
    if (view.setAside.has(bar)) return { bar, sentence: words.lesson.setAsideSpoken(bar) }
    const pitch = firstPitch(read[bar])
    if (!pitch) return { bar, sentence: words.lesson.unwrittenSpoken(bar, words.lesson.pitchSpoken(cantus)) }
    const here = findings?.filter(({ bars }) => bars.at(-1) === bar) ?? null
    if (view.exercise.species > 1) {
      const notes = (read[bar] ?? []).map(({ pitch: name, ticks, tied }) =>
        words.score.note(
          name === null ? null : words.lesson.pitchSpoken(pitchOf(name)),
          ticks,
          tied === true,
        ),
      )
      const told = words.score.bar({
        number: bar,
        state: 'plain',
        cantus: words.lesson.pitchSpoken(cantus),
        line: notes.join(' '),
        interval: null,
        motion: rail[index]?.motion ?? null,
        proposals: [],
      })
      const spoken = here?.map((finding) => describeFinding(finding).spoken) ?? []
      return { bar, sentence: [told, ...spoken].join('; ') }
    }
    return {
      bar,
      sentence: speakSounding(
        { bar, pitch, cantus, motion: rail[index]?.motion ?? null, findings: here },
        words,
      ),
    }
  })
}
