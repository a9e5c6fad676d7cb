import type { ProposalGroup } from '@/shared/board'
import type { Finding } from '@/shared/rules'
import type { BarNotes, Line } from '@/shared/theory/note'
import type { Judge } from './judge'
import { barsOf, identityOfNotes } from './line-with'

/** One distinct proposal for a bar or a span, who made it, and what the rules say of it. */
export type RoomGroup = ProposalGroup & Readonly<{ findings: readonly Finding[] }>

/** A finding on the members' own proposals, and how many members it is true of. */
export type RoomFinding = Readonly<{ id: string; finding: Finding; count: number }>

/** A note that stands in one bar, for the lozenges. Remarks are matters of taste and colour nobody's note in public. */
export type RoomMark = Readonly<{ bar: number; notes: BarNotes; count: number; tone: 'line' | 'breach' }>

const countLevel = (findings: readonly Finding[], level: Finding['level']): number =>
  findings.filter((finding) => finding.level === level).length

/**
 * Finished gestures before begun ones; then more proposers first, fewer breaches, fewer remarks; then by what is written, so that
 * the order is the same on every screen.
 */
const compareGroups = (a: RoomGroup, b: RoomGroup): number =>
  Number(b.isComplete) - Number(a.isComplete) ||
  b.count - a.count ||
  countLevel(a.findings, 'law') - countLevel(b.findings, 'law') ||
  countLevel(a.findings, 'preference') - countLevel(b.findings, 'preference') ||
  (a.key < b.key ? -1 : 1)

/** The room's distinct proposals with their findings, ranked. */
export function rankRoom(groups: readonly ProposalGroup[], judge: Judge): readonly RoomGroup[] {
  judge.ofAll(groups.map(({ notes }) => notes))
  return groups.map((group) => ({ ...group, findings: judge.ofNotes(group.notes) })).sort(compareGroups)
}

/** Findings of one rule at the same bars are one to the room, whatever notes brought them about. */
const roomFindingId = ({ ruleId, code, bars }: Finding): string => `${ruleId}/${code}/${bars.join(',')}`

/** The bar where a finding was completed: the last it points at that these notes wrote. */
export function completedAt(finding: Finding, notes: Line): number | null {
  for (let index = finding.bars.length - 1; index >= 0; index -= 1) {
    const bar = finding.bars[index]
    if (bar !== undefined && notes[bar]) return bar
  }
  return null
}

/** Findings on the room's proposals, the most common first, with the number of members each is true of. */
export function countFindings(groups: readonly RoomGroup[]): readonly RoomFinding[] {
  const found = new Map<string, { finding: Finding; count: number }>()
  for (const group of groups) {
    const ids = new Set<string>()
    for (const finding of group.findings) {
      const id = roomFindingId(finding)
      // One member may break a rule in one place only once, however many notes it points at.
      if (ids.has(id)) continue
      ids.add(id)
      const known = found.get(id)
      if (known) known.count += group.count
      else found.set(id, { finding, count: group.count })
    }
  }
  return [...found]
    .map(([id, { finding, count }]) => ({ id, finding, count }))
    .sort((a, b) => b.count - a.count || (a.id < b.id ? -1 : 1))
}

/**
 * The lozenges for each bar. One is filled as a breach when at least half of those who proposed it broke a law there, so that
 * one hand's way into a note does not colour everybody's.
 */
export function markRoom(groups: readonly RoomGroup[]): readonly RoomMark[] {
  const tallies = new Map<string, { bar: number; notes: BarNotes; count: number; breaches: number }>()
  for (const group of groups) {
    const broken = new Set(
      group.findings
        .filter(({ level }) => level === 'law')
        .map((finding) => completedAt(finding, group.notes)),
    )
    for (const bar of barsOf(group.notes)) {
      const notes = group.notes[bar] as BarNotes
      const key = `${bar}=${identityOfNotes(notes)}`
      const tally = tallies.get(key) ?? { bar, notes, count: 0, breaches: 0 }
      tally.count += group.count
      if (broken.has(bar)) tally.breaches += group.count
      tallies.set(key, tally)
    }
  }
  return [...tallies.values()]
    .map(({ bar, notes, count, breaches }): RoomMark => ({
      bar,
      notes,
      count,
      tone: 2 * breaches >= count ? 'breach' : 'line',
    }))
    .sort(
      (a, b) =>
        a.bar - b.bar || b.count - a.count || (identityOfNotes(a.notes) < identityOfNotes(b.notes) ? -1 : 1),
    )
}
