import { z } from 'zod'
import { cite } from '@/shared/rules/cite'
import { exampleIn } from '@/shared/rules/example-in'
import { breachAt, cantusMove, perfectKindOf } from '@/shared/rules/first-species/sonority'
import { TIED_SPECIES } from '@/shared/rules/fourth-species/folds'
import { upbeats, type UpbeatState } from '@/shared/rules/fourth-species/upbeats'
import type { Rule } from '@/shared/rules/rule'

const PARAMS = z.strictObject({
  fifths: z.boolean().default(true).describe('Fifths on two upbeats in a row are told.'),
  octaves: z.boolean().default(true).describe('Octaves and unisons on two upbeats in a row are told.'),
})
type Params = z.infer<typeof PARAMS>

const example = exampleIn(4, 'D4 F4 E4 D4')

/** Where the second one resolves a suspension, it is the matter of `s4-strip-test`. */
export const s4AfterbeatPerfects: Rule<UpbeatState, Params> = {
  id: 's4-afterbeat-perfects',
  level: 'preference',
  scope: 'pair',
  species: TIED_SPECIES,
  params: PARAMS,
  ...upbeats<Params>((earlier, now, suspended, { params }) => {
    const kind = perfectKindOf(now)
    if (suspended !== null || kind === null || kind !== perfectKindOf(earlier)) return null
    if (cantusMove(earlier, now) === 0) return null
    if (kind === 'fifth') return params.fifths ? breachAt('fifths', [earlier, now]) : null
    return params.octaves ? breachAt('octaves', [earlier, now]) : null
  }),
  explain: {
    title: 'No fifths or octaves on two upbeats',
    statement: 'The second halves of two bars in a row are not both fifths, nor both octaves or unisons.',
    why: 'In syncopated music the upbeats carry the line, and the ear compares them as it compares downbeats elsewhere.',
    mends: 'Let one of the two upbeats be a third or a sixth.',
    sources: cite('OMT1', 'TALK', 'LEHM VI', 'EX'),
    disagreement:
      'One textbook forbids them; others hear no fault unless a suspension resolves into the second one. Fux writes rows of such fifths and some octaves.',
    right: example('r:2,A4:2~ A4:2,D5:2~ D5:2,C#5:2 D5'),
    wrong: example('r:2,A4:2~ A4:2,C5:2~ C5:2,C#5:2 D5', [2]),
    messages: {
      fifths: 'Two upbeats in a row are fifths.',
      octaves: 'Two upbeats in a row are octaves or unisons.',
    },
  },
}
