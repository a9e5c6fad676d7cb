import type { Finding } from '@/shared/rules'
import type {
  ProposalMark,
  ScoreArc,
  ScoreBar,
  ScoreBracket,
  ScoreInput,
  Tone,
} from '@/shared/notation/score-input'
import type { Line } from '@/shared/theory/note'
import { formatPitch } from '@/shared/theory/pitch'
import { lineWith } from './line-with'
import type { LessonView } from './lesson-view'
import { railOf } from './rail'
import type { RoomMark } from './room'

const NO_MARKS: readonly ProposalMark[] = []

const toneOf = (level: Finding['level']): 'breach' | 'remark' => (level === 'law' ? 'breach' : 'remark')

/** From the second species on values are told apart, and a solid lozenge is a short note. */
const isMeasured = (view: LessonView): boolean => view.exercise.species > 1

/** What is bowed over: where a solid lozenge cannot tell of a breach, findings of a single bar have a mark of their own. */
const told = (view: LessonView, findings: readonly Finding[]): readonly Finding[] =>
  isMeasured(view) ? findings : spanning(findings)

/** Findings of two bars or more: on a proposal, a finding of its own bar is told by the lozenge itself. */
const spanning = (findings: readonly Finding[]): readonly Finding[] =>
  findings.filter(({ bars }) => bars.length > 1)

/** Arcs over the score, breaches first; at most one for each span. */
export function arcsOf(findings: readonly Finding[]): readonly ScoreArc[] {
  const arcs = new Map<string, ScoreArc>()
  for (const finding of findings) {
    const fromBar = finding.bars[0]
    const toBar = finding.bars.at(-1)
    if (fromBar === undefined || toBar === undefined) continue
    const id = `${fromBar}-${toBar}`
    if (arcs.get(id)?.tone === 'breach') continue
    arcs.set(id, { id, fromBar, toBar, tone: toneOf(finding.level) })
  }
  return [...arcs.values()]
}

const isOneBar = ({ bars }: Finding): boolean => bars.length === 1

const overlaps = (a: Finding, b: Finding): boolean =>
  isOneBar(a) || isOneBar(b)
    ? (a.bars[0] ?? 0) <= (b.bars.at(-1) ?? 0) && (b.bars[0] ?? 0) <= (a.bars.at(-1) ?? 0)
    : (a.bars[0] ?? 0) < (b.bars.at(-1) ?? 0) && (b.bars[0] ?? 0) < (a.bars.at(-1) ?? 0)

/**
 * As many findings as fit on one level of arcs, those of the bar in hand first, then breaches. A strip that grew with every
 * arc would push the rungs from under the finger.
 */
export function oneLevel(findings: readonly Finding[], hand: number): readonly Finding[] {
  const ranked = [...findings].sort(
    (a, b) =>
      Number(b.bars.includes(hand)) - Number(a.bars.includes(hand)) ||
      Number(b.level === 'law') - Number(a.level === 'law'),
  )
  const level: Finding[] = []
  for (const finding of ranked) if (!level.some((other) => overlaps(other, finding))) level.push(finding)
  return level
}

const bracketsOf = (view: LessonView): readonly ScoreBracket[] =>
  view.gestures.map(({ from, to, label }) => ({ fromBar: from, toBar: to, label }))

/** The tone of a figure: that of the worst finding that ends at its bar. */
function figureTones(findings: readonly Finding[]): ReadonlyMap<number, Tone> {
  const tones = new Map<number, Tone>()
  for (const { bars, level } of findings) {
    const at = bars.at(-1)
    if (at !== undefined && tones.get(at) !== 'breach') tones.set(at, toneOf(level))
  }
  return tones
}

type Layers = Readonly<{
  /** Notes read for figures and motion: the agreed line, with the student's own laid over it on the desk. */
  read: Line
  proposalsOf: (bar: number) => readonly ProposalMark[]
  /** What the figures of the read notes are inked by. */
  findings: readonly Finding[]
  /** What is bowed over. */
  arcs: readonly Finding[]
}>

function compose(view: LessonView, { read, proposalsOf, findings, arcs }: Layers): ScoreInput {
  const rail = railOf(view.exercise, read, view.setAside)
  const tones = figureTones(findings)
  const bars = view.exercise.cantus.map((cantus, index): ScoreBar => {
    const number = index + 1
    const isSetAside = view.setAside.has(number)
    const state = view.bars[number]?.state ?? 'frozen'
    const entry = rail[index]
    return {
      number,
      state,
      isSetAside,
      cantus: formatPitch(cantus),
      line: view.line[number] ?? null,
      proposals: isSetAside ? NO_MARKS : proposalsOf(number),
      figure: entry?.figure ? { text: entry.figure, tone: tones.get(number) ?? 'cantus' } : null,
      laterFigures: entry?.later.map((figure) => ({ ...figure, tone: 'cantus' as const })) ?? [],
      motion: entry?.motion ?? null,
      label: null,
    }
  })
  return {
    position: view.exercise.position,
    clefs: view.written.clefs,
    signature: view.written.signature,
    bars,
    arcs: arcsOf(arcs),
    brackets: bracketsOf(view),
    isMeasured: isMeasured(view),
  }
}

/** The score for wall and lectern: the agreed line with its findings, the room's lozenges, and arcs over what is told. */
export function roomScoreOf(
  view: LessonView,
  marks: readonly RoomMark[],
  findings: readonly Finding[],
  arcs: Readonly<{ ofRoom: readonly Finding[]; ofLine: readonly Finding[] }>,
): ScoreInput {
  const byBar = new Map<number, ProposalMark[]>()
  for (const { bar, notes, count, tone } of marks) {
    const inBar = byBar.get(bar) ?? []
    inBar.push({ notes, count, tone })
    byBar.set(bar, inBar)
  }
  return compose(view, {
    read: view.line,
    proposalsOf: (bar) => byBar.get(bar) ?? NO_MARKS,
    findings,
    arcs: [...told(view, arcs.ofRoom), ...arcs.ofLine],
  })
}

/** The score for a desk: the agreed line and the student's own lozenges, with the findings on them when they are shown. */
export function deskScoreOf(
  view: LessonView,
  own: Line,
  findings: readonly Finding[],
  hand: number,
): ScoreInput {
  const tones = figureTones(findings)
  return compose(view, {
    read: lineWith(view.line, own),
    proposalsOf: (bar) => {
      const notes = own[bar]
      if (!notes) return NO_MARKS
      const tone = tones.get(bar)
      return [{ notes, count: null, tone: tone === 'breach' || tone === 'remark' ? tone : 'line' }]
    },
    findings,
    arcs: oneLevel(told(view, findings), hand),
  })
}

/** A few bars of a proposal, small, for a row of the lectern. Nothing but the line's own staff. */
export function miniScoreOf(view: LessonView, notes: Line, findings: readonly Finding[]): ScoreInput {
  const tones = figureTones(findings)
  const shown = Object.keys(notes)
    .map(Number)
    .sort((a, b) => a - b)
  return {
    position: view.exercise.position,
    clefs: view.written.clefs,
    signature: view.written.signature,
    bars: shown.map((number): ScoreBar => {
      const tone = tones.get(number)
      return {
        number,
        state: 'plain',
        isSetAside: false,
        cantus: null,
        line: null,
        proposals: [
          {
            notes: notes[number] ?? [],
            count: null,
            tone: tone === 'breach' || tone === 'remark' ? tone : 'line',
          },
        ],
        figure: null,
        motion: null,
        label: null,
      }
    }),
    arcs: [],
    brackets: [],
    isMeasured: isMeasured(view),
  }
}
