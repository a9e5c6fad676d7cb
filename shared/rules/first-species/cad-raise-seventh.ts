import { cite } from '@/shared/rules/cite'
import { eachSonority, NO_PARAMS, type NoParams } from '@/shared/rules/first-species/folds'
import { alterationIn, breachAt, degreeIn } from '@/shared/rules/first-species/sonority'
import { ALL_SPECIES } from '@/shared/rules/fold'
import type { Exercise, Rule } from '@/shared/rules/rule'
import { formatPitch } from '@/shared/theory/pitch'
import { raisesSeventh } from '@/shared/theory/scale'

export const cadRaiseSeventh: Rule<Exercise, NoParams> = {
  id: 'cad-raise-seventh',
  level: 'law',
  scope: 'pair',
  species: ALL_SPECIES,
  params: NO_PARAMS,
  ...eachSonority((now, { exercise, moment }) => {
    if (!moment.isPenultimate || !raisesSeventh(exercise.mode)) return null
    // A cantus that rises 7–1 has the seventh itself, unaltered; the line has no business on it.
    if (degreeIn(now.note, exercise) !== 7 || degreeIn(now.other, exercise) === 7) return null
    return alterationIn(now.note, exercise) === 1
      ? null
      : breachAt('not-raised', [now], { note: formatPitch(now.note) }, 'line')
  }),
  explain: {
    title: 'Raise the seventh at the close',
    statement:
      'In the last bar but one the seventh degree is raised wherever the mode has a whole tone under its final: in Dorian, Mixolydian and Aeolian.',
    why: 'A semitone leads into the final; a whole tone only leans on it. Ionian and Lydian have the semitone already, Phrygian has it in the other voice.',
    mends: 'Put a sharp before the seventh degree, or a natural where it has a flat.',
    sources: cite('E2 s1-4h', 'SEQ (quoting Jeppesen)', 'TALK', 'EX'),
    right: { cantus: 'D4 F4 E4 D4', line: 'A4 A4 C#5 D5', mode: 'dorian', final: 'D', breaches: [] },
    wrong: { cantus: 'D4 F4 E4 D4', line: 'A4 A4 C5 D5', mode: 'dorian', final: 'D', breaches: [3] },
    messages: { 'not-raised': 'The {note} before the close is not raised to a leading tone.' },
  },
}
