/**
 * The rule set `core-1` once more, written from its definition alone and on purpose sharing nothing with `shared/`:
 * pitches, intervals, degrees and verdicts are worked out here by the letter of the definition, bar by bar, without
 * regard for speed. The engine's own reading of it is held against this one. Longer than a file should be, because it
 * is read beside the definition from top to bottom.
 */

type Mode = 'ionian' | 'dorian' | 'phrygian' | 'lydian' | 'mixolydian' | 'aeolian'

/** `d` counts letters, `c` semitones, both from C0. */
export type RefPitch = Readonly<{ name: string; d: number; c: number }>

export type Case = Readonly<{
  cantus: readonly string[]
  mode: Mode
  /** Letter and accidental, such as `D`. */
  final: string
  position: 'above' | 'below'
  lo: string
  hi: string
}>

export type Violation = Readonly<{ id: string; bar: number }>

const MAX_VERTICAL = 11
const MAX_RANGE = 9
const MAX_RUN = 3
const MAX_REPEATS = 1

const LETTER_D: Record<string, number> = { C: 0, D: 1, E: 2, F: 3, G: 4, A: 5, B: 6 }
const LETTER_C: Record<string, number> = { C: 0, D: 2, E: 4, F: 5, G: 7, A: 9, B: 11 }
const ALTER: Record<string, number> = { bb: -2, b: -1, '': 0, '#': 1, '##': 2 }

const SCALES: Record<Mode, number[]> = {
  ionian: [0, 2, 4, 5, 7, 9, 11],
  dorian: [0, 2, 3, 5, 7, 9, 10],
  phrygian: [0, 1, 3, 5, 7, 8, 10],
  lydian: [0, 2, 4, 6, 7, 9, 11],
  mixolydian: [0, 2, 4, 5, 7, 9, 10],
  aeolian: [0, 2, 3, 5, 7, 8, 10],
}

const known = new Map<string, RefPitch>()
export function ref(name: string): RefPitch {
  const found = known.get(name)
  if (found) return found
  const letter = name[0] as string
  const octave = Number(name[name.length - 1])
  const sign = name.slice(1, -1)
  const pitch = {
    name,
    d: 7 * octave + (LETTER_D[letter] as number),
    c: 12 * octave + (LETTER_C[letter] as number) + (ALTER[sign] as number),
  }
  known.set(name, pitch)
  return pitch
}

export function less(p: RefPitch, q: RefPitch): boolean {
  return p.d < q.d || (p.d === q.d && p.c < q.c)
}
export function same(p: RefPitch, q: RefPitch): boolean {
  return p.d === q.d && p.c === q.c
}
export function dir(p: RefPitch, q: RefPitch): number {
  if (less(p, q)) return 1
  if (less(q, p)) return -1
  return 0
}
export function g(p: RefPitch, q: RefPitch): number {
  return less(p, q) ? q.d - p.d : p.d - q.d
}
export function s(p: RefPitch, q: RefPitch): number {
  return less(p, q) ? q.c - p.c : p.c - q.c
}
export function red(p: RefPitch, q: RefPitch): string {
  const octaves = Math.floor(g(p, q) / 7)
  return `${g(p, q) % 7},${s(p, q) - 12 * octaves}`
}
export const CONS = ['0,0', '2,3', '2,4', '4,7', '5,8', '5,9']
export const PERF = ['0,0', '4,7']
export const MELODIC = ['1,1', '1,2', '2,3', '2,4', '3,5', '4,7', '7,12']

function mod(a: number, b: number): number {
  return ((a % b) + b) % b
}

