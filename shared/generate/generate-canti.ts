import type { GenerationProblem } from '@/shared/generate/generation-problem'
import { walkAll } from '@/shared/generate/walk'
import { fail, ok, type Result } from '@/shared/result'
import { momentOf } from '@/shared/rules/reading'
import { resolveRuleSet, type ActiveRule } from '@/shared/rules/rule-set'
import type { AnyRule, Exercise, RuleSet } from '@/shared/rules/rule'
import type { Choice, Place, Places } from '@/shared/search/place'
import type { Compass } from '@/shared/search/pool'
import { createSeeded } from '@/shared/search/seeded'
import { createWorld } from '@/shared/search/world'
import { WHOLE_TICKS } from '@/shared/theory/duration'
import type { Mode } from '@/shared/theory/mode'
import {
  comparePitches,
  diatonicNumber,
  formatPitch,
  letterIndex,
  parsePitch,
  type Pitch,
  type PitchClass,
} from '@/shared/theory/pitch'
import { scaleBetween, scaleOf } from '@/shared/theory/scale'

export const LEAST_CANTUS_BARS = 3
export const MOST_CANTUS_BARS = 40
/** A length that Fux himself writes. */
export const USUAL_CANTUS_BARS = 11

export type CantusRequest = Readonly<{
  mode: Mode
  final: PitchClass
  ruleSet: RuleSet
  seed: number
  /** How many to draw; one may come twice. */
  times?: number
  /** Bars; eleven when left out. */
  length?: number
  /** Lowest and highest note; when left out, from a fourth under a final about D4 to a tenth above it. */
  compass?: Compass
  /** Whether the preferences of the rule set are to have nothing to say either. */
  isTasteful?: boolean
}>

export type GeneratedCanti = Readonly<{
  canti: readonly (readonly Pitch[])[]
  /** How many such canti firmi there are. */
  count: bigint
  /** False when there are more than were counted; then the draw is not quite even. */
  isExact: boolean
}>

/** Draws canti firmi evenly from all of a mode and a length that a rule set has nothing to say against. */
export function generateCanti(request: CantusRequest): Result<GeneratedCanti, GenerationProblem> {
  const { mode, final, ruleSet, seed, times = 1, length = USUAL_CANTUS_BARS, isTasteful = false } = request
  if (!scaleOf(mode, final).ok) return problem('no-spelling', 'Nobody can spell this mode on this final.')
  if (!Number.isInteger(length) || length < LEAST_CANTUS_BARS || length > MOST_CANTUS_BARS) {
    return problem(
      'bad-length',
      `A cantus firmus has from ${LEAST_CANTUS_BARS} to ${MOST_CANTUS_BARS} notes, not ${length}.`,
    )
  }
  const { low, high } = boundsOf(request)
  const pitches = scaleBetween(mode, final, low, high)
  if (pitches.length === 0) return problem('bad-compass', 'No note of the mode lies in this compass.')
  const places = placesOfCantus(length, pitches)
  const exercise: Exercise = { cantus: [], mode, final, species: 1, position: 'above' }
  const walk = walkAll(createWorld(exercise, rulesOfCantus(ruleSet, isTasteful), places))
  if (walk.count === 0n) {
    const taste = isTasteful ? ' with nothing to remark on' : ''
    return problem(
      walk.isExact ? 'impossible' : 'not-found',
      `No cantus firmus of ${length} notes in this mode and compass keeps the rules${taste}.`,
    )
  }
  const seeded = createSeeded(seed)
  const canti = Array.from({ length: times }, () => walk.draw(seeded).map(({ solo }) => solo.note as Pitch))
  return ok({ canti, count: walk.count, isExact: walk.isExact })
}

const problem = (code: GenerationProblem['code'], message: string) => fail({ code, message, rules: [] })

/** The rules of a cantus alone, started as the checker starts them. */
function rulesOfCantus(ruleSet: RuleSet, isTasteful: boolean): readonly ActiveRule[] {
  return resolveRuleSet(ruleSet)
    .active.filter(({ rule }) => rule.scope === 'cantus' || rule.scope === 'melody')
    .map((active): ActiveRule => {
      const rule = ofCantus(active.rule)
      return isTasteful ? { ...active, rule: withoutRemarks(rule), level: 'law' } : { ...active, rule }
    })
}

const ofCantus = (rule: AnyRule): AnyRule => ({
  ...rule,
  start: (exercise, params) => rule.start(exercise, params, 'cantus') as unknown,
})

/** The same rule, whose remarks count as breaches. */
function withoutRemarks(rule: AnyRule): AnyRule {
  return {
    ...rule,
    step: (state, moment, params) => {
      const next = rule.step(state, moment, params)
      return next.breach?.isRemark ? { ...next, breach: { ...next.breach, isRemark: undefined } } : next
    },
    finish: (state, params, isComplete) => {
      const breach = rule.finish(state, params, isComplete)
      return breach?.isRemark ? { ...breach, isRemark: undefined } : breach
    },
  }
}

function placesOfCantus(length: number, pitches: readonly Pitch[]): Places {
  const places = Array.from({ length }, (_, index): Place => {
    const bar = index + 1
    const choices = pitches.map((note): Choice => {
      const onset = { bar, place: 0, note, isHeld: false }
      const moment = momentOf(onset, null, WHOLE_TICKS, index, index === length - 2, index === length - 1)
      const written = {
        bar,
        place: 0,
        pitch: formatPitch(note),
        ticks: WHOLE_TICKS,
        isTied: false,
        isForeign: false,
      }
      return { onsets: [written], solo: moment, pair: [], next: index + 1 }
    })
    return { bar, place: 0, choices }
  })
  return [...places, { bar: length + 1, place: 0, choices: [] }]
}

const D4_STEPS = 29
const STEPS_UNDER = 3
const STEPS_OVER = 9

function boundsOf({ final, compass }: CantusRequest): Readonly<{ low: Pitch; high: Pitch }> {
  const low = compass && parsePitch(compass.lowest)
  const high = compass && parsePitch(compass.highest)
  if (low?.ok && high?.ok && comparePitches(low.value, high.value) <= 0) {
    return { low: low.value, high: high.value }
  }
  // The final nearest to D4, in the middle of the voices that sing a cantus.
  const inOctave = (octave: number) => 7 * octave + letterIndex(final.letter)
  const octave = [3, 4].sort(
    (a, b) => Math.abs(inOctave(a) - D4_STEPS) - Math.abs(inOctave(b) - D4_STEPS),
  )[0] as number
  const steps = diatonicNumber({ ...final, octave })
  return { low: naturalAt(steps - STEPS_UNDER, -2), high: naturalAt(steps + STEPS_OVER, 2) }
}

const naturalAt = (steps: number, alteration: Pitch['alteration']): Pitch => ({
  letter: 'CDEFGAB'.charAt(steps % 7) as Pitch['letter'],
  alteration,
  octave: Math.floor(steps / 7),
})
