import type { AnyRule } from '@/shared/rules/rule'

/** Rules of a single line, in the order of the catalogue. */
export const MELODY_RULES: readonly AnyRule[] = []
