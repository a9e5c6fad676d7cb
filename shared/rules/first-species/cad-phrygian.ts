import { cite } from '@/shared/rules/cite'
import { eachSonority, NO_PARAMS, type NoParams } from '@/shared/rules/first-species/folds'
import { alterationIn, breachAt, degreeIn } from '@/shared/rules/first-species/sonority'
import { ALL_SPECIES } from '@/shared/rules/fold'
import type { Exercise, Rule } from '@/shared/rules/rule'
import { formatPitch } from '@/shared/theory/pitch'

export const cadPhrygian: Rule<Exercise, NoParams> = {
  id: 'cad-phrygian',
  level: 'law',
  scope: 'pair',
  species: ALL_SPECIES,
  params: NO_PARAMS,
  ...eachSonority((now, { exercise, moment }) => {
    if (!moment.isPenultimate || exercise.mode !== 'phrygian') return null
    const isAltered = degreeIn(now.note, exercise) === 7 && alterationIn(now.note, exercise) !== 0
    return isAltered ? breachAt('altered', [now], { note: formatPitch(now.note) }, 'line') : null
  }),
  explain: {
    title: 'The Phrygian close',
    statement: 'Phrygian keeps its natural seventh at the close; the semitone is in the step 2–1.',
    why: 'F falls to E by a semitone already. With D raised as well both voices would have one, and the sixth between them would be augmented.',
    mends: 'Leave the seventh as the mode has it, as in D to E over F to E.',
    sources: cite('SEQ (quoting Jeppesen)', 'EX Figs 11, 12, 36, 37, 57, 58, 75, 76, 84'),
    right: { cantus: 'E4 G4 F4 E4', line: 'B4 B4 D5 E5', mode: 'phrygian', final: 'E', breaches: [] },
    wrong: { cantus: 'E4 G4 F4 E4', line: 'B4 B4 D#5 E5', mode: 'phrygian', final: 'E', breaches: [3] },
    messages: { altered: 'The {note} is altered; Phrygian closes with its own seventh.' },
  },
}
