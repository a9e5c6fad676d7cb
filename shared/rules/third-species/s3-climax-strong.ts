import { cite } from '@/shared/rules/cite'
import { NO_PARAMS, type NoParams } from '@/shared/rules/first-species/folds'
import { breachAt, goOn, isNoted, pack, packPitch, PITCH_ROOM, type Noted } from '@/shared/rules/fold'
import type { Rule } from '@/shared/rules/rule'
import { shortExample, SHORT_LINE } from '@/shared/rules/third-species/examples'
import { THIRD_SPECIES } from '@/shared/rules/third-species/folds'
import { HALF_TICKS } from '@/shared/theory/duration'
import { comparePitches, formatPitch } from '@/shared/theory/pitch'

/** The highest note so far: the first time it came, and whether it ever came on a strong quarter. */
type State = Readonly<{ top: Noted | null; isStrong: boolean }>

export const s3ClimaxStrong: Rule<State, NoParams> = {
  id: 's3-climax-strong',
  level: 'preference',
  scope: 'line',
  species: THIRD_SPECIES,
  params: NO_PARAMS,
  start: () => ({ top: null, isStrong: false }),
  step: (state, moment) => {
    if (!isNoted(moment)) return goOn(state)
    const order = state.top === null ? 1 : comparePitches(moment.note, state.top.note)
    if (order < 0) return goOn(state)
    const isStrong = moment.place % HALF_TICKS === 0
    if (order > 0) return goOn({ top: moment, isStrong })
    return goOn(isStrong && !state.isStrong ? { ...state, isStrong } : state)
  },
  finish: ({ top, isStrong }, _params, isComplete) =>
    isComplete && top !== null && !isStrong
      ? breachAt('line', 'weak', [top], { note: formatPitch(top.note) })
      : null,
  key: ({ top, isStrong }) => pack([packPitch(top && top.note), PITCH_ROOM], [isStrong ? 1 : 0, 2]),
  explain: {
    title: 'The peak on a strong quarter',
    statement: 'The highest note of the line stands on the first or the third quarter of its bar.',
    why: 'The peak is the note that is remembered, and a strong quarter gives it its due.',
    mends: 'Move the peak by a quarter.',
    sources: cite('FLASH'),
    right: shortExample(SHORT_LINE),
    wrong: shortExample('D4:1,E4:1,F4:1,G4:1 D5:1,E5:1,D5:1,C5:1 G4:1,A4:1,B4:1,C#5:1 D5', [2]),
    messages: { weak: 'The highest note, {note}, stands on a weak quarter.' },
  },
}
