import { z } from 'zod'
import { ALL_SPECIES, breachAt, goOn, isNoted, pack, type Noted } from '@/shared/rules/fold'
import type { Breach, Rule, Voice } from '@/shared/rules/rule'
import { stepsFrom } from '@/shared/theory/interval'
import { diatonicNumber } from '@/shared/theory/pitch'

const params = z.strictObject({})
type Params = z.infer<typeof params>

/**
 * The last four notes, newest first; against the note three and the note four back, the shift in steps and how many
 * notes in a row have kept it; and how many notes have gone by step one way, since a scale is no figure.
 */
type State = Readonly<{
  voice: Voice
  one: Noted | null
  two: Noted | null
  three: Noted | null
  four: Noted | null
  shiftOfThree: number
  countOfThree: number
  shiftOfFour: number
  countOfFour: number
  scale: number
}>

const LONGEST_SCALE = 8

const forget = (voice: Voice): State => ({
  voice,
  one: null,
  two: null,
  three: null,
  four: null,
  shiftOfThree: 0,
  countOfThree: 0,
  shiftOfFour: 0,
  countOfFour: 0,
  scale: 0,
})

const shiftFrom = (earlier: Noted | null, now: Noted): number =>
  earlier === null ? 0 : stepsFrom(earlier.note, now.note)

/** Notes in a row that have kept a shift, counted no further than one more than makes a figure. */
function countShift(shift: number, before: number, count: number, length: number): number {
  if (shift === 0) return 0
  return shift === before ? Math.min(count + 1, length + 1) : 1
}

function growScale({ one, two, scale }: State, now: Noted): number {
  if (one === null) return 1
  const step = stepsFrom(one.note, now.note)
  if (step !== 1 && step !== -1) return 1
  const goesOn = scale > 1 && two !== null && stepsFrom(two.note, one.note) === step
  return goesOn ? Math.min(scale + 1, LONGEST_SCALE) : 2
}

const say = (voice: Voice, figure: readonly (Noted | null)[]): Breach => {
  const notes = figure.filter((noted) => noted !== null)
  return breachAt(voice, 'sequence', notes, { count: notes.length })
}

const packNote = (noted: Noted | null): number => (noted === null ? 0 : diatonicNumber(noted.note) + 1)

export const melSequence: Rule<State, Params> = {
  id: 'mel-sequence',
  level: 'preference',
  scope: 'melody',
  species: ALL_SPECIES,
  params,
  start: (_exercise, _params, voice) => forget(voice),
  step: (state, now) => {
    const { voice, one, two, three, four } = state
    if (!isNoted(now)) return goOn(now.note === null ? forget(voice) : state)
    const shiftOfThree = shiftFrom(three, now)
    const shiftOfFour = shiftFrom(four, now)
    const countOfThree = countShift(shiftOfThree, state.shiftOfThree, state.countOfThree, 3)
    const countOfFour = countShift(shiftOfFour, state.shiftOfFour, state.countOfFour, 4)
    const scale = growScale(state, now)
    const breach =
      countOfThree === 3 && scale < 6
        ? say(voice, [two, one, now])
        : countOfFour === 4 && scale < 8
          ? say(voice, [three, two, one, now])
          : null
    return {
      state: {
        voice,
        one: now,
        two: one,
        three: two,
        four: three,
        shiftOfThree,
        countOfThree,
        shiftOfFour,
        countOfFour,
        scale,
      },
      breach,
    }
  },
  finish: () => null,
  key: ({ one, two, three, four, shiftOfThree, countOfThree, shiftOfFour, countOfFour, scale }) =>
    pack(
      [packNote(one), 64],
      [packNote(two), 64],
      [packNote(three), 64],
      [packNote(four), 64],
      [shiftOfThree + 64, 128],
      [countOfThree, 5],
      [shiftOfFour + 64, 128],
      [countOfFour, 6],
      [scale, LONGEST_SCALE + 1],
    ),
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
