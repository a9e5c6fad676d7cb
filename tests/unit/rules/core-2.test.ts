/**
 * Holds the engine’s `core-2` against the definition, line by line, over short canti. Its known count over a whole cantus
 * is found by the search, in that one’s own tests.
 */
import { createChecker, ruleSetProblems, type Exercise, type Finding } from '@/shared/rules'
import type { Standing } from '@/shared/rules/presets/core-1'
import { CORE_2_IDS, CORE_2_WHOLE_LINE, createCore2, type Core2Id } from '@/shared/rules/presets/core-2'
import { HALF_TICKS, WHOLE_TICKS } from '@/shared/theory/duration'
import type { Line, Note } from '@/shared/theory/note'
import { pitchClassOf, pitchOf } from '@/shared/theory/pitch'
import { pool, pool7, ref, type Case, type RefPitch } from './core-1-reference'
import { enumerate2, violations2, type Notes, type Slot } from './core-2-reference'

const SEED = 1726
const RANDOM_LINES = 2_500

/** Mulberry32: a small seeded generator, for tests only. */
function createRandom(seed: number): () => number {
  let state = seed
  return () => {
    state = (state + 0x6d2b79f5) | 0
    let mixed = Math.imul(state ^ (state >>> 15), 1 | state)
    mixed = (mixed + Math.imul(mixed ^ (mixed >>> 7), 61 | mixed)) ^ mixed
    return ((mixed ^ (mixed >>> 14)) >>> 0) / 4_294_967_296
  }
}

const exerciseOf = (k: Case): Exercise => ({
  cantus: k.cantus.map(pitchOf),
  mode: k.mode,
  final: pitchClassOf(k.final),
  species: 2,
  position: k.position,
})

function lineOf(z: Notes): Line {
  const line: Record<number, Note[]> = {}
  for (const { bar, half, p } of z) {
    const isAlone = z.filter((slot) => slot.bar === bar).length === 1
    const isWhole = isAlone && half === 1
    const notes = line[bar] ?? (isAlone && half === 2 ? [{ pitch: null, ticks: HALF_TICKS }] : [])
    line[bar] = [...notes, { pitch: p.name, ticks: isWhole ? WHOLE_TICKS : HALF_TICKS }]
  }
  return line
}

const nameLine = (z: Notes): string => z.map(({ bar, half, p }) => `${bar}.${half} ${p.name}`).join(', ')
const checkerOf = (k: Case) => createChecker(exerciseOf(k), createCore2({ lowest: k.lo, highest: k.hi }))

const standsFor = ({ rule, codes }: Standing, { ruleId, code }: Finding): boolean =>
  rule === ruleId && (codes === undefined || codes.includes(code))

/** Findings as violations of `core-2`, each written `id@bar.half`, sorted. */
function translate(k: Case, findings: readonly Finding[]): readonly string[] {
  const found = new Set<string>()
  for (const finding of findings) {
    const [id, another] = (Object.keys(CORE_2_IDS) as Core2Id[]).filter((one) =>
      CORE_2_IDS[one].some((standing) => standsFor(standing, finding)),
    )
    if (id === undefined || another) throw new Error(`${finding.ruleId}/${finding.code} stands for ${id}`)
    found.add(`${id}@${placeOf(k, id, finding)}`)
  }
  return [...found].sort()
}

function placeOf(k: Case, id: Core2Id, { notes }: Finding): string {
  if (CORE_2_WHOLE_LINE.has(id)) return '0.0'
  if (id === 'cadence') return `${k.cantus.length}.1`
  const ofLine = notes.filter(({ voice, place }) => voice === 'line' && (id !== 'passing' || place > 0))
  const last = ofLine.at(-1)
  if (!last) throw new Error(`${id} points at no note`)
  return `${last.bar}.${last.place === 0 ? 1 : 2}`
}

const expected = (k: Case, z: Notes): readonly string[] =>
  [...new Set(violations2(k, z).map(({ id, bar, half }) => `${id}@${bar}.${half}`))].sort()

/** Asks jest only where it fails: many thousands of lines are judged. */
function expectSame(
  k: Case,
  z: Notes,
  got: readonly string[],
  wanted: readonly string[],
  seed?: number,
): void {
  if (got.join() === wanted.join()) return
  expect({ seed, cantus: k.cantus.join(' '), line: nameLine(z), violations: got }).toEqual({
    seed,
    cantus: k.cantus.join(' '),
    line: nameLine(z),
    violations: wanted,
  })
}

