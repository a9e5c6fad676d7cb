import { z } from 'zod'
import { cite } from '@/shared/rules/cite'
import { breachAt, goOn, isNoted, type Noted } from '@/shared/rules/fold'
import type { Rule } from '@/shared/rules/rule'
import { shortExample, steppingExample, STEPPING_LINE } from '@/shared/rules/second-species/examples'
import { SECOND_SPECIES } from '@/shared/rules/second-species/folds'
import { letterIndex } from '@/shared/theory/pitch'

const PARAMS = z.strictObject({
  max: z.int().min(2).max(8).default(3).describe('Notes of one chord that may follow each other.'),
})
type Params = z.infer<typeof PARAMS>

/** The last notes, newest last: as many as may follow each other. */
type State = Readonly<{ notes: readonly Noted[] }>
const NONE: State = { notes: [] }

export const s2ChordRun: Rule<State, Params> = {
  id: 's2-chord-run',
  level: 'preference',
  scope: 'line',
  species: SECOND_SPECIES,
  params: PARAMS,
  start: () => NONE,
  step: (state, moment, { max }) => {
    if (!isNoted(moment)) return goOn(moment.note === null ? NONE : state)
    const run = [...state.notes, moment]
    const isChord = run.length > max && areOfOneChord(run)
    return {
      state: { notes: run.slice(-max) },
      breach: isChord ? breachAt('line', 'chord', run, { count: run.length, max }) : null,
    }
  },
  finish: () => null,
  key: ({ notes }) => notes.reduce((key, { note }) => 8 * key + letterIndex(note.letter) + 1, 0),
  explain: {
    title: 'Not too much of one chord',
    statement: 'No more than three notes of one chord follow each other.',
    why: 'Note after note of the same chord is heard as an arpeggio that accompanies, not as a voice.',
    mends: 'Put a step that leaves the chord among these notes.',
    sources: cite('LEHM II', 'BRIDGE ch. 2 r10'),
    right: steppingExample(STEPPING_LINE),
    wrong: shortExample('r:2,A4:2 D5:2,F4:2 A4:2,C#5:2 D5', [3]),
    messages: { chord: '{count} notes in a row belong to one chord.' },
  },
}

/** True when all letters lie in one triad. */
function areOfOneChord(notes: readonly Noted[]): boolean {
  let letters = 0
  for (const { note } of notes) letters |= 1 << letterIndex(note.letter)
  for (let root = 0; root < 7; root += 1) {
    const triad = (1 << root) | (1 << ((root + 2) % 7)) | (1 << ((root + 4) % 7))
    if ((letters & ~triad) === 0) return true
  }
  return false
}
