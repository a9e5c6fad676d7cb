import type { RuleSetting } from '@/shared/rules/rule'

type Params = Readonly<Record<string, unknown>>

const setting =
  (level: RuleSetting['level']) =>
  (params?: Params): RuleSetting =>
    params === undefined ? { level } : { level, params }

/** A breach is an error. */
export const law = setting('law')

/** A breach is a remark. */
export const taste = setting('preference')

/** Not looked at, and ready to be switched on. */
export const OFF: RuleSetting = { level: 'off' }

/**
 * A compass for any singing voice, wide enough for both lines of the treatises' examples. Unsourced: the books only
 * say not to exceed the voice.
 */
export const ANY_VOICE: Params = { aboveLow: 'G3', aboveHigh: 'A5', belowLow: 'E2', belowHigh: 'G4' }
