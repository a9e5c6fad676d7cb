import { createJudge } from '@/components/lesson/judge'
import { countFindings, markRoom, rankRoom } from '@/components/lesson/room'
import { viewOf } from '@/components/lesson/lesson-view'
import { createBoardState, groupProposals, INITIAL_STAGE, type BoardState } from '@/shared/board'
import { findPreset, type RuleSet } from '@/shared/rules'
import { WHOLE_TICKS } from '@/shared/theory/duration'

const one = (pitch: string) => [{ pitch, ticks: WHOLE_TICKS }]

/** The cantus of the sketches, bars 6 to 8 released, the rest of the line adopted. */
function board(): BoardState {
  const start = createBoardState(
    {
      title: 'A second voice over the cantus in D',
      cantus: 'D4 F4 E4 D4 G4 F4 A4 G4 F4 E4 D4'.split(' '),
      mode: 'dorian',
      final: 'D',
      species: 1,
      position: 'above',
      clefs: { cantus: 'treble', line: 'treble' },
      signature: 0,
      ruleSet: findPreset('fux-mann') as RuleSet as never,
    },
    INITIAL_STAGE,
  )
  const bars = { ...start.bars }
  for (const bar of [6, 7, 8]) bars[bar] = { state: 'released', setAside: false, round: 1 }
  const line = { 1: one('A4'), 4: one('A4'), 5: one('B4'), 9: one('D5'), 10: one('C#5'), 11: one('D5') }
  return { ...start, bars, line }
}

test('with the real checker, parallel fifths are told at both bars, of as many as made them', () => {
  const view = viewOf(board())
  const judge = createJudge(view.checker, view.line, view.setAside)
  const chorus = {
    6: {
      noor: { notes: one('C5'), round: 1 },
      jun: { notes: one('C5'), round: 1 },
      ana: { notes: one('D5'), round: 1 },
    },
    7: {
      noor: { notes: one('E5'), round: 1 },
      jun: { notes: one('E5'), round: 1 },
      ana: { notes: one('C5'), round: 1 },
    },
  }
  const groups = rankRoom(groupProposals(chorus, view.released, view.bars), judge)
  const parallel = countFindings(groups).find(({ findings }) => findings[0]?.ruleId === 'par-perfect')
  expect(parallel).toMatchObject({ count: 2, findings: [{ bars: [6, 7], level: 'law' }] })
  expect(markRoom(groups).find(({ bar, notes }) => bar === 7 && notes[0]?.pitch === 'E5')?.tone).toBe(
    'breach',
  )
  expect(markRoom(groups).find(({ bar, notes }) => bar === 7 && notes[0]?.pitch === 'C5')?.tone).not.toBe(
    'breach',
  )
})
