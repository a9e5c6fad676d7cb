import type { ProposalGroup } from '@/shared/board'
import type { Finding } from '@/shared/rules'
import type { BarNotes } from '@/shared/theory/note'
import type { Judge } from './judge'
import { barsOf, identityOfNotes } from './line-with'

/** One distinct proposal for a bar or a span, who made it, and what the rules say of it. */
export type RoomGroup = ProposalGroup & Readonly<{ findings: readonly Finding[] }>

/** A finding on the members' own proposals, and how many members it is true of. */
export type RoomFinding = Readonly<{ id: string; finding: Finding; count: number }>

/** A note that stands in one bar, for the lozenges. */
export type RoomMark = Readonly<{
  bar: number
  notes: BarNotes
  count: number
  tone: 'line' | 'breach' | 'remark'
}>

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

const toneOf = (findings: readonly Finding[] | undefined): RoomMark['tone'] => {
  if (!findings || findings.length === 0) return 'line'
  return findings.some(({ level }) => level === 'law') ? 'breach' : 'remark'
}

/** Findings of one rule at the same bars are one to the room, whatever notes brought them about. */
const roomFindingId = ({ ruleId, code, bars }: Finding): string => `${ruleId}/${code}/${bars.join(',')}`

/** The bar where a finding was completed: the last it points at that the proposal wrote. */
function barOf(finding: Finding, group: RoomGroup): number | null {
  for (let index = finding.bars.length - 1; index >= 0; index -= 1) {
    const bar = finding.bars[index]
    if (bar !== undefined && group.notes[bar]) return bar
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
 * The lozenges for each bar. A lozenge takes the tone that holds for at least half of those who proposed it, so that one
 * hand's way into a note does not colour everybody's.
 */
export function markRoom(groups: readonly RoomGroup[]): readonly RoomMark[] {
  type Tally = { bar: number; notes: BarNotes; count: number; breach: number; remark: number }
  const tallies = new Map<string, Tally>()
  for (const group of groups) {
    const byBar = new Map<number, Finding[]>()
    for (const finding of group.findings) {
      const bar = barOf(finding, group)
      if (bar !== null) byBar.set(bar, [...(byBar.get(bar) ?? []), finding])
    }
    for (const bar of barsOf(group.notes)) {
      const notes = group.notes[bar] as BarNotes
      const key = `${bar}=${identityOfNotes(notes)}`
      const tally = tallies.get(key) ?? { bar, notes, count: 0, breach: 0, remark: 0 }
      const tone = toneOf(byBar.get(bar))
      tally.count += group.count
      if (tone === 'breach') tally.breach += group.count
      else if (tone === 'remark') tally.remark += group.count
      tallies.set(key, tally)
    }
  }
  return [...tallies.values()]
    .map(({ bar, notes, count, breach, remark }): RoomMark => {
      const tone = 2 * breach >= count ? 'breach' : 2 * (breach + remark) >= count ? 'remark' : 'line'
      return { bar, notes, count, tone }
    })
    .sort(
      (a, b) =>
        a.bar - b.bar || b.count - a.count || (identityOfNotes(a.notes) < identityOfNotes(b.notes) ? -1 : 1),
    )
}
