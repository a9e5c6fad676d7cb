import { z } from 'zod'
import { ALL_SPECIES, breachAt, goOn, isNoted, type Noted } from '@/shared/rules/fold'
import type { Rule, Voice } from '@/shared/rules/rule'
import { stepsFrom } from '@/shared/theory/interval'
import { diatonicNumber } from '@/shared/theory/pitch'

const params = z.strictObject({})
type Params = z.infer<typeof params>

/** Lengths of the figures that are looked for, in notes. */
const LENGTHS = [3, 4] as const
const MEMORY_NOTES = 4

/**
 * The last notes, newest last; for each length the shift in steps against the note that far back and how many notes in
 * a row have kept it; and how many notes have gone by step one way, since a scale is no figure.
 */
type State = Readonly<{
  voice: Voice
  notes: readonly Noted[]
  shifts: readonly number[]
  counts: readonly number[]
  scale: number
}>

const LONGEST_SCALE = 8
const forget = (voice: Voice): State => ({ voice, notes: [], shifts: [0, 0], counts: [0, 0], scale: 0 })

function growScale(notes: readonly Noted[], now: Noted, scale: number): number {
  const before = notes.at(-1)
  if (before === undefined) return 1
  const step = stepsFrom(before.note, now.note)
  if (Math.abs(step) !== 1) return 1
  const earlier = notes.at(-2)
  const goesOn = scale > 1 && earlier !== undefined && stepsFrom(earlier.note, before.note) === step
  return goesOn ? Math.min(scale + 1, LONGEST_SCALE) : 2
}

export const melSequence: Rule<State, Params> = {
  id: 'mel-sequence',
  level: 'preference',
  scope: 'melody',
  species: ALL_SPECIES,
  params,
  start: (_exercise, _params, voice) => forget(voice),
  step: (state, moment) => {
    const { voice, notes } = state
    if (!isNoted(moment)) return goOn(moment.note === null ? forget(voice) : state)
    const shifts = LENGTHS.map((length) => {
      const earlier = notes[notes.length - length]
      return earlier === undefined ? 0 : stepsFrom(earlier.note, moment.note)
    })
    const counts = LENGTHS.map((length, index) => {
      if (shifts[index] === 0) return 0
      const goesOn = shifts[index] === state.shifts[index]
      return Math.min(goesOn ? (state.counts[index] as number) + 1 : 1, length + 1)
    })
    const scale = growScale(notes, moment, state.scale)
    const found = LENGTHS.find((length, index) => counts[index] === length && scale < 2 * length)
    const breach =
      found === undefined
        ? null
        : breachAt(voice, 'sequence', [...notes.slice(1 - found), moment], { count: found })
    const kept = notes.length < MEMORY_NOTES ? notes : notes.slice(1)
    return { state: { voice, notes: [...kept, moment], shifts, counts, scale }, breach }
  },
  finish: () => null,
  key: ({ notes, shifts, counts, scale }) => {
    let key = notes.length
    for (const { note } of notes) key = key * 64 + diatonicNumber(note)
    for (const shift of shifts) key = key * 128 + shift + 64
    for (const count of counts) key = key * 6 + count
    return key * (LONGEST_SCALE + 1) + scale
  },
  explain: {
    title: 'No sequence',
    statement: 'A figure is not restated at once at another pitch.',
    why: 'A sequence runs by itself: once it has begun, the ear knows the next notes, and the line no longer chooses.',
    mends: 'Break the pattern in its second statement.',
    sources: [
      { source: 'CFH', place: 'rule 7' },
      { source: 'ECR', place: 'C3' },
      { source: 'ROSS', place: 'preface' },
    ],
    right: { cantus: 'D4 F4 E4 D4 G4 F4 A4 G4 F4 E4 D4', mode: 'dorian', final: 'D', breaches: [] },
    wrong: { cantus: 'D4 F4 E4 G4 B4 A4 F4 E4 D4', mode: 'dorian', final: 'D', breaches: [6] },
    messages: { sequence: 'The last {count} notes restate the {count} before them at another pitch.' },
    disagreement: 'Bridge tolerates sequences, and Lassus writes them.',
  },
}
