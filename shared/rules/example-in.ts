import type { Example, Species } from '@/shared/rules/rule'

type Rest = Partial<Omit<Example, 'line' | 'breaches' | 'species'>>

/** Makes a rule's examples in one species over one cantus, Dorian on D and above it unless told otherwise. */
export const exampleIn =
  (species: Species, cantus: string) =>
  (line: string, breaches: readonly number[] = [], rest: Rest = {}): Example => ({
    cantus,
    line,
    species,
    mode: 'dorian',
    final: 'D',
    breaches,
    ...rest,
  })
