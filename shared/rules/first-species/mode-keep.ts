import { cite } from '@/shared/rules/cite'
import { NO_PARAMS, type NoParams } from '@/shared/rules/first-species/folds'
import { isOpening, waitsAfter, type OpeningState } from '@/shared/rules/first-species/opening'
import {
  alterationIn,
  breachAt,
  degreeIn,
  perfectKindOf,
  sonorityOf,
  type Sonority,
} from '@/shared/rules/first-species/sonority'
import { ALL_SPECIES } from '@/shared/rules/fold'
import type { Breach, Exercise, Rule } from '@/shared/rules/rule'
import { formatPitch } from '@/shared/theory/pitch'
import { isFinal } from '@/shared/theory/scale'

/**
 * Speaks where the interval is right and the note is wrong: an opening that is no perfect consonance is the matter of
 * the opening rules.
 */
export const modeKeep: Rule<OpeningState, NoParams> = {
  id: 'mode-keep',
  level: 'law',
  scope: 'pair',
  species: ALL_SPECIES,
  params: NO_PARAMS,
  start: (exercise) => ({ exercise, waitsIn: 0 }),
  step: ({ exercise, waitsIn }, moment) => {
    const now = sonorityOf(moment)
    return {
      state: { exercise, waitsIn: waitsAfter(moment, waitsIn) },
      breach: now && judge(now, isOpening(now, waitsIn), exercise),
    }
  },
  finish: () => null,
  key: ({ waitsIn }) => waitsIn,
  // Where nothing rests, none but the first note opens.
  reach: 0,
  explain: {
    title: 'Keep the mode',
    statement:
      'The line confirms the mode of the cantus: above, it begins on the final or the fifth degree; below, on the final; and it ends on the final.',
    why: 'The mode is heard from its first and last sonorities. A line that begins or ends elsewhere says another mode than the cantus.',
    mends: 'Begin on the final, or above the cantus on its fifth; end on the final.',
    sources: cite('FUXE r4', 'FUXN'),
    disagreement: 'Most textbooks fold this into the rules of the opening.',
    right: {
      cantus: 'D4 F4 E4 D4',
      line: 'D4 D4 C#4 D4',
      position: 'below',
      mode: 'dorian',
      final: 'D',
      breaches: [],
    },
    wrong: {
      cantus: 'D4 F4 E4 D4',
      line: 'G3 D4 C#4 D4',
      position: 'below',
      mode: 'dorian',
      final: 'D',
      breaches: [1],
    },
    messages: {
      'opens-elsewhere': 'The line begins on {note}, as if that were the final.',
      'closes-elsewhere': 'The line ends on {note}, not on the final.',
    },
  },
}

function judge(now: Sonority, opens: boolean, exercise: Exercise): Breach | null {
  if (!(opens || now.isLast) || perfectKindOf(now) === null || isFinal(now.note, exercise.final)) return null
  const args = { note: formatPitch(now.note) }
  if (now.isLast) return breachAt('closes-elsewhere', [now], args)
  const isFifthDegree = degreeIn(now.note, exercise) === 5 && alterationIn(now.note, exercise) === 0
  return isFifthDegree && exercise.position === 'above' ? null : breachAt('opens-elsewhere', [now], args)
}
