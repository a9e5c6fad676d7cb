import { cite } from '@/shared/rules/cite'
import { acrossBars, NO_PARAMS, type NeighbourState, type NoParams } from '@/shared/rules/first-species/folds'
import { breachAt } from '@/shared/rules/first-species/sonority'
import { ALL_SPECIES } from '@/shared/rules/fold'
import type { Rule } from '@/shared/rules/rule'
import { formatPitchClass, type Pitch } from '@/shared/theory/pitch'

const isAltered = (a: Pitch, b: Pitch): boolean => a.letter === b.letter && a.alteration !== b.alteration

export const relChromatic: Rule<NeighbourState, NoParams> = {
  id: 'rel-chromatic',
  level: 'law',
  scope: 'pair',
  species: ALL_SPECIES,
  params: NO_PARAMS,
  ...acrossBars((before, now) => {
    const pair = isAltered(before.note, now.other)
      ? [before.note, now.other]
      : isAltered(before.other, now.note)
        ? [before.other, now.note]
        : null
    if (pair === null) return null
    const [first, second] = pair as [Pitch, Pitch]
    return breachAt('cross', [before, now], {
      first: formatPitchClass(first),
      second: formatPitchClass(second),
    })
  }),
  explain: {
    title: 'No cross relation',
    statement: 'A note in one voice is not followed at once by its altered form in the other voice.',
    why: 'Natural and sharp in two voices side by side sound like a mistake of one of them.',
    mends: 'Put another sonority between the two, or let the same voice sing both.',
    sources: cite('NOTAV I-iv', 'S&S°'),
    right: { cantus: 'D4 C4 F4 E4 D4', line: 'D5 E5 D5 C#5 D5', mode: 'dorian', final: 'D', breaches: [] },
    wrong: { cantus: 'D4 C4 E4 D4', line: 'A4 A4 C#5 D5', mode: 'dorian', final: 'D', breaches: [3] },
    messages: { cross: 'The {first} of one voice is followed by {second} in the other.' },
  },
}
