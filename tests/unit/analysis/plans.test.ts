import fc from 'fast-check'
import { proposeSkeleton, proposeStages, reduceCantus } from '@/shared/analysis'
import { formatPitch, pitchOf, type Pitch } from '@/shared/theory/pitch'
import { stepsFrom } from '@/shared/theory/interval'
import { FUX_CANTUS } from '../rules/fux-cantus'
import { SEED } from '../rules/random-score'

const read = (notes: string) => notes.split(' ').map(pitchOf)
const DORIAN = read('D4 F4 E4 D4 G4 F4 A4 G4 F4 E4 D4')

test('what remains of Fux’s Dorian cantus without bars 2 and 6', () => {
  const reduction = reduceCantus(DORIAN, new Set([2, 6]))
  expect(reduction.pitches.map(formatPitch).join(' ')).toBe('D4 E4 D4 G4 A4 G4 F4 E4 D4')
  expect(reduction.kept).toEqual([1, 3, 4, 5, 7, 8, 9, 10, 11])
  expect(reduction.isStepwise).toBe(false)
})

test('the stepwise skeleton of Fux’s Dorian cantus', () => {
  const skeleton = proposeSkeleton(DORIAN)
  expect(skeleton?.pitches.map(formatPitch).join(' ')).toBe('D4 E4 F4 G4 F4 E4 D4')
  expect(skeleton?.setAside).toEqual([2, 4, 5, 7])
})

test('no skeleton where no walk by step leads home', () => {
  expect(proposeSkeleton(read('D4 A4 F4 D4'))).toBeNull()
  expect(proposeSkeleton([])).toBeNull()
})

test('of equal skeletons, the one with the apex', () => {
  const skeleton = proposeSkeleton(read('C5 D5 B4 C5'))
  expect(skeleton?.pitches.map(formatPitch)).toEqual(['C5', 'D5', 'C5'])
})

/** Every subset tried: slow and plain. */
function longestWalk(cantus: readonly Pitch[]): number {
  let longest = 0
  for (let mask = 0; mask < 2 ** cantus.length; mask += 1) {
    const kept = cantus.filter((_, index) => (mask >> index) & 1)
    if (kept[0] !== cantus[0] || kept.at(-1) !== cantus.at(-1)) continue
    const walks = kept.every((pitch, i) => i === 0 || Math.abs(stepsFrom(kept[i - 1]!, pitch)) === 1)
    if (walks) longest = Math.max(longest, kept.length)
  }
  return longest
}

test(`a skeleton keeps as many bars as any walk by step can (seed ${SEED})`, () => {
  const anyPitch = fc.constantFrom('C4', 'D4', 'E4', 'F4', 'G4', 'A4')
  fc.assert(
    fc.property(fc.array(anyPitch, { minLength: 2, maxLength: 9 }), (names) => {
      // Pitches of their own, so that equal notes are told apart by identity.
      const cantus = names.map((name) => ({ ...pitchOf(name) }))
      expect(proposeSkeleton(cantus)?.kept.length ?? 0).toBe(longestWalk(cantus))
    }),
    { seed: SEED, numRuns: 300 },
  )
})

test('stages for Fux’s Dorian cantus', () => {
  expect(proposeStages(DORIAN).map(({ kind, from, to }) => `${kind} ${from}–${to}`)).toEqual([
    'know-the-cantus 1–11',
    'cadence 10–11',
    'opening 1–1',
    'gesture 5–9',
    'gesture 2–4',
    'whole-by-ear 1–11',
    'look-back 1–11',
  ])
})

test.each(FUX_CANTUS.map(({ mode, notes }) => [mode, notes] as const))(
  'stages for Fux’s %s cantus settle every bar once, gestures from the end backwards',
  (_mode, notes) => {
    const cantus = read(notes)
    const stages = proposeStages(cantus)
    const settling = stages.filter(({ kind }) => ['cadence', 'opening', 'gesture'].includes(kind))
    const bars = settling.flatMap(({ from, to }) => Array.from({ length: to - from + 1 }, (_, i) => from + i))
    expect([...bars].sort((a, b) => a - b)).toEqual(cantus.map((_, index) => index + 1))
    const starts = stages.filter(({ kind }) => kind === 'gesture').map(({ from }) => from)
    expect(starts).toEqual([...starts].sort((a, b) => b - a))
  },
)

test('no plan for a melody that is all cadence', () => {
  expect(proposeStages(read('E4 D4'))).toEqual([])
})
