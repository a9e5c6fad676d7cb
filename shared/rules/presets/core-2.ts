import type { Pool, Standing } from '@/shared/rules/presets/core-1'
import type { RuleSet } from '@/shared/rules/rule'

/**
 * The exact second-species rule set by which engines are checked against each other, as `core-1` is that of first
 * species. `CORE_2_IDS` says which rules stand for each of its own identifiers.
 */
export const createCore2 = ({ lowest, highest }: Pool): RuleSet => ({
  id: 'core-2',
  name: 'core-2',
  rules: {
    'acc-other': { level: 'law', params: { bFlat: false, raised: 'seventh-before-the-close' } },
    'voice-compass': {
      level: 'law',
      params: { aboveLow: lowest, aboveHigh: highest, belowLow: lowest, belowHigh: highest, span: 10 },
    },
    's2-downbeat-consonant': { level: 'law', params: { spared: 0 } },
    's2-upbeat-passing': { level: 'law' },
    's2-neighbour': { level: 'law', params: { allowed: 'no' } },
    's2-cambiata': { level: 'law', params: { allowed: 'no' } },
    's2-unison': { level: 'law' },
    'dist-max': { level: 'law', params: { max: 12 } },
    's2-open-interval': {
      level: 'law',
      params: { above: ['unison', 'fifth', 'octave'], below: ['unison', 'octave'] },
    },
    's1-close': { level: 'law', params: { set: ['unison', 'octave'], onFinal: false } },
    's1-cadence-motion': {
      level: 'law',
      params: { cantus: 'judged', degrees: 'leading-tone-and-second' },
    },
    's2-cadence-above': { level: 'law', params: { first: 'fifth', last: 'consonant' } },
    's2-cadence-below': { level: 'law', params: { first: 'fifth', last: 'consonant' } },
    'voice-cross': { level: 'law', params: { brief: 0 } },
    'voice-overlap': { level: 'law' },
    's2-barline-parallels': { level: 'law', params: { exceptions: [] } },
    's2-downbeat-perfects': { level: 'law', params: { savedBy: 'nothing', contrary: false } },
    'imperfect-run': { level: 'law', params: { max: 3, counting: 'in-a-row' } },
    'mel-interval-set': { level: 'law', params: { set: 'strict' } },
    's2-repeat': { level: 'law' },
    'mel-leap-recovery': { level: 'law', params: { threshold: 4, answer: 'step' } },
    'mel-leaps-same-direction': { level: 'law', params: { allow: 'never' } },
    'mel-single-climax': { level: 'law', params: { extreme: 'high' } },
    'mel-tritone-outline': { level: 'law', params: { diminishedFifth: 'ban' } },
    'both-leap-same': { level: 'law', params: { from: 4, max: 3 } },
  },
})

/** Identifiers of `core-2`; values and rests are no rule of it, so that its lines are taken to have its two shapes. */
export const CORE_2_IDS = {
  pool: [{ rule: 'acc-other' }, { rule: 'voice-compass', codes: ['below', 'above'] }],
  cons: [{ rule: 's2-downbeat-consonant' }],
  passing: [{ rule: 's2-upbeat-passing' }, { rule: 's2-neighbour' }, { rule: 's2-cambiata' }],
  unison: [{ rule: 's2-unison' }],
  dist: [{ rule: 'dist-max' }],
  open: [{ rule: 's2-open-interval' }],
  close: [{ rule: 's1-close' }],
  cadence: [{ rule: 's1-cadence-motion' }, { rule: 's2-cadence-above' }, { rule: 's2-cadence-below' }],
  cross: [{ rule: 'voice-cross' }],
  overlap: [{ rule: 'voice-overlap' }],
  direct: [{ rule: 's2-barline-parallels' }],
  downbeats: [{ rule: 's2-downbeat-perfects' }],
  run: [{ rule: 'imperfect-run' }],
  melodic: [{ rule: 'mel-interval-set' }],
  repeat: [{ rule: 's2-repeat' }],
  recover: [{ rule: 'mel-leap-recovery' }],
  leaps: [{ rule: 'mel-leaps-same-direction' }],
  range: [{ rule: 'voice-compass', codes: ['too-wide'] }],
  peak: [{ rule: 'mel-single-climax' }],
  tritone: [{ rule: 'mel-tritone-outline' }],
  bothleap: [{ rule: 'both-leap-same' }],
} as const satisfies Readonly<Record<string, readonly Standing[]>>

export type Core2Id = keyof typeof CORE_2_IDS

/** Identifiers that speak of the whole line, and have no bar. */
export const CORE_2_WHOLE_LINE: ReadonlySet<Core2Id> = new Set<Core2Id>(['range', 'peak'])
