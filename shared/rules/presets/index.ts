import { conservatoire } from '@/shared/rules/presets/conservatoire'
import { fuxMann } from '@/shared/rules/presets/fux-mann'
import { jeppesen16c } from '@/shared/rules/presets/jeppesen-16c'
import { openUndergrad } from '@/shared/rules/presets/open-undergrad'
import { starter } from '@/shared/rules/presets/starter'
import type { RuleSet } from '@/shared/rules/rule'

/** The rule sets a teacher starts from, each tied to a family of published sources. */
export const PRESETS: readonly RuleSet[] = [fuxMann, jeppesen16c, openUndergrad, conservatoire, starter]

export const findPreset = (id: string): RuleSet | null => PRESETS.find((preset) => preset.id === id) ?? null
