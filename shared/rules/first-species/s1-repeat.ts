import { z } from 'zod'
import { cite } from '@/shared/rules/cite'
import { REPEATING_SPECIES } from '@/shared/rules/first-species/folds'
import { breachAt, goOn, isNoted, pack, packPitch, PITCH_ROOM, type Noted } from '@/shared/rules/fold'
import type { Breach, Exercise, Moment, Rule, Step } from '@/shared/rules/rule'
import { formatPitch, isSamePitch } from '@/shared/theory/pitch'

const PARAMS = z.strictObject({
  maxRepeats: z.int().min(0).max(99).default(1).describe('Repetitions in the whole line.'),
  maxInRow: z.int().min(1).max(99).default(99).describe('Times one note may sound in a row.'),
  lowerMayRepeat: z.boolean().default(true).describe('A line below the cantus may repeat notes as well.'),
})
type Params = z.infer<typeof PARAMS>

type State = Readonly<{
  exercise: Exercise
  before: Noted | null
  repeats: number
  /** How often the note before has sounded in a row. */
  inRow: number
}>

export const s1Repeat: Rule<State, Params> = {
  id: 's1-repeat',
  level: 'preference',
  scope: 'line',
  species: REPEATING_SPECIES,
  params: PARAMS,
  start: (exercise) => ({ exercise, before: null, repeats: 0, inRow: 0 }),
  step: (state, moment, params) => {
    const { exercise, before } = state
    if (!isNoted(moment)) return goOn({ exercise, before: null, repeats: state.repeats, inRow: 0 })
    if (before === null || !isSamePitch(before.note, moment.note)) {
      return goOn({ exercise, before: moment, repeats: state.repeats, inRow: 1 })
    }
    const repeats = Math.min(state.repeats + 1, params.maxRepeats + 1)
    const inRow = Math.min(state.inRow + 1, params.maxInRow + 1)
    return repeatStep({ exercise, before: moment, repeats, inRow }, before, moment, params)
  },
  finish: () => null,
  key: ({ before, repeats, inRow }) =>
    pack([packPitch(before && before.note), PITCH_ROOM], [repeats, 128], [inRow, 128]),
  explain: {
    title: 'Few repeated notes',
    statement: 'The line repeats a note only rarely.',
    why: 'A repeated note stands still while the cantus moves on; more than a little of it and the line is lost.',
    mends: 'Move to another note here.',
    sources: cite('OMT1', 'HSR soft 1', 'FLASH', 'LEHM I', 'CCC r4', 'EX'),
    disagreement:
      'Three sources allow one repetition in an exercise; one lets the upper voice sound a note three times in a row and the lower voice not at all. Fux repeats up to twice.',
    right: {
      cantus: 'D4 F4 E4 F4 G4 E4 D4',
      line: 'A4 A4 C5 D5 B4 C#5 D5',
      mode: 'dorian',
      final: 'D',
      breaches: [],
    },
    wrong: {
      cantus: 'D4 F4 E4 F4 G4 E4 D4',
      line: 'A4 A4 C5 C5 B4 C#5 D5',
      mode: 'dorian',
      final: 'D',
      breaches: [4],
    },
    messages: {
      'too-many': 'The line repeats its {note}, and has repeated often enough.',
      never: 'The line repeats its {note}.',
      'in-a-row': 'The {note} sounds more than {max} times in a row.',
      lower: 'A line below the cantus repeats its {note}.',
    },
  },
}

function repeatStep(state: State, before: Noted, now: Noted, params: Params): Step<State> {
  const args = { note: formatPitch(now.note), max: params.maxInRow }
  const tell = (code: string, moments: readonly Moment[]): Breach => breachAt('line', code, moments, args)
  if (!params.lowerMayRepeat && state.exercise.position === 'below') {
    return { state, breach: tell('lower', [before, now]) }
  }
  if (state.repeats > params.maxRepeats) {
    return { state, breach: tell(params.maxRepeats === 0 ? 'never' : 'too-many', [before, now]) }
  }
  return { state, breach: state.inRow > params.maxInRow ? tell('in-a-row', [before, now]) : null }
}
