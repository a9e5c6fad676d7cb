/**
 * What each rule of fifth species accepts and rejects: a table of facts, and therefore long. Common practice where the
 * catalogue's sources give no example.
 */
import type { Row } from './rule-cases'

export const FIFTH_CANTUS = 'D4 F4 E4 D4'
const LINE = 'r:2,A4:2~ A4:1,C5:1,D5:2~ D5:1,C#5:0.5,B4:0.5,C#5:2 D5'
const BELOW = { position: 'below' } as const
const RISING = { mode: 'ionian', final: 'C', cantus: 'C4 E4 B3 C4' } as const
const REST = 'D5:2,C#5:2 D5'

/** A second bar against F4, and the rest of the line after it. */
const second = (bar: string, after = REST): string => `r:2,A4:2~ ${bar} ${after}`
/** A third bar against E4, after D5 held over. */
const third = (bar: string, last = 'D5'): string => `r:2,A4:2~ A4:2,D5:2~ ${bar} ${last}`

export const FIFTH_CASES: Readonly<Record<string, readonly Row[]>> = {
  's5-mix': [
    [LINE, [], 'all values'],
    [second('A4:1,B4:1,C5:1,D5:1'), [3], 'a quarter passes; the seventh on the downbeat was not held'],
    [second('A4:1,B4:1,C5:2~', 'C5:2,C#5:2 D5'), [], 'a dissonant quarter passes'],
    [second('A4:2,G4:2', 'E4:2,C#4:2 D4'), [2], 'a half is left by a leap'],
    [second('A4:2,G4:2', 'F4:2,C#4:2 D4'), [3], 'a half passes; the second on the downbeat was not held'],
    [
      second('C5:1,D5:1,E5:1,D5:1', 'C5:2,C#5:2 D5'),
      [2],
      'the third quarter turns back',
      { params: { neighbour: 'no' } },
    ],
    [second('A4:1,G4:1,A4:2~', 'A4:1,G4:1,C#5:2 D5'), [], 'a held fourth falls on the second quarter'],
    [
      second('A4:1,G4:1,A4:2', 'G4:2,C#5:2 D5'),
      [2],
      'a lower neighbour, where none is used',
      { params: { neighbour: 'no' } },
    ],
    [
      second('A4:1,G4:1,A4:2', 'G4:2,C#5:2 D5'),
      [],
      'a lower neighbour, where it is used',
      { params: { neighbour: 'lower' } },
    ],
    [
      second('A4:1,B4:1,A4:2', 'G4:2,C#5:2 D5'),
      [2],
      'an upper neighbour, where the lower is used',
      { params: { neighbour: 'lower' } },
    ],
    [second('A4:2,B4:1,C5:1', 'B4:2,C#5:2 D5'), [], 'a dissonant third quarter between consonances'],
    [second('D5:1,C5:1,B4:1,A4:1', 'G4:2,C#5:2 D5'), [], 'a run through the third quarter'],
    [second('F5:1,E5:1,Bb4:2', 'G4:2,C#5:2 D5'), [2, 2], 'a seventh and a fourth left by a leap'],
    [second('F5:1,E5:1,C5:1,D5:1', 'B4:2,C#5:2 D5'), [], 'a cambiata'],
    [
      second('F5:1,E5:1,C5:1,D5:1', 'B4:2,C#5:2 D5'),
      [2],
      'a cambiata, where none is used',
      { params: { cambiata: false } },
    ],
    [second('F5:1,E5:1,C5:1,A4:1', 'B4:2,C#5:2 D5'), [2], 'a cambiata that does not rise'],
    [
      second('D5:1,C5:1,B4:1,A4:1', 'B4:2,C#5:2 D5'),
      [],
      'a falling third quarter',
      { params: { thirdQuarter: 'falling' } },
    ],
    [second('A4:1,Bb4:1,B4:1,C5:1', 'B4:2,C#5:2 D5'), [2, 2], 'a chromatic step is none'],
    [
      second('A4:1,A4:1,B4:1,C5:1', 'B4:2,C#5:2 D5'),
      [2],
      'a rising third quarter, where it falls',
      { params: { thirdQuarter: 'falling' } },
    ],
    [second('F4:1,G4:1,B4:1,C5:1', 'B4:2,C#5:2 D5'), [2, 2], 'leaps into and out of dissonances'],
    [third('D5:2,G4:2'), [3], 'a suspension that leaps away'],
    [third('D5:1,G4:1,C#5:2'), [], 'a suspension that leaps down and comes back'],
    [third('D5:1,G4:1,B4:1,C#5:1'), [3], 'it comes back late'],
    [
      third('D5:1,G4:1,B4:1,C#5:1'),
      [],
      'it comes back late, where it may',
      { params: { resolution: 'fourth-quarter' } },
    ],
    ['r:2,A4:2~ A4:2,A4:2~ A4:2,G4:2 D5', [], 'a fourth falls to a third'],
    ['r:2,B4:2~ B4:2,A4:2 G4:2,C#5:2 D5', [], 'an augmented fourth falls to a third'],
    [
      'r:2,F4:2~ F4:2,E4:2 E4:2,C#5:2 D5',
      [2],
      'a diminished fifth falls to a fourth',
      { cantus: 'D4 B3 E4 D4' },
    ],
    [second('A4:1.5,B4:0.5,C5:2~', 'C5:2,C#5:2 D5'), [2], 'a dotted quarter'],
    [second('A4:2,r:2', 'C5:2,C#5:2 D5'), [2], 'a rest inside'],
    [second('A4:1,B4:1,D5:2', 'B4:2,C#5:2 D5'), [2], 'a dissonant quarter left by a leap'],
    [
      second('A4:2,B4:1,C5:1', 'B4:2,C#5:2 D5'),
      [2],
      'a third quarter after a dissonance',
      { cantus: 'D4 E4 E4 D4' },
    ],
    [second('A4:1,D5:1,C5:1', '. D5'), [], 'what is not written is not judged'],
  ],
  's5-open': [
    [LINE, [], 'a rest and a fifth'],
    ['r:2,D4:2~ D4:2,A3:1,B3:1 . .', [], 'a unison below', BELOW],
    ['A4:2,D5:2~ . . .', [], 'no rest, where it is optional', { params: { rest: 'optional' } }],
    ['A4:2,D5:2~ . . .', [1], 'no rest'],
    ['r:1,A4:1,D5:2~ . . .', [1], 'a quarter rest'],
    ['r:2,F4:2~ . . .', [1], 'a third'],
    ['r:2,G3:2~ . . .', [1], 'a fifth below', BELOW],
    ['r:2,A4:2 C5:2,D5:2~ . .', [2], 'not tied, as a remark'],
    ['r:2,A4:2 C5:2,D5:2~ . .', [], 'not tied, where it is free', { params: { tied: false } }],
  ],
  's5-close': [
    [LINE, [], 'a decorated suspension'],
    [third('D5:1,C#5:1,C#5:2'), [], 'an early resolution'],
    [second('A4:2,C5:2', 'B4:2,C#5:2 D5'), [3], 'no suspension'],
    [
      second('A4:2,C5:2', 'B4:2,C#5:2 D5'),
      [],
      'no suspension, where any formula will do',
      { params: { cadence: 'clausula' } },
    ],
    [third('D5:2,B4:2'), [3], 'a fifth'],
    [third('D5:2,C5:2'), [3], 'a minor sixth'],
    [third('D5:2,C#5:2', 'D5:2,A4:2'), [4], 'two halves at the end'],
    ['r:2,G4:2~ G4:2,E4:2~ E4:2,G4:2 C5', [3], 'a cantus that rises, and no second degree', RISING],
    ['r:2,G4:2~ G4:2,E4:2~ E4:2,D4:2 C4', [], 'a cantus that rises', RISING],
  ],
  's5-value-run': [
    [LINE, [], 'changing values'],
    [second('A4:1,G4:1,A4:1,B4:1', 'C5:1,B4:1,C5:1,D5:1 D5'), [], 'two bars of quarters'],
    [
      second('A4:1,G4:1,A4:1,B4:1', 'C5:1,B4:1,C5:1,D5:1 D5'),
      [3],
      'two bars, where a bar and a half is the limit',
      { params: { quarters: 6 } },
    ],
    [second('A4:2,D5:2~', 'D5:2,C#5:2 D5'), [3], 'two bars and a half of halves'],
    ['r:2,A4:2~ A4:2,D5:2~ D5:2,C#5:2 D5:2,D5:2', [3], 'told once'],
  ],
  's5-whole-inside': [
    [LINE, [], 'one at the end'],
    ['r:2,A4:2~ A4:2~,A4:1,C5:1 . D5', [], 'a long note that is no whole'],
    ['r:2,A4:2~ A4 D5:2,C#5:2 D5', [2], 'a bar held through'],
    ['A4 A4:2,D5:2~ . .', [1], 'at the beginning'],
  ],
  's5-eighth-place': [
    [LINE, [], 'the second quarter'],
    [second('A4:2,B4:1,C5:0.5,B4:0.5', 'C5:2,C#5:2 D5'), [], 'the fourth quarter'],
    [second('A4:0.5,B4:0.5,C5:1,D5:2~'), [2], 'the first quarter'],
    [second('A4:1,B4:1,C5:0.5,D5:0.5,C5:1'), [2], 'the third quarter'],
    [second('A4:1.5,B4:0.5,C5:2'), [2], 'one eighth alone'],
    [
      second('A4:0.5,B4:0.5,C5:0.5,B4:0.5,D5:2~'),
      [],
      'first and second, where it may',
      { params: { strong: 'beside-weak' } },
    ],
    [
      second('A4:1,B4:0.5,C5:0.5,D5:0.5,C5:0.5,D5:1'),
      [],
      'second and third, where it may',
      { params: { strong: 'beside-weak' } },
    ],
    [
      second('A4:0.5,B4:0.5,C5:1,D5:2~'),
      [2],
      'the first alone, where it may not be',
      { params: { strong: 'beside-weak' } },
    ],
  ],
  's5-eighth-step': [
    [LINE, [], 'steps'],
    [second('A4:1,C5:0.5,B4:0.5,C5:2~'), [2], 'the first reached by a third'],
    [second('A4:1,C5:0.5,B4:0.5,C5:2~'), [], 'the same, where it is free', { params: { entry: 'free' } }],
    [second('A4:1,B4:0.5,D5:0.5,C5:2~'), [2], 'a third inside'],
    [second('A4:1,B4:0.5,C5:0.5,A4:2~'), [2], 'left by a third'],
  ],
  's5-eighth-count': [
    [LINE, [], 'one'],
    [second('A4:1,B4:0.5,C5:0.5,D5:1,C5:0.5,B4:0.5'), [2], 'two'],
    [
      second('A4:1,B4:0.5,C5:0.5,D5:1,C5:0.5,B4:0.5'),
      [],
      'two, where two are let pass',
      { params: { max: 2 } },
    ],
    [LINE, [3], 'one, where there are to be none', { params: { max: 0 } }],
    [second('A4:2,B4:1,C5:0.5,D5:0.5', 'E5:1,D5:0.5,C5:0.5,C#5:2 D5'), [], 'one in each of two bars'],
  ],
  's5-eighth-figure': [
    [LINE, [], 'a turn below'],
    [second('A4:1,B4:0.5,C5:0.5,D5:2~'), [], 'a run'],
    [second('A4:1,B4:0.5,C5:0.5,B4:2~'), [2], 'a turn above'],
    [
      second('A4:1,B4:0.5,C5:0.5,B4:2~'),
      [],
      'a turn above, where it is used',
      { params: { figures: ['upper-neighbour'] } },
    ],
    [
      second('A4:1,B4:0.5,C5:0.5,D5:2~'),
      [2],
      'a run, where only turns are used',
      { params: { figures: ['lower-neighbour'] } },
    ],
    [second('A4:1,B4:0.5,A4:0.5,F4:2~'), [2], 'a leap'],
  ],
  's5-ornamented-resolution': [
    [LINE, [], 'a pair of eighths'],
    [third('D5:2,C#5:2'), [], 'none'],
    [third('D5:1,C#5:1,C#5:2'), [], 'an early resolution is another rule’s matter'],
    [third('D5:1,G4:1,C#5:2'), [], 'a fifth down'],
    [third('D5:1,E5:1,C#5:2'), [], 'a step up'],
    [third('D5:1,B4:1,C#5:2'), [], 'a third down'],
    [third('D5:1,E5:0.5,F5:0.5,C#5:2'), [3], 'eighths that go up'],
    [third('D5:1,G5:1,C#5:2'), [3], 'a leap up'],
    [third('D5:1,G4:1,C#5:2'), [3], 'a leap down, where it is not used', { params: { forms: ['eighths'] } }],
    [third('D5:0.5,E5:0.5,D5:0.5,E5:0.5,C#5:2'), [3], 'too many notes'],
    [third('D5:1,G4:1,A4:2'), [], 'no resolution is another rule’s matter'],
    [third('D5:3,C#5:1'), [], 'a late resolution is another rule’s matter'],
  ],
  's5-ornament-leap': [
    [LINE, [], 'steps'],
    [third('D5:1,G4:1,C#5:2'), [], 'a leap to a third'],
    [third('D5:1,A4:1,C#5:2'), [3], 'a leap to a fourth'],
    [third('D5:1,F4:1,C#5:2'), [3], 'a leap to a second'],
    [second('A4:1,E4:1,D5:2~'), [], 'a consonant tie is not its matter'],
  ],
  's5-anticipation': [
    [LINE, [], 'no note twice'],
    [third('D5:1,C#5:1,C#5:2'), [], 'an early resolution'],
    [
      third('D5:1,C#5:1,C#5:2'),
      [3],
      'an early resolution, where none is used',
      { params: { allowed: false } },
    ],
    [second('A4:1,C5:1,C5:2~'), [2], 'a third twice'],
    [second('A4:2,C5:2', 'C5:2,C#5:2 D5'), [3], 'over the bar line'],
    [second('A4:1,C5:1,D5:1,C5:1', 'B4:1,A4:1,A4:2 D5'), [3], 'after no tie'],
  ],
  's5-quarter-quarter-half': [
    [LINE, [], 'tied'],
    [second('A4:1,B4:1,C5:2', 'B4:2,C#5:2 D5'), [2], 'not tied'],
    [second('A4:1,B4:1,C5:1,B4:1', 'C5:2,C#5:2 D5'), [], 'four quarters'],
    [second('C5:1,B4:1,A4:2', 'G4:1,C#5:1,C#5:2 D5'), [2, 3], 'twice'],
    [second('A4:1,B4:1,C5:2', '. D5'), [], 'what follows is not written'],
  ],
  's5-quarter-half-quarter': [
    [LINE, [], 'none'],
    [second('A4:1,C5:2,D5:1'), [2], 'a half'],
    [second('A4:1,C5:1~,C5:1,D5:1'), [2], 'two quarters tied to one'],
    [second('A4:1,C5:3'), [2], 'a dotted half'],
    [second('A4:3,C5:1'), [], 'a dotted half on the downbeat'],
  ],
  's5-dotted-half': [
    [LINE, [], 'a half tied to a quarter'],
    [second('A4:1,C5:3'), [2], 'on the second quarter'],
    [second('A4:2,C5:1,D5:1~', 'D5:2,C#5:2 D5'), [2], 'a quarter tied to a half'],
    [
      LINE,
      [1, 2],
      'a half tied to a quarter, where only downbeats are strong',
      { params: { begins: 'downbeat' } },
    ],
    ['A4:3,C5:1 . . .', [], 'on the downbeat', { params: { begins: 'downbeat' } }],
  ],
  's5-tie-value': [
    [LINE, [], 'halves to quarters'],
    [second('A4:1,B4:1,C5:1,D5:1~'), [3], 'a quarter'],
    [
      second('A4:1,B4:1,C5:1,D5:1~', 'D5:1,C5:1,C#5:2 D5'),
      [],
      'a quarter to a quarter, where it may be',
      { params: { preparation: 1 } },
    ],
    [
      second('A4:1,B4:1,C5:1,D5:1~'),
      [3],
      'a quarter to a half, where quarters may be',
      { params: { preparation: 1 } },
    ],
    [second('A4:2,D5:2~', 'D5:3,C#5:1 D5'), [3], 'a half to a dotted half'],
    [
      second('A4:2,D5:2~', 'D5:3,C#5:1 D5'),
      [],
      'the same, where the length is free',
      { params: { longToShort: false } },
    ],
  ],
  's5-consonant-tie-early': [
    [LINE, [], 'on the second quarter'],
    [second('A4:0.5,B4:0.5,C5:1,D5:2~'), [2], 'after an eighth'],
    [
      second('A4:1,C5:1,D5:2~'),
      [2],
      'on the second quarter, where it waits for the third',
      { params: { earliest: 'third-quarter' } },
    ],
    [third('D5:0.5,C#5:0.5,B4:1,C#5:2'), [], 'a dissonance is not its matter'],
  ],
}
