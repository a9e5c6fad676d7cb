import type { BarNotes } from '@/shared/theory/note'
import type { BarState, ChorusProposal, Spread } from '@/shared/wire/documents'
import type { ChorusState } from './board-state'

/** Members who wrote the same notes over the same bars. */
export type ProposalGroup = Readonly<{
  /** The same for the same notes, whoever wrote them: for lists and comparing. */
  key: string
  /** What is written, by bar; a bar that its members left unwritten is missing. */
  notes: Readonly<Record<number, BarNotes>>
  /** Whether every bar of the span is written. */
  isComplete: boolean
  count: number
  memberIds: readonly string[]
}>

/** Notes as text: equal texts are equal notes. */
export const formatNotes = (notes: BarNotes): string =>
  notes.map(({ pitch, ticks, tied }) => `${pitch ?? 'rest'}/${ticks}${tied ? '~' : ''}`).join(' ')

export const isSameNotes = (a: BarNotes, b: BarNotes): boolean => a === b || formatNotes(a) === formatNotes(b)

const standing = (
  proposal: ChorusProposal | undefined,
  state: BarState | undefined,
): ChorusProposal | undefined => (proposal && proposal.round === state?.round ? proposal : undefined)

/**
 * The distinct proposals for a bar, or for a span of bars read as one sequence, with how many hold each. Proposals of an
 * older round do not stand. Order: most members first, whole before partial, then by notes; it never depends on who
 * wrote first or last.
 */
export function groupProposals(
  chorus: ChorusState,
  bars: readonly number[],
  states: Readonly<Record<number, BarState>>,
): readonly ProposalGroup[] {
  const members = new Set(bars.flatMap((bar) => Object.keys(chorus[bar] ?? {})))
  const groups = new Map<string, { notes: Record<number, BarNotes>; memberIds: string[] }>()
  for (const memberId of members) {
    const notes: Record<number, BarNotes> = {}
    for (const bar of bars) {
      const proposal = standing(chorus[bar]?.[memberId], states[bar])
      if (proposal) notes[bar] = proposal.notes
    }
    const written = bars.filter((bar) => notes[bar])
    if (written.length === 0) continue
    const key = bars.map((bar) => `${bar}=${notes[bar] ? formatNotes(notes[bar]) : ''}`).join('|')
    const group = groups.get(key)
    if (group) group.memberIds.push(memberId)
    else groups.set(key, { notes, memberIds: [memberId] })
  }
  return [...groups]
    .map(([key, { notes, memberIds }]) => ({
      key,
      notes,
      isComplete: bars.every((bar) => notes[bar]),
      count: memberIds.length,
      memberIds: memberIds.sort(),
    }))
    .sort(
      (a, b) => b.count - a.count || Number(b.isComplete) - Number(a.isComplete) || (a.key < b.key ? -1 : 1),
    )
}

/** The room's proposals for one bar without names, as the board carries it. */
export const spreadOf = (chorus: ChorusState, bar: number, state: BarState): Spread =>
  groupProposals(chorus, [bar], { [bar]: state }).map(({ notes, count }) => ({
    notes: (notes[bar] as BarNotes).map((note) => ({ ...note })),
    count,
  }))
