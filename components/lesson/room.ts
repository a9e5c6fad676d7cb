import type { Finding } from '@/shared/rules'
import type { BarNotes, Line } from '@/shared/theory/note'
import type { Judge } from './judge'
import { barsOf, identityOfLine, identityOfNotes } from './line-with'

/** A member's standing proposals, by bar. */
export type MemberNotes = ReadonlyMap<string, Line>

/** One distinct proposal for a bar or a span, and who made it. */
export type RoomGroup = Readonly<{
  identity: string
  notes: Line
  memberIds: readonly string[]
  findings: readonly Finding[]
}>

/** A finding of the members' own proposals, and how many members it is true of. */
export type RoomFinding = Readonly<{ id: string; finding: Finding; memberIds: readonly string[] }>

/** A note that stands in one bar, for the wall's lozenges. */
export type RoomMark = Readonly<{
  bar: number
  notes: BarNotes
  count: number
  tone: 'line' | 'breach' | 'remark'
}>

/** What a member proposes in some bars, or null where a bar of them is still empty. */
function gestureOver(notes: Line, bars: readonly number[]): Line | null {
  const gesture: Record<number, BarNotes> = {}
  for (const bar of bars) {
    const inBar = notes[bar]
    if (!inBar) return null
    gesture[bar] = inBar
  }
  return gesture
}

const levelWeight = (findings: readonly Finding[], level: Finding['level']): number =>
  findings.filter((finding) => finding.level === level).length

/** More proposers first; then fewer breaches, fewer remarks; then by what is written, so that the order is the same everywhere. */
export const compareGroups = (a: RoomGroup, b: RoomGroup): number =>
  b.memberIds.length - a.memberIds.length ||
  levelWeight(a.findings, 'law') - levelWeight(b.findings, 'law') ||
  levelWeight(a.findings, 'preference') - levelWeight(b.findings, 'preference') ||
  (a.identity < b.identity ? -1 : a.identity > b.identity ? 1 : 0)

/** The room's distinct proposals for a span: those of members who have filled all of it, ranked. */
export function groupRoom(members: MemberNotes, bars: readonly number[], judge: Judge): readonly RoomGroup[] {
  const groups = new Map<string, { notes: Line; memberIds: string[] }>()
  for (const [memberId, notes] of members) {
    const gesture = gestureOver(notes, bars)
    if (!gesture) continue
    const identity = identityOfLine(gesture)
    const group = groups.get(identity)
    if (group) group.memberIds.push(memberId)
    else groups.set(identity, { notes: gesture, memberIds: [memberId] })
  }
  return [...groups]
    .map(([identity, group]) => ({ identity, ...group, findings: judge.ofNotes(group.notes) }))
    .sort(compareGroups)
}

/** How many members have begun a span without filling it. */
export const countUnfinished = (members: MemberNotes, bars: readonly number[]): number =>
  [...members.values()].filter((notes) => bars.some((bar) => notes[bar]) && gestureOver(notes, bars) === null)
    .length

const toneOf = (findings: readonly Finding[]): RoomMark['tone'] =>
  findings.some(({ level }) => level === 'law') ? 'breach' : findings.length > 0 ? 'remark' : 'line'

/**
 * The findings of every member's own proposals against the class's line, with the number of members each is true of, and the
 * lozenges for each bar. A finding belongs to the last bar it points at that the member wrote: that is where the step went wrong.
 * A lozenge takes the tone that holds for at least half of those who proposed it, so that one hand's way into a note does
 * not colour everybody's.
 */
export function readRoom(
  members: MemberNotes,
  judge: Judge,
): Readonly<{ findings: readonly RoomFinding[]; marks: readonly RoomMark[] }> {
  const findings = new Map<string, { finding: Finding; memberIds: string[] }>()
  const marks = new Map<
    string,
    { bar: number; notes: BarNotes; count: number; breach: number; remark: number }
  >()
  for (const [memberId, notes] of members) {
    const bars = barsOf(notes)
    const found = judge.ofNotes(notes)
    const byBar = new Map<number, Finding[]>()
    for (const finding of found) {
      const id = roomFindingId(finding)
      const known = findings.get(id)
      if (known) known.memberIds.push(memberId)
      else findings.set(id, { finding, memberIds: [memberId] })
      const at = finding.bars.findLast((bar) => notes[bar] !== undefined)
      if (at !== undefined) byBar.set(at, [...(byBar.get(at) ?? []), finding])
    }
    for (const bar of bars) {
      const inBar = notes[bar] as BarNotes
      const key = `${bar}=${identityOfNotes(inBar)}`
      const mark = marks.get(key) ?? { bar, notes: inBar, count: 0, breach: 0, remark: 0 }
      const tone = toneOf(byBar.get(bar) ?? [])
      mark.count += 1
      if (tone === 'breach') mark.breach += 1
      else if (tone === 'remark') mark.remark += 1
      marks.set(key, mark)
    }
  }
  return {
    findings: [...findings]
      .map(([id, found]) => ({ id, ...found }))
      .sort((a, b) => b.memberIds.length - a.memberIds.length || a.id.localeCompare(b.id)),
    marks: [...marks.values()]
      .map(({ bar, notes, count, breach, remark }) => ({
        bar,
        notes,
        count,
        tone:
          breach * 2 >= count && breach > 0
            ? ('breach' as const)
            : (breach + remark) * 2 >= count && remark > 0
              ? ('remark' as const)
              : ('line' as const),
      }))
      .sort((a, b) => a.bar - b.bar || b.count - a.count),
  }
}

/** Findings of one rule at the same bars are one to the room, whatever notes brought them about. */
const roomFindingId = ({ ruleId, code, bars }: Finding): string => `${ruleId}/${code}/${bars.join(',')}`
