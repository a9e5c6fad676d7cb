import { FIFTH_SPECIES_RULES } from '@/shared/rules/fifth-species'
import { FIRST_SPECIES_RULES } from '@/shared/rules/first-species'
import { FOURTH_SPECIES_RULES } from '@/shared/rules/fourth-species'
import { MELODY_RULES } from '@/shared/rules/melody'
import type { AnyRule, RuleId } from '@/shared/rules/rule'
import { SECOND_SPECIES_RULES } from '@/shared/rules/second-species'
import { THIRD_SPECIES_RULES } from '@/shared/rules/third-species'
import { THREE_VOICE_RULES } from '@/shared/rules/three-voices'

/** Every rule of the catalogue that the engine knows, in the order in which findings are listed. */
export const RULES: readonly AnyRule[] = [
  ...MELODY_RULES,
  ...FIRST_SPECIES_RULES,
  ...SECOND_SPECIES_RULES,
  ...THIRD_SPECIES_RULES,
  ...FOURTH_SPECIES_RULES,
  ...FIFTH_SPECIES_RULES,
  ...THREE_VOICE_RULES,
]

const RULES_BY_ID: ReadonlyMap<RuleId, AnyRule> = new Map(RULES.map((rule) => [rule.id, rule]))

export const findRule = (id: RuleId): AnyRule | null => RULES_BY_ID.get(id) ?? null
