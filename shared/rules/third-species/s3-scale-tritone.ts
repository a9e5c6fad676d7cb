import { cite } from '@/shared/rules/cite'
import { NO_PARAMS, type NoParams } from '@/shared/rules/first-species/folds'
import { breachAt, spanArgs } from '@/shared/rules/fold'
import { foldTurningPoints, type Outline } from '@/shared/rules/melody/turning-points'
import type { Rule } from '@/shared/rules/rule'
import { exampleIn } from '@/shared/rules/example-in'
import { shortExample, SHORT_LINE } from '@/shared/rules/third-species/examples'
import { THIRD_SPECIES } from '@/shared/rules/third-species/folds'
import { semitonesFrom, stepsFrom } from '@/shared/theory/interval'
import { isSamePitch } from '@/shared/theory/pitch'

const outline = foldTurningPoints<NoParams>((from, to, _params, voice) => {
  const isTritone =
    Math.abs(stepsFrom(from.note, to.note)) === 3 && Math.abs(semitonesFrom(from.note, to.note)) === 6
  return isTritone ? breachAt(voice, 'scale', [from, to], spanArgs(from, to)) : null
})

/** Three moves over four letters: every one of them is a step. */
const MOVES_OF_SCALE = 3

/** Beside the run under way, how many moves it has made, counted no further than one more than a scale of four has. */
type State = Readonly<{ run: Outline; moves: number }>

const isMove = (before: Outline, after: Outline): boolean =>
  before.last !== null && after.last !== null && !isSamePitch(before.last.note, after.last.note)

function movesAfter({ run, moves }: State, after: Outline): number {
  if (!isMove(run, after)) return after.last === null ? 0 : moves
  const goesOn = run.direction === 0 || run.direction === after.direction
  return goesOn ? Math.min(moves + 1, MOVES_OF_SCALE + 1) : 1
}

/** Takes the place of `mel-tritone-outline`: among quick notes only the scale that fills the fourth is minded. */
export const s3ScaleTritone: Rule<State, NoParams> = {
  id: 's3-scale-tritone',
  level: 'law',
  scope: 'line',
  species: THIRD_SPECIES,
  params: NO_PARAMS,
  suspends: new Set(['mel-tritone-outline']),
  start: (exercise, params, voice) => ({ run: outline.start(exercise, params, voice), moves: 0 }),
  step: (state, moment, params) => {
    const { state: run, breach } = outline.step(state.run, moment, params)
    const isScale = state.moves === MOVES_OF_SCALE
    return { state: { run, moves: movesAfter(state, run) }, breach: isScale ? breach : null }
  },
  finish: ({ run, moves }, params, isComplete) =>
    moves === MOVES_OF_SCALE ? outline.finish(run, params, isComplete) : null,
  key: ({ run, moves }) => (MOVES_OF_SCALE + 2) * outline.key(run) + moves,
  explain: {
    title: 'No scale that turns on a tritone',
    statement: 'A scale does not turn round at both ends of an augmented fourth.',
    why: 'The notes at which a scale turns stay in the ear and are compared; F and B do not go together.',
    mends:
      'Carry the scale one note further, or turn one note earlier; or flatten B where the style allows it.',
    sources: cite('NOTAV III-iv', 'GROVE 3rd order'),
    right: shortExample(SHORT_LINE),
    wrong: exampleIn(3, 'D4 D4 E4 D4')(
      'A4:1,G4:1,F4:1,G4:1 A4:1,B4:1,A4:1,F4:1 G4:1,A4:1,B4:1,C#5:1 D5',
      [2],
    ),
    messages: { scale: 'The scale turns at {from} and at {to}, an augmented fourth apart.' },
  },
}
