import type { ProposalGroup } from '@/shared/board'
import type { Finding } from '@/shared/rules'
import type { BarNotes, Line } from '@/shared/theory/note'
import type { Judge } from './judge'
import { barsOf, identityOfNotes } from './line-with'

/** One distinct proposal for a bar or a span, who made it, and what the rules say of it. */
export type RoomGroup = ProposalGroup & Readonly<{ findings: readonly Finding[] }>

/** What one rule says of the members' own proposals, wherever it says it, and how many members it is true of. */
export type RoomFinding = Readonly<{ id: string; findings: readonly Finding[]; count: number }>

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

/** The same words about other bars are one thing to say to the room. */
const roomFindingId = ({ ruleId, code, args }: Finding): string => `${ruleId}/${code}/${JSON.stringify(args)}`

const isSameBars = (a: Finding, b: Finding): boolean => a.bars.join(',') === b.bars.join(',')

/** The bar where a finding was completed: the last it points at that these notes wrote. */
export function completedAt(finding: Finding, notes: Line): number | null {
  for (let index = finding.bars.length - 1; index >= 0; index -= 1) {
    const bar = finding.bars[index]
    if (bar !== undefined && notes[bar]) return bar
  }
  return null
}

/** What the rules say of the room's proposals: breaches first, then what is true of most members. */
export function countFindings(groups: readonly RoomGroup[]): readonly RoomFinding[] {
  const found = new Map<string, { findings: Finding[]; count: number }>()
  for (const group of groups) {
    const told = new Set<string>()
    for (const finding of group.findings) {
      const id = roomFindingId(finding)
      const known = found.get(id) ?? { findings: [], count: 0 }
      found.set(id, known)
      if (!known.findings.some((other) => isSameBars(other, finding))) known.findings.push(finding)
      // A member who breaks a rule twice is still one member.
      if (!told.has(id)) known.count += group.count
      told.add(id)
    }
  }
  const isLaw = ({ findings }: RoomFinding): number => Number(findings[0]?.level === 'law')
  return [...found]
    .map(([id, { findings, count }]) => ({ id, findings, count }))
    .sort((a, b) => isLaw(b) - isLaw(a) || b.count - a.count || (a.id < b.id ? -1 : 1))
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
