import { z } from 'zod'
import { ALL_SPECIES, breachAt } from '@/shared/rules/fold'
import type { Moment, Rule, Voice } from '@/shared/rules/rule'
import { WHOLE_TICKS } from '@/shared/theory/duration'

const params = z.strictObject({})
type Params = z.infer<typeof params>

type State = Readonly<{ voice: Voice }>

const isWholeNote = (moment: Moment): boolean =>
  moment.note !== 'rest' && moment.place === 0 && moment.ticks === WHOLE_TICKS

export const cfNoteValues: Rule<State, Params> = {
  id: 'cf-note-values',
  level: 'law',
  scope: 'cantus',
  species: ALL_SPECIES,
  params,
  start: (_exercise, _params, voice) => ({ voice }),
  step: (state, moment) => ({
    state,
    breach: moment.note === null || isWholeNote(moment) ? null : breachAt(state.voice, 'not-whole', [moment]),
  }),
  finish: () => null,
  key: () => 0,
  explain: {
    title: 'A cantus in equal notes',
    statement: 'Every note of a cantus firmus has the same length, a whole note.',
    why: 'The cantus is the ground against which the other voice is heard. Equal notes leave all rhythm to the voice that is added.',
    mends: 'Make every note a whole note, one to the bar.',
    sources: [
      { source: 'OMT1', place: 'cantus firmus' },
      { source: 'CFH', place: 'rule 1' },
      { source: 'VIGIL' },
      { source: 'ECR', place: 'rule 6' },
      { source: 'FUXE' },
    ],
    right: { cantus: 'D4 E4 F4 E4 D4', mode: 'dorian', final: 'D', breaches: [] },
    wrong: { cantus: 'D4 E4 F4:2,G4:2 E4 D4', mode: 'dorian', final: 'D', breaches: [3, 3] },
    messages: { 'not-whole': 'Every note of the cantus lasts a whole bar.' },
  },
}