export function deg(k: Case, p: RefPitch): number {
  return mod(p.d - ref(`${k.final}4`).d, 7) + 1
}
export function diatonic(k: Case, p: RefPitch): boolean {
  const semitones = SCALES[k.mode][deg(k, p) - 1] as number
  return mod(p.c - ref(`${k.final}4`).c, 12) === semitones
}
export function raised7(k: Case, p: RefPitch): boolean {
  if (!['dorian', 'mixolydian', 'aeolian'].includes(k.mode) || deg(k, p) !== 7) return false
  return diatonic(k, { name: '', d: p.d, c: p.c - 1 })
}
export function ltone(k: Case, p: RefPitch): boolean {
  if (['dorian', 'mixolydian', 'aeolian'].includes(k.mode)) return raised7(k, p)
  return deg(k, p) === 7 && diatonic(k, p)
}

function everyPitch(): RefPitch[] {
  const all: RefPitch[] = []
  for (let octave = 0; octave <= 8; octave += 1)
    for (const letter of 'CDEFGAB')
      for (const sign of ['bb', 'b', '', '#', '##']) all.push(ref(letter + sign + octave))
  return all
}
const EVERY = everyPitch()

export function inRange(k: Case, p: RefPitch): boolean {
  return !less(p, ref(k.lo)) && !less(ref(k.hi), p)
}
export function pool(k: Case): RefPitch[] {
  return EVERY.filter((p) => inRange(k, p) && diatonic(k, p))
}
export function pool7(k: Case): RefPitch[] {
  return EVERY.filter((p) => inRange(k, p) && raised7(k, p))
}

/** The violations located at bar `i` (1-based) that need nothing after bar `i`; `close` and `cadence` only at bar n. */
export function violationsAt(k: Case, x: readonly RefPitch[], i: number): string[] {
  const f = k.cantus.map(ref)
  const n = f.length
  const F = (j: number) => f[j - 1] as RefPitch
  const X = (j: number) => x[j - 1] as RefPitch
  const U = (j: number) => (k.position === 'above' ? X(j) : F(j))
  const L = (j: number) => (k.position === 'above' ? F(j) : X(j))
  const found: string[] = []

  const isInPool = inRange(k, X(i)) && diatonic(k, X(i))
  const isInPool7 = inRange(k, X(i)) && raised7(k, X(i))
  if (!isInPool && !(i === n - 1 && isInPool7)) found.push('pool')
  if (!CONS.includes(red(F(i), X(i)))) found.push('cons')
  if (i > 1 && i < n && same(F(i), X(i))) found.push('unison')
  if (g(F(i), X(i)) > MAX_VERTICAL) found.push('dist')
  if (i === 1) {
    const allowed = k.position === 'above' ? ['0,0', '4,7'] : ['0,0']
    if (!allowed.includes(red(F(1), X(1)))) found.push('open')
  }
  if (i === n && red(F(n), X(n)) !== '0,0') found.push('close')
  if (i === n) {
    const isFinal = (p: RefPitch) => deg(k, p) === 1 && diatonic(k, p)
    const first = isFinal(F(n)) && isFinal(X(n))
    const second =
      (deg(k, F(n - 1)) === 2 && ltone(k, X(n - 1))) || (deg(k, F(n - 1)) === 7 && deg(k, X(n - 1)) === 2)
    const third = g(F(n - 1), F(n)) === 1 && g(X(n - 1), X(n)) === 1
    const fourth = dir(F(n - 1), F(n)) === -dir(X(n - 1), X(n))
    if (!(first && second && third && fourth)) found.push('cadence')
  }
  if (k.position === 'above' ? less(X(i), F(i)) : less(F(i), X(i))) found.push('cross')
  if (i >= 2 && (less(U(i), L(i - 1)) || less(U(i - 1), L(i)))) found.push('overlap')
  if (i >= 2 && PERF.includes(red(F(i), X(i)))) {
    const way = dir(F(i - 1), F(i))
    if (way !== 0 && way === dir(X(i - 1), X(i))) found.push('direct')
  }
  if (i >= MAX_RUN + 1) {
    const sizes: number[] = []
    for (let j = i - MAX_RUN; j <= i; j += 1) sizes.push(g(F(j), X(j)) % 7)
    if (sizes.every((size) => size === 2) || sizes.every((size) => size === 5)) found.push('run')
  }
  if (i >= 2 && !same(X(i - 1), X(i))) {
    const move = `${g(X(i - 1), X(i))},${s(X(i - 1), X(i))}`
    const isRisingSixth = move === '5,8' && dir(X(i - 1), X(i)) === 1
    if (!MELODIC.includes(move) && !isRisingSixth) found.push('melodic')
  }
  if (i >= 2 && same(X(i - 1), X(i))) {
    let repeats = 0
    for (let j = 2; j <= i; j += 1) if (same(X(j - 1), X(j))) repeats += 1
    if (repeats > MAX_REPEATS) found.push('repeat')
  }
  if (i >= 3 && g(X(i - 2), X(i - 1)) >= 3) {
    const isAnswered = g(X(i - 1), X(i)) === 1 && dir(X(i - 1), X(i)) === -dir(X(i - 2), X(i - 1))
    if (!isAnswered) found.push('recover')
  }
  if (i >= 3 && g(X(i - 2), X(i - 1)) >= 2 && g(X(i - 1), X(i)) >= 2) {
    if (dir(X(i - 2), X(i - 1)) === dir(X(i - 1), X(i))) found.push('leaps')
  }
  if (i >= 2 && g(F(i - 1), F(i)) >= 3 && g(X(i - 1), X(i)) >= 3) {
    const way = dir(F(i - 1), F(i))
    if (way !== 0 && way === dir(X(i - 1), X(i))) found.push('bothleap')
  }
  return found
}

