import { ACTS, can, type Role } from '@/shared/board'

/** The whole table, written out by hand a second time: T teacher, A assistant, S student, G guest, W wall, N nobody. */
const EXPECTED: Readonly<Record<string, string>> = {
  'see board': 'TASGW',
  'write board': 'TA',
  'release bars': 'TA',
  'freeze bars': 'TA',
  'set bars aside': 'TA',
  adopt: 'TA',
  'take back': 'TA',
  'clear room': 'TA',
  'change stage': 'TA',
  'draw gesture': 'TA',
  propose: 'SG',
  'see own sheet': 'SG',
  'see every sheet': 'TA',
  'see chorus': 'TAW',
  'see names': 'TA',
  'be counted': 'TASG',
  'raise hand': 'SG',
  'lower any hand': 'TA',
  'cue wall': 'TA',
  'hear cues': 'W',
  'remove member': 'TA',
  'open door': 'TA',
  'rename lesson': 'TA',
  'link wall': 'TA',
  'open lesson': 'TA',
  'end lesson': 'TA',
  'remove lesson': 'T',
}
const LETTER: Readonly<Record<Role, string>> = {
  teacher: 'T',
  assistant: 'A',
  student: 'S',
  guest: 'G',
  wall: 'W',
  nobody: 'N',
}

it('knows every act of the table', () => {
  expect([...ACTS].sort()).toEqual(Object.keys(EXPECTED).sort())
})

it.each(ACTS)('%s: is allowed to exactly those who may', (act) => {
  for (const role of Object.keys(LETTER) as Role[]) {
    expect([role, can(role, act)]).toEqual([role, EXPECTED[act]?.includes(LETTER[role])])
  }
})
