import { z } from 'zod'
import { cite } from '@/shared/rules/cite'
import {
  breachAt,
  lineMove,
  perfectKindOf,
  sonorityOf,
  type Sonority,
} from '@/shared/rules/first-species/sonority'
import { goOn, pack, packPitch, PITCH_ROOM } from '@/shared/rules/fold'
import type { Rule } from '@/shared/rules/rule'
import { shortExample, SHORT_LINE } from '@/shared/rules/second-species/examples'
import { isUpbeat, SECOND_SPECIES } from '@/shared/rules/second-species/folds'
import type { Direction } from '@/shared/theory/interval'

const PARAMS = z.strictObject({
  inRow: z
    .int()
    .min(1)
    .max(12)
    .default(1)
    .describe('Upbeats in a row that may carry the same perfect consonance.'),
  excuseTurn: z
    .boolean()
    .default(false)
    .describe('Let pass where the second is entered from the other side than the first.'),
})
type Params = z.infer<typeof PARAMS>

/** The downbeat of this bar; the equal upbeats in a row, and which way the line came to the last of them. */
type State = Readonly<{
  downbeat: Sonority | null
  run: readonly Sonority[]
  came: Direction
  hasUpbeat: boolean
}>
const NO_RUN: readonly Sonority[] = []
const NONE: State = { downbeat: null, run: NO_RUN, came: 0, hasUpbeat: true }

export const s2AfterbeatPerfects: Rule<State, Params> = {
  id: 's2-afterbeat-perfects',
  level: 'preference',
  scope: 'pair',
  species: SECOND_SPECIES,
  params: PARAMS,
  start: () => NONE,
  step: (state, moment, params) => {
    const now = sonorityOf(moment)
    if (moment.place === 0) {
      const goesOn = state.hasUpbeat && moment.note !== null
      return goOn({
        downbeat: params.excuseTurn ? now : null,
        run: goesOn ? state.run : NO_RUN,
        came: goesOn ? state.came : 0,
        hasUpbeat: false,
      })
    }
    if (now === null || !isUpbeat(now)) return goOn(now === null ? NONE : state)
    return judge(state, now, params)
  },
  finish: () => null,
  key: ({ downbeat, run, came, hasUpbeat }) =>
    pack(
      [packPitch(downbeat && downbeat.note), PITCH_ROOM],
      [packPitch(run.at(-1)?.note ?? null), PITCH_ROOM],
      [run.length, 16],
      [came + 1, 3],
      [hasUpbeat ? 1 : 0, 2],
    ),
  explain: {
    title: 'Equal perfects off the beat',
    statement: 'The second halves of bars in a row do not all carry fifths, nor octaves or unisons.',
    why: 'Off the beat parallels are heard less, yet they are heard, the more the longer they last.',
    mends: 'Make one of the two a third or a sixth.',
    sources: cite('RATIO', 'LEHM II', 'GROVE', 'DAVD', 'EX'),
    disagreement:
      'One source allows it, one allows two in a row, one asks that the second be entered from the other side. Fux has it in five of his twelve examples.',
    right: shortExample(SHORT_LINE),
    wrong: shortExample('r:2,A4:2 D5:2,C5:2 G4:2,C#5:2 D5', [2]),
    messages: {
      fifths: 'The second halves of {count} bars in a row are fifths.',
      octaves: 'The second halves of {count} bars in a row are octaves or unisons.',
    },
  },
}

function judge(state: State, now: Sonority, { inRow, excuseTurn }: Params) {
  const kind = perfectKindOf(now)
  if (kind === null) return goOn({ ...NONE, hasUpbeat: true })
  const came = state.downbeat === null ? 0 : lineMove(state.downbeat, now)
  const before = state.run.at(-1)
  const goesOn =
    before !== undefined &&
    perfectKindOf(before) === kind &&
    lineMove(before, now) !== 0 &&
    !(excuseTurn && came !== 0 && came === -state.came)
  const run = goesOn ? [...state.run.slice(-inRow), now] : [now]
  const code = kind === 'fifth' ? 'fifths' : 'octaves'
  return {
    state: { downbeat: null, run, came, hasUpbeat: true },
    breach: run.length > inRow ? breachAt(code, run, { count: run.length }) : null,
  }
}
