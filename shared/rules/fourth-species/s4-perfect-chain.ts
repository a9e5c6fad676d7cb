import { cite } from '@/shared/rules/cite'
import { exampleIn } from '@/shared/rules/example-in'
import { NO_PARAMS, type NoParams } from '@/shared/rules/first-species/folds'
import {
  breachAt,
  perfectKindOf,
  sonorityOf,
  type PerfectKind,
  type Sonority,
} from '@/shared/rules/first-species/sonority'
import { goOn, pack, packPitch, PITCH_ROOM } from '@/shared/rules/fold'
import { isStepDown, isTiedOver, TIED_SPECIES } from '@/shared/rules/fourth-species/folds'
import type { Rule } from '@/shared/rules/rule'

/** Where held notes have fallen to a perfect consonance: in the bar before, and in this one. */
type State = Readonly<{ held: Sonority | null; earlier: Sonority | null; here: Sonority | null }>
const NONE: State = { held: null, earlier: null, here: null }

const example = exampleIn(4, 'D4 F4 E4 D4')

export const s4PerfectChain: Rule<State, NoParams> = {
  id: 's4-perfect-chain',
  level: 'law',
  scope: 'pair',
  species: TIED_SPECIES,
  params: NO_PARAMS,
  start: () => NONE,
  step: ({ held, earlier, here }, moment) => {
    const now = sonorityOf(moment)
    if (now === null) return goOn(NONE)
    if (now.place === 0) {
      return goOn({ held: isTiedOver(now) && !now.isLast ? now : null, earlier: here, here: null })
    }
    const kind = held !== null && isStepDown(held, now) ? perfectKindOf(now) : null
    if (kind === null) return goOn({ held: null, earlier, here })
    const isAgain = earlier !== null && perfectKindOf(earlier) === kind
    return {
      state: { held: null, earlier, here: now },
      breach: isAgain ? breachAt(CODES[kind], [earlier, now]) : null,
    }
  },
  finish: () => null,
  key: ({ held, earlier, here }) =>
    pack([packPitch(held && held.note), PITCH_ROOM], [kindCode(earlier), 3], [kindCode(here), 3]),
  explain: {
    title: 'No chain of fifths or octaves',
    statement:
      'Two held notes in a row do not both fall to an octave or unison, nor both to a fifth: no two 9–8, no two 4–5 below, no two 6–5.',
    why: 'A suspension only delays the interval it falls to. Two that fall to octaves are parallel octaves, heard late.',
    mends: 'Let one of the two fall to a third or a sixth.',
    sources: cite('OMT1', 'DAVID', 'EX'),
    disagreement: 'Fux himself writes two 4–5 in a row once.',
    right: example('r:2,A4:2~ A4:2,D5:2~ D5:2,C#5:2 D5'),
    wrong: example('r:2,A4:2~ A4:2,E5:2~ E5:2,D5:2~ D5:2,C5:2~ C5:2,C#5:2 D5', [4], {
      cantus: 'D4 C4 D4 C4 E4 D4',
    }),
    messages: {
      octaves: 'Two held notes in a row fall to an octave.',
      fifths: 'Two held notes in a row fall to a fifth.',
    },
  },
}

const CODES: Readonly<Record<PerfectKind, string>> = { octave: 'octaves', fifth: 'fifths' }

function kindCode(sonority: Sonority | null): number {
  const kind = sonority && perfectKindOf(sonority)
  return kind === null ? 0 : kind === 'octave' ? 1 : 2
}
