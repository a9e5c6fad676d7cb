import type { AnyRule } from '@/shared/rules/rule'

/** Rules of two voices in first species, in the order of the catalogue. */
export const FIRST_SPECIES_RULES: readonly AnyRule[] = []
