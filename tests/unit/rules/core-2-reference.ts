/**
 * The rule set `core-2` once more, written from its definition alone, as `core-1-reference` is; the common definitions
 * are shared with that one. Longer than a file should be, because it is read beside the definition from top to bottom.
 */
import {
  CONS,
  deg,
  diatonic,
  dir,
  g,
  inRange,
  less,
  ltone,
  MELODIC,
  PERF,
  pool,
  pool7,
  raised7,
  red,
  ref,
  s,
  same,
  type Case,
  type RefPitch,
} from './core-1-reference'

/** A sounding note at a slot: 1 for the downbeat of a bar, 2 for its upbeat. */
export type Slot = Readonly<{ bar: number; half: 1 | 2; p: RefPitch }>
/** All notes of a line in time order. REST: bar 1 has no downbeat. WHOLE: the last bar but one has no upbeat. */
export type Notes = readonly Slot[]
export type Violation2 = Readonly<{ id: string; bar: number; half: number }>

const MAX_VERTICAL = 11
const MAX_RANGE = 9
const MAX_RUN = 3

/** The violations that come to be known with note `k` (from 1) of `z`; those of the whole line are told elsewhere. */
export function knownAt(q: Case, z: Notes, k: number, isWhole: boolean): Violation2[] {
  const found: Violation2[] = []
  const n = q.cantus.length
  const f = (bar: number) => ref(q.cantus[bar - 1] as string)
  const Z = (j: number) => z[j - 1] as Slot
  const { bar, half, p } = Z(k)
  const at = (id: string, slot: Readonly<{ bar: number; half: number }> = { bar, half }) => {
    found.push({ id, bar: slot.bar, half: slot.half })
  }
  const D = (i: number) => z.find((slot) => slot.bar === i && slot.half === 1)?.p
  const L = (i: number) => z.filter((slot) => slot.bar === i).at(-1)?.p as RefPitch
  const isLastOf = (slot: Slot) => slot.half === 2 || slot.bar === n || (slot.bar === n - 1 && isWhole)

  const isPool = inRange(q, p) && diatonic(q, p)
  const isPool7 = inRange(q, p) && raised7(q, p)
  if (!isPool && !(bar === n - 1 && isLastOf(Z(k)) && isPool7)) at('pool')
  if (half === 1 && !CONS.includes(red(f(bar), p))) at('cons')

  // An upbeat is judged with the note after it.
  const up = k >= 2 ? Z(k - 1) : undefined
  if (up && up.half === 2 && !CONS.includes(red(f(up.bar), up.p))) {
    const down = D(up.bar)
    const passes =
      down !== undefined && g(down, up.p) === 1 && g(up.p, p) === 1 && dir(down, up.p) === dir(up.p, p)
    if (!passes) at('passing', up)
  }
  if (half === 1 && bar > 1 && bar < n && same(p, f(bar))) at('unison')
  if (g(f(bar), p) > MAX_VERTICAL) at('dist')
  if (k === 1) {
    const allowed = q.position === 'above' ? ['0,0', '4,7'] : ['0,0']
    if (!allowed.includes(red(f(bar), p))) at('open')
  }
  if (bar === n && red(f(n), p) !== '0,0') at('close')
  if (bar === n) {
    const isFinal = (pitch: RefPitch) => deg(q, pitch) === 1 && diatonic(q, pitch)
    const last = L(n - 1)
    const first = isFinal(f(n)) && isFinal(p)
    const second =
      (deg(q, f(n - 1)) === 2 && ltone(q, last)) || (deg(q, f(n - 1)) === 7 && deg(q, last) === 2)
    const third = g(f(n - 1), f(n)) === 1 && g(last, p) === 1
    const fourth = dir(f(n - 1), f(n)) === -dir(last, p)
    const isConsonant = CONS.includes(red(f(n - 1), last))
    const hasFifth = isWhole || red(f(n - 1), D(n - 1) as RefPitch) === '4,7'
    if (!(first && second && third && fourth && isConsonant && hasFifth)) at('cadence')
  }
  if (q.position === 'above' ? less(p, f(bar)) : less(f(bar), p)) at('cross')

  if (half === 1 && bar >= 2) {
    const before = L(bar - 1)
    const isOver =
      q.position === 'above'
        ? less(p, f(bar - 1)) || less(before, f(bar))
        : less(f(bar - 1), p) || less(f(bar), before)
    if (isOver) at('overlap')
    const way = dir(f(bar - 1), f(bar))
    if (PERF.includes(red(f(bar), p)) && way !== 0 && way === dir(before, p)) at('direct')
    const down = D(bar - 1)
    if (down) {
      const kind = red(f(bar - 1), down)
      const isEqual = PERF.includes(kind) && kind === red(f(bar), p)
      if (isEqual && way !== 0 && way === dir(down, p)) at('downbeats')
    }
    const sizes: number[] = []
    for (let i = bar; i >= 1 && sizes.length <= MAX_RUN; i -= 1) {
      const one = D(i)
      if (one) sizes.push(g(f(i), one) % 7)
    }
    if (
      sizes.length === MAX_RUN + 1 &&
      (sizes.every((size) => size === 2) || sizes.every((size) => size === 5))
    ) {
      at('run')
    }
    if (g(f(bar - 1), f(bar)) >= 3 && g(before, p) >= 3 && way !== 0 && way === dir(before, p)) at('bothleap')
  }

  if (k >= 2) {
    const before = Z(k - 1).p
    if (same(before, p)) at('repeat')
    else {
      const move = `${g(before, p)},${s(before, p)}`
      if (!MELODIC.includes(move) && !(move === '5,8' && dir(before, p) === 1)) at('melodic')
    }
  }
  if (k >= 3) {
    const a = Z(k - 2).p
    const b = Z(k - 1).p
    if (g(a, b) >= 3 && !(g(b, p) === 1 && dir(b, p) === -dir(a, b))) at('recover')
    if (g(a, b) >= 2 && g(b, p) >= 2 && dir(a, b) === dir(b, p)) at('leaps')
  }
  return found
}

