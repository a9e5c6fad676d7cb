/** What holds of all rules over lines of two and four notes to the bar, as `properties` has it for one. */
import fc from 'fast-check'
import { createChecker, PRESETS, RULES, type Finding, type RuleSet, type Species } from '@/shared/rules'
import { readMoments, readVoice } from '@/shared/rules/reading'
import type { AnyRule, Exercise, Moment } from '@/shared/rules/rule'
import { WHOLE_TICKS } from '@/shared/theory/duration'
import type { BarNotes, Line } from '@/shared/theory/note'
import type { PitchName } from '@/shared/theory/pitch'
import { anyExercise, SEED, someBars, without } from './random-score'

const BARS = 6
const RUNS = { seed: SEED, numRuns: 60 }
const MANY: readonly PitchName[] = [
  'B3',
  'C#4',
  'D4',
  'E4',
  'F4',
  'G4',
  'A4',
  'Bb4',
  'B4',
  'C5',
  'D5',
  'E5',
  'F5',
]
const FEW: readonly PitchName[] = ['D4', 'E4', 'F4', 'A4']

const ALL: RuleSet = {
  id: 'all',
  name: 'All',
  rules: Object.fromEntries(RULES.map(({ id }) => [id, { level: 'law' }])),
}

const SPECIES = [
  [2, 2],
  [3, 4],
] as const

/** A bar of equal notes that mostly move by small steps, as lines do. */
function anyBar(names: readonly PitchName[], notes: number): fc.Arbitrary<BarNotes> {
  const start = fc.integer({ min: 0, max: names.length - 1 })
  return fc
    .tuple(start, fc.array(fc.integer({ min: -3, max: 3 }), { minLength: notes, maxLength: notes }))
    .map(([first, moves]) => {
      let place = first
      return moves.map((move) => {
        place = Math.min(names.length - 1, Math.max(0, place + move))
        return { pitch: names[place] as PitchName, ticks: WHOLE_TICKS / notes }
      })
    })
}

/** Every bar written in equal notes, the last a whole note. */
const anyQuickLine = (notes: number, names = MANY): fc.Arbitrary<Line> =>
  fc
    .tuple(fc.array(anyBar(names, notes), { minLength: BARS - 1, maxLength: BARS - 1 }), anyBar(names, 1))
    .map(([bars, last]) => Object.fromEntries([...bars, last].map((bar, index) => [index + 1, bar])))

const place = ({ ruleId, code, bars }: Finding): string => `${ruleId} ${code} ${bars.join(',')}`

/** Rules of a run, a count or an extreme: with more bars written they may be told at another place or in another word. */
const isRoaming = (ruleId: string): boolean =>
  /-run$|perfects$|^cf-range$|voice-compass|motive|sequence|circling|arch|perfect-to|dist-max|s1-repeat|aug-dim|one-direction|leap-run/.test(
    ruleId,
  )

describe.each(SPECIES)('species %i', (species: Species, notes) => {
  describe.each([...PRESETS, ALL].map((ruleSet) => [ruleSet.id, ruleSet] as const))(
    'under %s',
    (_id, ruleSet) => {
      test('what is said of a partial line is true of every way of writing it out', () => {
        fc.assert(
          fc.property(
            anyExercise(BARS, species),
            anyQuickLine(notes),
            someBars(BARS),
            (exercise, line, gaps) => {
              const { checkLine } = createChecker(exercise, ruleSet)
              const whole = checkLine(line)
              const places = new Set(whole.map(place))
              const rules = new Set(whole.map(({ ruleId }) => ruleId))
              for (const finding of checkLine(without(line, gaps))) {
                const isKept = isRoaming(finding.ruleId)
                  ? rules.has(finding.ruleId)
                  : places.has(place(finding))
                expect([place(finding), isKept]).toEqual([place(finding), true])
              }
            },
          ),
          RUNS,
        )
      })

      test('annotating proposals says just what checking each one says of its bars', () => {
        const anyProposal = fc
          .tuple(fc.integer({ min: 1, max: BARS - 1 }), anyBar(MANY, notes))
          .map(([bar, written]) => ({ [bar]: written }))
        fc.assert(
          fc.property(
            anyExercise(BARS, species),
            anyQuickLine(notes),
            someBars(BARS, 2),
            fc.array(anyProposal, { minLength: 1, maxLength: 4 }),
            (exercise, written, gaps, proposals) => {
              const line = without(written, gaps)
              const checker = createChecker(exercise, ruleSet)
              const annotated = checker.annotate(line, proposals)
              proposals.forEach((proposal, index) => {
                const expected = checker
                  .checkLine({ ...line, ...proposal })
                  .filter(({ bars }) => bars.some((bar) => bar in proposal))
                expect(annotated[index]).toEqual(expected)
              })
            },
          ),
          RUNS,
        )
      })
    },
  )

  const rules = RULES.filter((rule) => rule.species.has(species))

  test.each(rules.map((rule) => [rule.id, rule] as const))(
    'the keys of %s stand for all that is to come',
    (_id, rule) => {
      fc.assert(
        fc.property(
          anyExercise(BARS, species),
          fc.array(anyQuickLine(notes, FEW), { minLength: 20, maxLength: 20 }),
          fc.integer({ min: 1, max: (BARS - 1) * notes }),
          (exercise, lines, cut) => {
            const readings = lines.map((line) =>
              rule.scope === 'pair' ? readMoments(exercise, line) : readVoice(BARS, line),
            )
            const firstWithKey = new Map<number, unknown>()
            for (const reading of readings) {
              const state = stateAfter(rule, exercise, reading.slice(0, cut))
              const key = rule.key(state)
              if (!Number.isSafeInteger(key)) expect(key).toBe('a whole number')
              const twin = firstWithKey.get(key)
              if (twin === undefined) {
                firstWithKey.set(key, state)
                continue
              }
              for (const other of readings.slice(0, 5)) {
                const rest = other.slice(cut)
                const [one, two] = [futureOf(rule, state, rest), futureOf(rule, twin, rest)]
                if (one !== two) expect(one).toBe(two)
              }
            }
          },
        ),
        { seed: SEED, numRuns: 25 },
      )
    },
  )
})

function stateAfter(rule: AnyRule, exercise: Exercise, moments: readonly Moment[]): unknown {
  const params: unknown = rule.params.parse({})
  let state: unknown = rule.start(exercise, params, 'line')
  for (const moment of moments) state = rule.step(state, moment, params).state
  return state
}

/** All that a rule says from a state on. */
function futureOf(rule: AnyRule, start: unknown, moments: readonly Moment[]): string {
  const params: unknown = rule.params.parse({})
  let said = ''
  let state = start
  for (const moment of moments) {
    const next = rule.step(state, moment, params)
    state = next.state
    if (next.breach) said += `${moment.index} ${next.breach.code}; `
  }
  const last = rule.finish(state, params, true)
  return last ? `${said}end ${last.code}` : said
}
