import { z } from 'zod'
import { cite } from '@/shared/rules/cite'
import { exampleIn } from '@/shared/rules/example-in'
import {
  breachAt,
  perfectKindOf,
  sharedDirection,
  sizeOf,
  type Sonority,
} from '@/shared/rules/first-species/sonority'
import { isAboveCantus, TIED_SPECIES } from '@/shared/rules/fourth-species/folds'
import { upbeats, type UpbeatState } from '@/shared/rules/fourth-species/upbeats'
import type { Rule } from '@/shared/rules/rule'

const PARAMS = z.strictObject({
  scope: z
    .enum(['suspensions', 'ninths'])
    .default('suspensions')
    .describe('Which resolutions are tested: of every suspension, or of 9–8 and 2–1 alone.'),
  direct: z.boolean().default(false).describe('Similar motion into a fifth or octave is a fault as well.'),
})
type Params = z.infer<typeof PARAMS>

const example = exampleIn(4, 'D4 F4 E4 D4')

/** Equal perfect consonances that no suspension delays are the matter of `s4-afterbeat-perfects`. */
export const s4StripTest: Rule<UpbeatState, Params> = {
  id: 's4-strip-test',
  level: 'law',
  scope: 'pair',
  species: TIED_SPECIES,
  params: PARAMS,
  ...upbeats<Params>((earlier, now, suspended, { params }) => {
    if (suspended === null || (params.scope === 'ninths' && !isNinth(suspended))) return null
    const kind = perfectKindOf(now)
    if (kind === null || sharedDirection(earlier, now) === 0) return null
    if (kind === perfectKindOf(earlier)) {
      return breachAt(kind === 'fifth' ? 'fifths' : 'octaves', [earlier, now])
    }
    return params.direct ? breachAt('direct', [earlier, now], { interval: sizeOf(now) }) : null
  }),
  explain: {
    title: 'Right without its ties',
    statement:
      'Take the ties away, so that each suspension gives place to its resolution: what is left has to be right as first species.',
    why: 'A dissonance decorates a progression and cannot mend it. Parallel fifths that arrive late are parallel fifths.',
    mends: 'Leave the ties out, correct the two consonances, and put the tie back.',
    sources: cite('DAVID (citing Fux)', 'OMT1', 'CHER', 'FUX°'),
    disagreement: 'Some hold that a suspension saves fifths and only octaves are heard through it.',
    right: example('r:2,A4:2~ A4:2,D5:2~ D5:2,C#5:2 D5'),
    wrong: example('r:2,D5:2~ D5:2,F5:2~ F5:2,E5:2 D5', [3]),
    messages: {
      fifths: 'Without the tie these are parallel fifths.',
      octaves: 'Without the tie these are parallel octaves.',
      direct: 'Without the tie both voices move the same way into a {interval}.',
    },
  },
}

const isNinth = (suspended: Sonority): boolean => isAboveCantus(suspended) && suspended.simpleSteps === 1
