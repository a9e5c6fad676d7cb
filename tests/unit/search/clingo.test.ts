/** The search and an answer-set solver, which share nothing but the definition of the rule set, find the same lines. */
import { createCore1 } from '@/shared/rules'
import { createSearch } from '@/shared/search'
import type { PitchName } from '@/shared/theory/pitch'
import { chromaticNumber, diatonicNumber, pitchOf } from '@/shared/theory/pitch'
import { FUX_CANTI } from '@/tests/fixtures/canti-firmi'
import { CLINGO_MISSING, hasClingo, runClingo, type ClingoCase } from '@/tests/support/clingo'
import { createDice, exerciseOf, SEED, spell } from './cases'

const isThere = hasClingo()
if (!isThere) console.warn(CLINGO_MISSING)

const POSITIONS = [
  { position: 'above', lo: 'C4', hi: 'C6' },
  { position: 'below', lo: 'F2', hi: 'G4' },
] as const

const FUX_CASES: readonly ClingoCase[] = FUX_CANTI.flatMap(({ notes, mode, final }) =>
  POSITIONS.map((where) => ({ cantus: notes.split(' '), mode, final, ...where })),
)

/** Canti that start and end on the final and close by step, the rest a walk by steps and thirds. */
function randomCases(count: number): readonly ClingoCase[] {
  const dice = createDice(SEED)
  const finals = FUX_CANTI.map(({ mode, final, notes }) => ({
    mode,
    final,
    home: notes.split(' ').at(-1) as string,
  }))
  return Array.from({ length: count }, (_, turn): ClingoCase => {
    const { mode, final, home } = finals[dice(finals.length)] as (typeof finals)[number]
    const from = diatonicNumber(pitchOf(home))
    const steps = [from]
    for (let inner = 4 + dice(5); inner > 0; inner -= 1) {
      const next = (steps.at(-1) as number) + ([-2, -1, 1, 2][dice(4)] as number)
      steps.push(Math.max(from - 2, Math.min(from + 6, next)))
    }
    steps.push(from + (dice(4) === 0 ? -1 : 1), from)
    const cantus = steps.map((step) => 'CDEFGAB'[step % 7] + String(Math.floor(step / 7)))
    return { cantus, mode, final, ...(POSITIONS[turn % 2] as (typeof POSITIONS)[number]) }
  })
}

const CASES = [...FUX_CASES, ...randomCases(24)]
const NAMES = new Map<string, PitchName>()
for (const letter of 'CDEFGAB')
  for (const sign of ['b', '', '#'])
    for (let octave = 1; octave < 8; octave += 1) {
      const pitch = pitchOf(`${letter}${sign}${octave}`)
      NAMES.set(`${diatonicNumber(pitch)},${chromaticNumber(pitch)}`, `${letter}${sign}${octave}`)
    }

/** `x(3,29,50)` and its like as a line in words. */
const readModel = (atoms: readonly string[]): string =>
  atoms
    .map((atom) => /^x\((\d+),(.*)\)$/.exec(atom) as RegExpExecArray)
    .sort((a, b) => Number(a[1]) - Number(b[1]))
    .map(([, , place]) => NAMES.get(place as string))
    .join(' ')

const describeHere = isThere ? describe : describe.skip
describeHere(`core-1, Fux's canti firmi and 24 more from seed ${SEED}`, () => {
  const counts: number[] = []
  test.each(CASES.map((given) => ({ ...given, name: given.cantus.join(' ') })))(
    '$position $name: the same solutions and alive notes',
    (given) => {
      const { cantus, mode, final, position, lo, hi } = given
      const { count, models } = runClingo('core-1', given)
      counts.push(count)
      const exercise = exerciseOf(cantus.join(' '), mode, final, position)
      const ways = createSearch(exercise, createCore1({ lowest: lo, highest: hi })).find()
      const lines = models.map(readModel)
      expect(ways.count).toBe(BigInt(count))
      expect([...ways.solutions()].map(spell).sort()).toEqual([...lines].sort())
      const alive = new Map<string, number>()
      for (const line of lines) {
        for (const [index, pitch] of line.split(' ').entries()) {
          const at = `${index + 1} ${pitch}`
          alive.set(at, (alive.get(at) ?? 0) + 1)
        }
      }
      const found = ways
        .alive()
        .flatMap(({ bar, notes }) =>
          notes.map((note) => [`${bar} ${note.pitch}`, Number(note.count)] as const),
        )
      expect(new Map(found)).toEqual(alive)
    },
  )

  test('the cases have solutions to find, and some have none', () => {
    expect(counts.filter((count) => count > 0).length).toBeGreaterThan(12)
    expect(counts.filter((count) => count === 0).length).toBeGreaterThan(0)
  })
})
