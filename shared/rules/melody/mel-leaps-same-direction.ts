import { z } from 'zod'
import {
  ALL_SPECIES,
  breachAt,
  goOn,
  isNoted,
  pack,
  packPitch,
  PITCH_ROOM,
  type Noted,
} from '@/shared/rules/fold'
import { isTriad } from '@/shared/rules/melody/triad'
import type { Breach, Rule, Voice } from '@/shared/rules/rule'
import { directionFrom, semitonesFrom, stepsFrom } from '@/shared/theory/interval'
import { formatPitch } from '@/shared/theory/pitch'

const params = z.strictObject({
  allow: z
    .enum(['never', 'triad', 'small', 'minor-thirds-or-fourths'])
    .default('never')
    .describe(
      'When two leaps may go the same way: never; when the three notes spell a major or minor triad; when both are thirds or fourths; when both are minor thirds, or both fourths with a step back after them.',
    ),
})
type Params = z.infer<typeof params>

/** `leap` is the note from which the last leap started; `owed` the two leaps that still want a step back. */
type State = Readonly<{
  voice: Voice
  leap: Noted | null
  before: Noted | null
  owed: readonly [Noted, Noted, Noted] | null
}>

const isLeapFrom = (a: Noted, b: Noted): boolean => Math.abs(stepsFrom(a.note, b.note)) >= 2

const areBoth = (first: Noted, middle: Noted, last: Noted, semitones: number): boolean =>
  Math.abs(semitonesFrom(first.note, middle.note)) === semitones &&
  Math.abs(semitonesFrom(middle.note, last.note)) === semitones

/** `owed`: allowed if the next note steps back. */
function judge(first: Noted, middle: Noted, last: Noted, { allow }: Params): 'allowed' | 'owed' | 'breach' {
  switch (allow) {
    case 'never':
      return 'breach'
    case 'triad':
      return isTriad([first.note, middle.note, last.note]) ? 'allowed' : 'breach'
    case 'small': {
      const isSmall = (a: Noted, b: Noted): boolean => Math.abs(stepsFrom(a.note, b.note)) <= 3
      return isSmall(first, middle) && isSmall(middle, last) ? 'allowed' : 'breach'
    }
    default:
      if (areBoth(first, middle, last, 3)) return 'allowed'
      return areBoth(first, middle, last, 5) && !last.isLast ? 'owed' : 'breach'
  }
}

const say = (voice: Voice, notes: readonly [Noted, Noted, Noted]): Breach =>
  breachAt(voice, stepsFrom(notes[0].note, notes[2].note) > 0 ? 'up' : 'down', notes, {
    first: formatPitch(notes[0].note),
    second: formatPitch(notes[1].note),
    third: formatPitch(notes[2].note),
  })

export const melLeapsSameDirection: Rule<State, Params> = {
  id: 'mel-leaps-same-direction',
  level: 'preference',
  scope: 'melody',
  species: ALL_SPECIES,
  params,
  start: (_exercise, _params, voice) => ({ voice, leap: null, before: null, owed: null }),
  step: (state, moment, given) => {
    const { voice, leap, before, owed } = state
    if (!isNoted(moment)) {
      return goOn(moment.note === null ? { voice, leap: null, before: null, owed: null } : state)
    }
    if (before === null || !isLeapFrom(before, moment)) {
      const isBack =
        owed === null ||
        (before !== null &&
          stepsFrom(before.note, moment.note) === -directionFrom(owed[0].note, owed[2].note))
      return {
        state: { voice, leap: null, before: moment, owed: null },
        breach: isBack ? null : say(voice, owed),
      }
    }
    // A leap after two that wanted a step back leaves them unanswered, whichever way it goes.
    const late = owed === null ? null : say(voice, owed)
    const goesOn =
      leap !== null && directionFrom(leap.note, before.note) === directionFrom(before.note, moment.note)
    const verdict = goesOn ? judge(leap, before, moment, given) : 'allowed'
    const notes = [leap, before, moment] as readonly [Noted, Noted, Noted]
    return {
      state: { voice, leap: before, before: moment, owed: verdict === 'owed' ? notes : null },
      breach: verdict === 'breach' ? say(voice, notes) : late,
    }
  },
  finish: () => null,
  key: ({ leap, before, owed }) =>
    pack(
      [packPitch(leap && leap.note), PITCH_ROOM],
      [packPitch(before && before.note), PITCH_ROOM],
      [owed === null ? 0 : 1, 2],
    ),
  reach: 3,
  explain: {
    title: 'Two leaps one way',
    statement:
      'Two leaps in the same direction are avoided, or allowed only when they are small or spell a triad.',
    why: 'Two leaps one way carry the line out of its compass and sound like a broken chord.',
    mends: 'Turn the second leap round, or replace one of them with a step.',
    sources: [
      { source: 'OMT1' },
      { source: 'MANNF' },
      { source: 'CFH', place: 'rule 6' },
      { source: 'HSR' },
      { source: 'LEHM', place: 'lesson I' },
      { source: 'RUSH', place: 'third species' },
      { source: 'EX' },
    ],
    right: { cantus: 'D4 F4 D4 G4 F4 E4 D4', mode: 'dorian', final: 'D', breaches: [] },
    wrong: { cantus: 'D4 F4 B4 A4 G4 F4 E4 D4', mode: 'dorian', final: 'D', breaches: [3] },
    messages: {
      up: 'Two leaps rise one after the other: {first}, {second}, {third}.',
      down: 'Two leaps fall one after the other: {first}, {second}, {third}.',
    },
    disagreement:
      'One handout demands a triad, Bridge and Lehmann discourage just that. Fux’s canti firmi on F and G have two leaps one way.',
  },
}
