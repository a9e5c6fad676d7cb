import { z } from 'zod'
import { cite } from '@/shared/rules/cite'
import {
  breachAt,
  cantusMove,
  isDissonance,
  isContrary,
  lineMove,
  perfectKindOf,
  sharedDirection,
  sonorityOf,
  type Sonority,
} from '@/shared/rules/first-species/sonority'
import { goOn, pack, packPitch, PITCH_ROOM } from '@/shared/rules/fold'
import type { Breach, Rule } from '@/shared/rules/rule'
import { shortExample, SHORT_LINE } from '@/shared/rules/second-species/examples'
import { isUpbeat, SECOND_SPECIES, stepsTo } from '@/shared/rules/second-species/folds'

const PARAMS = z.strictObject({
  savedBy: z
    .enum(['nothing', 'leap', 'consonant-leap-and-contrary'])
    .default('nothing')
    .describe(
      'What between them makes it good: nothing; a leap wider than a third inside the bar; such a leap to a consonance, left against the cantus.',
    ),
  contrary: z
    .boolean()
    .default(true)
    .describe('Judged as well where the voices go from one to the other in contrary motion.'),
})
type Params = z.infer<typeof PARAMS>

/** The perfect downbeat of this bar, and its upbeat where that may save the next one. */
type State = Readonly<{ downbeat: Sonority | null; upbeat: Sonority | null; isKnown: boolean }>
const NONE: State = { downbeat: null, upbeat: null, isKnown: true }

export const s2DownbeatPerfects: Rule<State, Params> = {
  id: 's2-downbeat-perfects',
  level: 'law',
  scope: 'pair',
  species: SECOND_SPECIES,
  params: PARAMS,
  start: () => NONE,
  step: (state, moment, params) => {
    const now = sonorityOf(moment)
    if (moment.place === 0) {
      const isPerfect = now !== null && perfectKindOf(now) !== null
      return {
        state: isPerfect ? { downbeat: now, upbeat: null, isKnown: true } : NONE,
        breach: isPerfect ? judge(state, now, params) : null,
      }
    }
    if (state.downbeat === null || params.savedBy === 'nothing') return goOn(state)
    if (now === null) return goOn({ ...state, isKnown: false })
    return goOn(isUpbeat(now) ? { ...state, upbeat: now } : state)
  },
  finish: () => null,
  key: ({ downbeat, upbeat, isKnown }) =>
    pack(
      [packPitch(downbeat && downbeat.note), PITCH_ROOM],
      [packPitch(upbeat && upbeat.note), PITCH_ROOM],
      [isKnown ? 1 : 0, 2],
    ),
  explain: {
    title: 'No equal perfects from downbeat to downbeat',
    statement: 'Two downbeats in a row do not carry fifths, nor octaves or unisons.',
    why: 'The ear joins the strong beats. One light note between them does not hide that the voices run in fifths or octaves.',
    mends: 'Make one of the two downbeats a third or a sixth.',
    sources: cite('OMT1', 'NOTAV II-ii', 'GROVE', 'LEHM II', 'FUXN', 'CHER r11', 'RATIO', 'EX'),
    disagreement:
      'For five sources nothing saves it. For Fux a leap wider than a third between the two does, and he writes it three times; Cherubini wants the leap, a consonance and contrary motion.',
    right: shortExample(SHORT_LINE),
    wrong: shortExample('r:2,D5:2 C5:2,A4:2 B4:2,C#5:2 D5', [3]),
    messages: {
      fifths: 'Two downbeats in a row are fifths.',
      octaves: 'Two downbeats in a row are octaves or unisons.',
    },
  },
}

function judge({ downbeat, upbeat, isKnown }: State, now: Sonority, params: Params): Breach | null {
  const kind = perfectKindOf(now)
  if (downbeat === null || !isKnown || kind !== perfectKindOf(downbeat)) return null
  // Where both voices come back to the same notes nothing has moved in parallel.
  if (lineMove(downbeat, now) === 0 && cantusMove(downbeat, now) === 0) return null
  if (!params.contrary && sharedDirection(downbeat, now) === 0) return null
  if (upbeat !== null && isSaved(downbeat, upbeat, now, params)) return null
  return breachAt(kind === 'fifth' ? 'fifths' : 'octaves', [downbeat, now])
}

function isSaved(downbeat: Sonority, upbeat: Sonority, now: Sonority, { savedBy }: Params): boolean {
  if (savedBy === 'nothing' || Math.abs(stepsTo(downbeat, upbeat)) <= 2) return false
  return savedBy === 'leap' || (!isDissonance(upbeat) && isContrary(upbeat, now))
}
