import type { ProposalMark, ScoreBar, ScoreInput } from '@/shared/notation/score-input'
import { WHOLE_TICKS } from '@/shared/theory/duration'
import type { BarNotes } from '@/shared/theory/note'

export const whole = (pitch: string): BarNotes => [{ pitch, ticks: WHOLE_TICKS }]

export const proposal = (
  pitch: string,
  count: number | null,
  tone: ProposalMark['tone'] = 'line',
): ProposalMark => ({ notes: whole(pitch), count, tone })

export const barOf = (number: number, over: Partial<ScoreBar> = {}): ScoreBar => ({
  number,
  state: 'frozen',
  isSetAside: false,
  cantus: 'D4',
  line: null,
  proposals: [],
  figure: null,
  motion: null,
  label: null,
  ...over,
})

const figure = (text: string) => ({ text, tone: 'cantus' as const })

/** A lesson under way over a cantus in D: the opening and the cadence adopted, bars 6 to 8 in play. */
export const LESSON_SCORE: ScoreInput = {
  position: 'above',
  clefs: { cantus: 'treble', line: 'treble' },
  signature: 0,
  bars: [
    barOf(1, { cantus: 'D4', line: whole('A4'), figure: figure('5') }),
    barOf(2, { cantus: 'F4', isSetAside: true }),
    barOf(3, { cantus: 'E4', isSetAside: true }),
    barOf(4, { cantus: 'D4', line: whole('A4'), figure: figure('5'), motion: 'oblique' }),
    barOf(5, { cantus: 'G4', line: whole('B4'), figure: figure('3'), motion: 'similar' }),
    barOf(6, {
      cantus: 'F4',
      state: 'released',
      proposals: [proposal('C5', 11), proposal('A4', 6), proposal('D5', 2)],
    }),
    barOf(7, {
      cantus: 'A4',
      state: 'released',
      proposals: [proposal('C5', 10), proposal('E5', 9, 'breach')],
    }),
    barOf(8, { cantus: 'G4', state: 'released', proposals: [proposal('B4', 13), proposal('E5', 6)] }),
    barOf(9, { cantus: 'F4', line: whole('D5'), figure: figure('6') }),
    barOf(10, { cantus: 'E4', line: whole('C#5'), figure: figure('6'), motion: 'parallel' }),
    barOf(11, { cantus: 'D4', line: whole('D5'), figure: figure('8'), motion: 'contrary' }),
  ],
  arcs: [
    { id: 'fifth', fromBar: 6, toBar: 7, tone: 'breach' },
    { id: 'sixths', fromBar: 7, toBar: 9, tone: 'remark' },
  ],
  brackets: [
    { fromBar: 1, toBar: 5, label: 'first gesture' },
    { fromBar: 6, toBar: 11, label: 'second gesture: apex A, then home' },
  ],
}
