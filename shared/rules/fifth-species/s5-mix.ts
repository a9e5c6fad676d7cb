import { z } from 'zod'
import { cite } from '@/shared/rules/cite'
import { exampleIn } from '@/shared/rules/example-in'
import {
  DOTTED_HALF_TICKS,
  EIGHTH_TICKS,
  FIFTH_SPECIES,
  isEighth,
  packOnset,
} from '@/shared/rules/fifth-species/folds'
import {
  breachAt,
  isDissonance,
  nameOf,
  type Sonority,
  sonorityOf,
} from '@/shared/rules/first-species/sonority'
import { breachAt as breachOfLine, goOn, pack, packPitch, PITCH_ROOM } from '@/shared/rules/fold'
import { isStepDown, isSuspension, isUpbeat, ticksInBar } from '@/shared/rules/fourth-species/folds'
import type { Breach, Moment, Rule, Step } from '@/shared/rules/rule'
import { HALF_TICKS, QUARTER_TICKS, WHOLE_TICKS } from '@/shared/theory/duration'
import { stepsFrom } from '@/shared/theory/interval'
import type { Pitch } from '@/shared/theory/pitch'

const PARAMS = z.strictObject({
  neighbour: z
    .enum(['no', 'lower', 'both'])
    .default('both')
    .describe('Dissonant neighbour notes in quarters.'),
  thirdQuarter: z
    .enum(['between-consonances', 'falling', 'by-step'])
    .default('between-consonances')
    .describe(
      'A dissonant quarter on the third beat: passing between consonances, only falling, or any by step.',
    ),
  cambiata: z
    .boolean()
    .default(true)
    .describe('A dissonance may fall a third if the line then rises a step.'),
  resolution: z
    .enum(['third-quarter', 'fourth-quarter'])
    .default('third-quarter')
    .describe('The latest place at which a decorated suspension resolves.'),
})
type Params = z.infer<typeof PARAMS>

/** What the notes that have sounded ask of those to come. */
type State = Readonly<{
  /** The note before the last, and whether it agreed with the cantus. */
  first: Pitch | null
  wasFirstConsonant: boolean
  before: Sonority | null
  /** A suspension that is being decorated, and still has to resolve in this bar. */
  suspended: Sonority | null
  /** A cambiata has fallen its third, and still has to rise. */
  mustRise: boolean
}>
const NONE: State = { first: null, wasFirstConsonant: true, before: null, suspended: null, mustRise: false }

const VALUES: ReadonlySet<number> = new Set([
  EIGHTH_TICKS,
  QUARTER_TICKS,
  HALF_TICKS,
  DOTTED_HALF_TICKS,
  WHOLE_TICKS,
])
const example = exampleIn(5, 'D4 F4 E4 D4')

/**
 * Each note by the rules of its species: dissonances on the downbeat as in fourth, in halves as in second, in quarters
 * and eighths as in third. The form of a decoration is the matter of `s5-ornamented-resolution`.
 */
export const s5Mix: Rule<State, Params> = {
  id: 's5-mix',
  level: 'law',
  scope: 'pair',
  species: FIFTH_SPECIES,
  params: PARAMS,
  start: () => NONE,
  step: (state, moment, params) => {
    const odd = oddValue(moment)
    const now = sonorityOf(moment)
    if (now === null) return { state: NONE, breach: odd }
    const next = follow(state, now, params)
    return odd === null ? next : { state: next.state, breach: odd }
  },
  finish: () => null,
  key: ({ first, wasFirstConsonant, before, suspended, mustRise }) =>
    pack(
      [packPitch(first), PITCH_ROOM],
      [wasFirstConsonant ? 1 : 0, 2],
      [before === null ? 0 : packOnset(before), PITCH_ROOM * 8 * 9 * 2],
      [packPitch(suspended && suspended.note), PITCH_ROOM],
      [mustRise ? 1 : 0, 2],
    ),
  explain: {
    title: 'Each note by the rules of its species',
    statement:
      'Halves, quarters, eighths and held notes are mixed freely, and each of them keeps the rules of the species it comes from: what is dissonant passes by step, or was held over and falls.',
    why: 'Fifth species adds no new dissonance. It lets the line speak in all the rhythms that were learnt one by one.',
    mends: 'Ask of which species the note is, and write it as there.',
    sources: cite('OMT2', 'RUSH V', 'LEHM IX', 'CHER 5th', 'GIRT'),
    disagreement:
      'The sources differ on dissonant neighbour notes and on the dissonant third quarter as they do in third species.',
    right: example('r:2,A4:2~ A4:1,C5:1,D5:2~ D5:1,C#5:0.5,B4:0.5,C#5:2 D5'),
    wrong: example('r:2,A4:2~ A4:1,B4:1,D5:2~ D5:2,C#5:2 D5', [2]),
    messages: {
      value: 'This note has a length that fifth species does not use.',
      'struck-downbeat': 'The downbeat is a {interval} that was not held over.',
      'not-by-step': 'The {interval} is a dissonance that is not entered and left by step.',
      neighbour: 'The {interval} is a dissonant neighbour note, which this rule set does not use here.',
      'third-quarter': 'The {interval} on the third quarter does not pass between consonances.',
      cambiata: 'After the dissonance that fell a third the line does not rise by step.',
      unresolved: 'The suspended {interval} does not come to its resolution in time.',
      'to-dissonance': 'The suspended note falls to a {interval}, which is dissonant.',
    },
  },
}