function tritones(x: readonly RefPitch[]): number[] {
  const groups: { pitch: RefPitch; lastBar: number }[] = []
  x.forEach((pitch, index) => {
    const group = groups[groups.length - 1]
    if (group && same(group.pitch, pitch)) group.lastBar = index + 1
    else groups.push({ pitch, lastBar: index + 1 })
  })
  const Y = (j: number) => (groups[j] as { pitch: RefPitch }).pitch
  const turning = groups
    .map((_, j) => j)
    .filter((j) => {
      if (j === 0 || j === groups.length - 1) return true
      return dir(Y(j - 1), Y(j)) !== dir(Y(j), Y(j + 1))
    })
  const bars: number[] = []
  for (let t = 1; t < turning.length; t += 1) {
    const from = turning[t - 1] as number
    const to = turning[t] as number
    const span = `${g(Y(from), Y(to))},${s(Y(from), Y(to))}`
    if (span === '3,6' || span === '4,6') bars.push((groups[to] as { lastBar: number }).lastBar)
  }
  return bars
}

/** All violations of a whole line. */
export function violations(k: Case, x: readonly RefPitch[]): Violation[] {
  const found: Violation[] = []
  for (let bar = 1; bar <= x.length; bar += 1) {
    for (const id of violationsAt(k, x, bar)) found.push({ id, bar })
  }
  const high = x.reduce((a, b) => (less(a, b) ? b : a))
  const low = x.reduce((a, b) => (less(b, a) ? b : a))
  if (g(low, high) > MAX_RANGE) found.push({ id: 'range', bar: 0 })
  if (x.filter((p) => same(p, high)).length >= 2) found.push({ id: 'peak', bar: 0 })
  for (const bar of tritones(x)) found.push({ id: 'tritone', bar })
  return found
}

/** Walks every line that breaks nothing on its way, note by note, and hands over the whole ones. */
export function enumerate(k: Case, visit: (x: readonly RefPitch[]) => void): void {
  const n = k.cantus.length
  const usual = pool(k)
  const beforeClose = [...usual, ...pool7(k)]
  const x: RefPitch[] = []
  const walk = (): void => {
    const bar = x.length + 1
    if (bar > n) {
      visit([...x])
      return
    }
    for (const pitch of bar === n - 1 ? beforeClose : usual) {
      x.push(pitch)
      if (violationsAt(k, x, bar).length === 0) walk()
      x.pop()
    }
  }
  walk()
}