/** Short canti, one with wide leaps, one that rises to its final, one under whose second degree no fifth is perfect. */
const SHORT: readonly Case[] = [
  { cantus: 'D4 F4 G4 F4 E4 D4', mode: 'dorian', final: 'D', position: 'above', lo: 'D4', hi: 'D6' },
  { cantus: 'D4 F4 G4 F4 E4 D4', mode: 'dorian', final: 'D', position: 'below', lo: 'A2', hi: 'A4' },
  { cantus: 'D4 A4 D4 E4 D4', mode: 'dorian', final: 'D', position: 'above', lo: 'A3', hi: 'D6' },
  { cantus: 'C4 G4 E4 B3 C4', mode: 'ionian', final: 'C', position: 'above', lo: 'C4', hi: 'C6' },
  { cantus: 'C4 G4 E4 B3 C4', mode: 'ionian', final: 'C', position: 'below', lo: 'G2', hi: 'G4' },
  { cantus: 'E4 C4 D4 F4 E4', mode: 'phrygian', final: 'E', position: 'below', lo: 'A2', hi: 'A4' },
  { cantus: 'G3 C4 B3 A3 G3', mode: 'mixolydian', final: 'G', position: 'above', lo: 'G3', hi: 'G5' },
].map(({ cantus, ...rest }) => ({ ...rest, cantus: cantus.split(' ') }) as Case)

const nameCase = ({ cantus, final, mode, position }: Case): string =>
  `${final} ${mode}, ${position} ${cantus.join(' ')}`

describe('core-2', () => {
  test('is a rule set without a fault', () => {
    expect(ruleSetProblems(createCore2({ lowest: 'D4', highest: 'D6' }))).toEqual([])
  })

  test.each(SHORT.map((k) => [nameCase(k), k] as const))(
    'finds nothing against any solution of %s, and judges every near miss as the definition does',
    (_name, k) => {
      const checker = checkerOf(k)
      let legal = 0
      enumerate2(k, (z) => {
        const wanted = expected(k, z)
        if (wanted.length === 0) legal += 1
        expectSame(k, z, translate(k, checker.checkLine(lineOf(z))), wanted)
      })
      expect(legal).toBeGreaterThan(0)
    },
  )

  test.each(SHORT.map((k, index) => [nameCase(k), k, index] as const))(
    'agrees with the definition on every violation of random lines of %s',
    (_name, k, index) => {
      const seed = SEED + index
      const random = createRandom(seed)
      const pick = <Item>(items: readonly Item[]): Item => items[Math.floor(random() * items.length)] as Item
      const checker = checkerOf(k)
      const usual = pool(k)
      const raised = pool7(k)
      const foreign = ['C#4', 'Db5', 'Eb4', 'F##4', 'Bb3', 'Bb4', 'Cb5', 'C2', 'G6'].map(ref)
      const solutions: Notes[] = []
      enumerate2(k, (z) => {
        if (solutions.length < 2_000 && violations2(k, z).length === 0) solutions.push(z)
      })
      const seen = new Set<string>()
      for (let round = 0; round < RANDOM_LINES; round += 1) {
        const z = drawLine()
        const wanted = expected(k, z)
        for (const violation of wanted) seen.add(violation.split('@')[0] as string)
        expectSame(k, z, translate(k, checker.checkLine(lineOf(z))), wanted, seed)
      }
      // `run` needs four downbeats of one kind, `bothleap` a cantus with wide leaps.
      const rare: readonly string[] = ['run', 'bothleap']
      expect(Object.keys(CORE_2_IDS).filter((id) => !rare.includes(id) && !seen.has(id))).toEqual([])

      /** A third of the lines are wild, a third wander by small moves, a third are solutions with a note or two spoilt. */
      function drawLine(): Notes {
        const any = (): RefPitch =>
          random() < 0.04 ? pick(foreign) : random() < 0.06 ? pick([...raised, ...usual]) : pick(usual)
        const kind = random()
        if (kind < 0.3) return drawShape().map((slot) => ({ ...slot, p: any() }))
        if (kind < 0.65) {
          let place = Math.floor(random() * usual.length)
          return drawShape().map((slot) => {
            place = Math.min(usual.length - 1, Math.max(0, place + Math.floor(random() * 7) - 3))
            return { ...slot, p: random() < 0.05 ? any() : (usual[place] as RefPitch) }
          })
        }
        const z = [...pick(solutions)]
        const spoilt = Math.floor(random() * 3)
        for (let count = 0; count < spoilt; count += 1) {
          const at = Math.floor(random() * z.length)
          z[at] = { ...(z[at] as Slot), p: any() }
        }
        return z
      }

      function drawShape(): readonly Omit<Slot, 'p'>[] {
        const n = k.cantus.length
        const slots: Omit<Slot, 'p'>[] = []
        const isRest = random() < 0.5
        const isWhole = random() < 0.3
        for (let bar = 1; bar <= n; bar += 1) {
          if (!(bar === 1 && isRest)) slots.push({ bar, half: 1 })
          if (bar < n && !(bar === n - 1 && isWhole)) slots.push({ bar, half: 2 })
        }
        return slots
      }
    },
  )
})
