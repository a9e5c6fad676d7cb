/** Exercises and helpers that the tests of the search share. */
import type { Exercise, Position, RuleSet, Species } from '@/shared/rules'
import type { Line } from '@/shared/theory/note'
import { pitchClassOf, pitchOf, type PitchName } from '@/shared/theory/pitch'
import { FUX_CANTI } from '@/tests/fixtures/canti-firmi'

/** Printed with a failure, and changed on purpose only. */
export const SEED = 20_262

export const exerciseOf = (
  cantus: string,
  mode: Exercise['mode'],
  final: string,
  position: Position = 'above',
  species: Species = 1,
): Exercise => ({
  cantus: cantus.split(' ').map(pitchOf),
  mode,
  final: pitchClassOf(final),
  species,
  position,
})

/** Fux's canti firmi, above and below. */
export const FUX_EXERCISES: readonly Exercise[] = FUX_CANTI.flatMap(({ notes, mode, final }) =>
  (['above', 'below'] as const).map((position) => exerciseOf(notes, mode, final, position)),
)

export const wholeNotes = (names: readonly PitchName[]): Line =>
  Object.fromEntries(names.map((pitch, index) => [index + 1, [{ pitch, ticks: 1920 }]]))

/** A line in words, one bar after the other. */
export const spell = (line: Line): string =>
  Object.keys(line)
    .map(Number)
    .sort((a, b) => a - b)
    .map((bar) =>
      (line[bar] ?? [])
        .map(
          ({ pitch, ticks, tied }) => `${pitch ?? 'r'}${ticks === 1920 ? '' : `:${ticks}`}${tied ? '~' : ''}`,
        )
        .join(','),
    )
    .join(' ')

/** A rule set without what is not law: what a search obeys. */
export const lawsOf = ({ id, name, rules }: RuleSet): RuleSet => ({
  id,
  name,
  rules: Object.fromEntries(Object.entries(rules).filter(([, { level }]) => level === 'law')),
})

/** Numbers below `count` from a fixed seed: a Lehmer generator. */
export function createDice(seed: number): (count: number) => number {
  let state = seed
  return (count) => {
    state = (state * 48_271) % 2_147_483_647
    return state % count
  }
}