/** The violations of the whole line: its range, its peak, and its turning points. */
function ofTheWhole(z: Notes): Violation2[] {
  const found: Violation2[] = []
  const pitches = z.map(({ p }) => p)
  const high = pitches.reduce((a, b) => (less(a, b) ? b : a))
  const low = pitches.reduce((a, b) => (less(b, a) ? b : a))
  if (g(low, high) > MAX_RANGE) found.push({ id: 'range', bar: 0, half: 0 })
  if (pitches.filter((p) => same(p, high)).length >= 2) found.push({ id: 'peak', bar: 0, half: 0 })
  const groups: { p: RefPitch; last: Slot }[] = []
  for (const slot of z) {
    const group = groups.at(-1)
    if (group && same(group.p, slot.p)) group.last = slot
    else groups.push({ p: slot.p, last: slot })
  }
  const Y = (j: number) => (groups[j] as { p: RefPitch }).p
  const turning = groups
    .map((_, j) => j)
    .filter((j) => j === 0 || j === groups.length - 1 || dir(Y(j - 1), Y(j)) !== dir(Y(j), Y(j + 1)))
  for (let t = 1; t < turning.length; t += 1) {
    const to = turning[t] as number
    const span = `${g(Y(turning[t - 1] as number), Y(to))},${s(Y(turning[t - 1] as number), Y(to))}`
    const { bar, half } = (groups[to] as { last: Slot }).last
    if (span === '3,6' || span === '4,6') found.push({ id: 'tritone', bar, half })
  }
  return found
}

const isWholeIn = (q: Case, z: Notes): boolean =>
  !z.some(({ bar, half }) => bar === q.cantus.length - 1 && half === 2)

/** All violations of a whole line. */
export function violations2(q: Case, z: Notes): Violation2[] {
  const isWhole = isWholeIn(q, z)
  return [...z.flatMap((_, index) => knownAt(q, z, index + 1, isWhole)), ...ofTheWhole(z)]
}

/** Walks every line, in all four shapes, that breaks nothing on its way, and hands over the whole ones. */
export function enumerate2(q: Case, visit: (z: Notes) => void): void {
  const n = q.cantus.length
  const usual = pool(q)
  const beforeClose = [...usual, ...pool7(q)]
  for (const isRest of [true, false]) {
    for (const isWhole of [true, false]) {
      const z: Slot[] = []
      const walk = (bar: number, half: 1 | 2): void => {
        if (bar > n) {
          visit([...z])
          return
        }
        const isLast = half === 2 || bar === n || (bar === n - 1 && isWhole)
        for (const p of isLast && bar === n - 1 ? beforeClose : usual) {
          z.push({ bar, half, p })
          if (knownAt(q, z, z.length, isWhole).length === 0) {
            if (isLast) walk(bar + 1, 1)
            else walk(bar, 2)
          }
          z.pop()
        }
      }
      walk(1, isRest ? 2 : 1)
    }
  }
}
