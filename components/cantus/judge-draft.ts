import { checkCantus, findPreset, type Finding, type RuleSet } from '@/shared/rules'
import { analyseCantus, type CantusAnalysis } from '@/shared/theory/analyse-cantus'
import { findCantusProblems, type CantusProblem } from '@/shared/theory/cantus-problems'
import { signatureOf } from '@/shared/theory/key'
import type { Mode } from '@/shared/theory/mode'
import {
  formatPitchClass,
  parsePitch,
  pitchOf,
  type Pitch,
  type PitchClass,
  type PitchName,
} from '@/shared/theory/pitch'
import { MAX_BARS, MIN_BARS } from '@/shared/wire/documents'
import { parseCantusText, type CantusToken } from './cantus-text'
import type { CantusDraft } from './draft'

/** All that can be said of a cantus while it is written, worked out afresh from what was typed. */
export type JudgedDraft = Readonly<{
  tokens: readonly CantusToken[]
  /** The notes, where every word names one; null otherwise. */
  notes: readonly PitchName[] | null
  mode: Mode
  final: PitchClass
  /** Accidentals at the clef; null where no clef carries this mode on this final. */
  signature: number | null
  problems: readonly CantusProblem[]
  /** Of the notes there are, words that name none left out; null without any. */
  analysis: CantusAnalysis | null
  findings: readonly Finding[]
}>

const DEFAULT_FINAL: PitchClass = { letter: 'D', alteration: 0 }
const DEFAULT_MODE: Mode = 'dorian'

/** Reads the name of a final; null for none. */
function parsePitchClass(name: string): PitchClass | null {
  const parsed = parsePitch(`${name}4`)
  return parsed.ok ? { letter: parsed.value.letter, alteration: parsed.value.alteration } : null
}

export function judgeDraft(draft: CantusDraft): JudgedDraft {
  const tokens = parseCantusText(draft.text, draft.clef)
  const written = tokens.flatMap(({ pitch }) => (pitch ? [pitch] : []))
  const pitches = written.map(pitchOf)
  const final = parsePitchClass(draft.final) ?? finalOf(pitches)
  const mode = draft.mode === 'auto' ? modeOf(pitches, final) : draft.mode
  const isAllNotes = written.length === tokens.length
  const ruleSet = findPreset(draft.presetId)
  return {
    tokens,
    notes: isAllNotes ? written : null,
    mode,
    final,
    signature: signatureOf(mode, final),
    problems: isAllNotes
      ? findCantusProblems(pitches, { mode, final, clef: draft.clef, least: MIN_BARS, most: MAX_BARS })
      : [],
    analysis: analyseCantus(pitches, { mode, final }),
    findings: ruleSet && isAllNotes && pitches.length > 0 ? judge(pitches, mode, final, ruleSet) : [],
  }
}

const judge = (cantus: readonly Pitch[], mode: Mode, final: PitchClass, ruleSet: RuleSet) =>
  checkCantus({ cantus, mode, final, species: 1, position: 'above' }, ruleSet)

function finalOf(pitches: readonly Pitch[]): PitchClass {
  const last = pitches.at(-1)
  return last ? { letter: last.letter, alteration: last.alteration } : DEFAULT_FINAL
}

/** The plainest mode on the final that holds every note. */
function modeOf(pitches: readonly Pitch[], final: PitchClass): Mode {
  return (
    analyseCantus([...pitches, { ...final, octave: 4 }], { mode: DEFAULT_MODE, final })?.modes[0] ??
    DEFAULT_MODE
  )
}

/** Finals one may choose: every spelling with at most one sign whose signature can be written. */
export const FINALS: readonly string[] = ['C', 'D', 'E', 'F', 'G', 'A', 'B'].flatMap((letter) =>
  letter === 'C' || letter === 'F'
    ? [letter, `${letter}#`]
    : letter === 'B' || letter === 'E'
      ? [`${letter}b`, letter]
      : [`${letter}b`, letter, `${letter}#`],
)

/** Those of the finals on which a mode can be written, or on which any can. */
export const finalsOf = (mode: Mode | 'auto'): readonly string[] =>
  FINALS.filter((name) => {
    const final = parsePitchClass(name)
    return final && (mode === 'auto' || signatureOf(mode, final) !== null)
  })

export const formatFinal = formatPitchClass
