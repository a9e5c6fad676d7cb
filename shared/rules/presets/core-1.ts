import type { RuleId, RuleSet } from '@/shared/rules/rule'
import type { PitchName } from '@/shared/theory/pitch'

/** Lowest and highest note that a line of `core-1` may use. */
export type Pool = Readonly<{ lowest: PitchName; highest: PitchName }>

/**
 * The exact first-species rule set by which engines are checked against each other; it is not one to teach by, and is
 * not offered. It is defined by identifiers of its own; `CORE_1_IDS` says which rules stand for each.
 */
export const createCore1 = ({ lowest, highest }: Pool): RuleSet => ({
  id: 'core-1',
  name: 'core-1',
  rules: {
    'acc-other': { level: 'law', params: { bFlat: false, raised: 'seventh-before-the-close' } },
    'voice-compass': {
      level: 'law',
      params: { aboveLow: lowest, aboveHigh: highest, belowLow: lowest, belowHigh: highest, span: 10 },
    },
    'vert-consonance-set': { level: 'law' },
    'vert-fourth': { level: 'law' },
    'vert-dim-fifth': { level: 'law' },
    's1-unison': { level: 'law' },
    'dist-max': { level: 'law', params: { max: 12 } },
    's1-open-above': { level: 'law', params: { set: ['unison', 'fifth', 'octave'] } },
    's1-open-below': { level: 'law', params: { set: ['unison', 'octave'] } },
    's1-close': { level: 'law', params: { set: ['unison', 'octave'], onFinal: false } },
    's1-cadence-motion': {
      level: 'law',
      params: { cantus: 'judged', degrees: 'leading-tone-and-second' },
    },
    'voice-cross': { level: 'law', params: { brief: 0 } },
    'voice-overlap': { level: 'law' },
    'par-perfect': { level: 'law' },
    'dir-perfect': { level: 'law', params: { exceptions: [] } },
    'imperfect-run': { level: 'law', params: { max: 3, counting: 'in-a-row' } },
    'mel-interval-set': { level: 'law', params: { set: 'strict' } },
    's1-repeat': { level: 'law', params: { maxRepeats: 1 } },
    'mel-leap-recovery': { level: 'law', params: { threshold: 4, answer: 'step' } },
    'mel-leaps-same-direction': { level: 'law', params: { allow: 'never' } },
    'mel-single-climax': { level: 'law', params: { extreme: 'high' } },
    'mel-tritone-outline': { level: 'law', params: { diminishedFifth: 'ban' } },
    'both-leap-same': { level: 'law', params: { from: 4, max: 3 } },
  },
})

/** What stands for an identifier of `core-1`: rules, or some messages of a rule. */
export type Standing = Readonly<{ rule: RuleId; codes?: readonly string[] }>

export const CORE_1_IDS = {
  pool: [{ rule: 'acc-other' }, { rule: 'voice-compass', codes: ['below', 'above'] }],
  cons: [{ rule: 'vert-consonance-set' }, { rule: 'vert-fourth' }, { rule: 'vert-dim-fifth' }],
  unison: [{ rule: 's1-unison' }],
  dist: [{ rule: 'dist-max' }],
  open: [{ rule: 's1-open-above' }, { rule: 's1-open-below' }],
  close: [{ rule: 's1-close' }],
  cadence: [{ rule: 's1-cadence-motion' }],
  cross: [{ rule: 'voice-cross' }],
  overlap: [{ rule: 'voice-overlap' }],
  direct: [{ rule: 'par-perfect' }, { rule: 'dir-perfect' }],
  run: [{ rule: 'imperfect-run' }],
  melodic: [{ rule: 'mel-interval-set' }],
  repeat: [{ rule: 's1-repeat' }],
  recover: [{ rule: 'mel-leap-recovery' }],
  leaps: [{ rule: 'mel-leaps-same-direction' }],
  range: [{ rule: 'voice-compass', codes: ['too-wide'] }],
  peak: [{ rule: 'mel-single-climax' }],
  tritone: [{ rule: 'mel-tritone-outline' }],
  bothleap: [{ rule: 'both-leap-same' }],
} as const satisfies Readonly<Record<string, readonly Standing[]>>

export type Core1Id = keyof typeof CORE_1_IDS

/** Identifiers that speak of the whole line, and have no bar. */
export const CORE_1_WHOLE_LINE: ReadonlySet<Core1Id> = new Set<Core1Id>(['range', 'peak'])