function oddValue(moment: Moment): Breach | null {
  // A note that goes on within its bar was counted where it began.
  if (moment.note === null || (!moment.isStruck && moment.place > 0)) return null
  if (moment.note === 'rest') return moment.isFirst ? null : breachOfLine('line', 'value', [moment])
  return VALUES.has(ticksInBar(moment)) ? null : breachOfLine('line', 'value', [moment])
}

function follow(state: State, now: Sonority, params: Params): Step<State> {
  const { before } = state
  const going: State = {
    first: before && before.note,
    wasFirstConsonant: before === null || !isDissonance(before),
    before: now,
    suspended: null,
    mustRise: false,
  }
  // A note that goes on within its bar is the same note.
  if (before !== null && !now.isStruck && now.place > 0)
    return goOn({ ...state, before: { ...before, ticks: now.ticks } })
  if (state.suspended !== null) return decorate(state.suspended, going, now, params)
  if (before !== null && isSuspension(before)) return decorate(before, going, now, params)
  const breach = judge(state, before, now, params)
  if (breach !== null) return { state: { ...going, wasFirstConsonant: true }, breach }
  if (now.place === 0 && now.isStruck && isDissonance(now)) {
    return { state: NONE, breach: breachAt('struck-downbeat', [now], { interval: nameOf(now) }) }
  }
  const hasFallenThird = before !== null && isPassingKind(before) && stepsFrom(before.note, now.note) === -2
  return goOn({ ...going, mustRise: hasFallenThird })
}

/** A dissonance that was struck after the downbeat: what enters and leaves by step, if it is right. */
const isPassingKind = (now: Sonority): boolean => isDissonance(now) && now.place > 0

function judge(state: State, before: Sonority | null, now: Sonority, params: Params): Breach | null {
  if (before === null) return null
  if (state.mustRise && stepsFrom(before.note, now.note) !== 1)
    return breachAt('cambiata', [before, now], {}, 'line')
  if (!isPassingKind(before) || state.first === null) return null
  const args = { interval: nameOf(before) }
  const tell = (code: string): Breach => breachAt(code, [before], args)
  const entry = stepsFrom(state.first, before.note)
  const exit = stepsFrom(before.note, now.note)
  if (Math.abs(entry) !== 1) return tell('not-by-step')
  if (
    exit === -2 &&
    entry === -1 &&
    params.cambiata &&
    ticksInBar(before) <= QUARTER_TICKS &&
    !isDissonance(now)
  ) {
    return null
  }
  if (Math.abs(exit) !== 1) return tell('not-by-step')
  if (entry !== exit) return mayTurn(before, entry, params) ? null : tell('neighbour')
  if (!isUpbeat(before) || ticksInBar(before) >= HALF_TICKS) return null
  return passesOnThird(state, entry, now, params) ? null : tell('third-quarter')
}

/** Halves do not turn back, eighths turn below, quarters as the rule set has it. */
function mayTurn(before: Sonority, entry: number, { neighbour }: Params): boolean {
  if (ticksInBar(before) >= HALF_TICKS) return false
  if (isEighth(before)) return entry === -1 || neighbour === 'both'
  return neighbour === 'both' || (neighbour === 'lower' && entry === -1)
}

function passesOnThird(state: State, entry: number, now: Sonority, { thirdQuarter }: Params): boolean {
  if (thirdQuarter === 'by-step') return true
  if (thirdQuarter === 'falling') return entry === -1
  return state.wasFirstConsonant && !isDissonance(now)
}

/** Follows a suspension through its decoration until the note a step below it arrives. */
function decorate(suspended: Sonority, going: State, now: Sonority, { resolution }: Params): Step<State> {
  const args = { interval: nameOf(suspended) }
  const clean = { ...going, wasFirstConsonant: true }
  if (isStepDown(suspended, now)) {
    const isGood = !isDissonance(now) && now.bar === suspended.bar
    if (isGood) return goOn(clean)
    const code = now.bar === suspended.bar ? 'to-dissonance' : 'unresolved'
    const toArgs = code === 'to-dissonance' ? { interval: nameOf(now) } : args
    return { state: { ...clean, before: null }, breach: breachAt(code, [suspended, now], toArgs) }
  }
  const latest = resolution === 'third-quarter' ? HALF_TICKS : DOTTED_HALF_TICKS
  const isLate = now.bar !== suspended.bar || now.place >= latest
  if (isLate)
    return {
      state: { ...clean, before: null },
      breach: breachAt('unresolved', [suspended, now], args, 'line'),
    }
  return goOn({ ...clean, suspended })
}
