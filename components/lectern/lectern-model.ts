import type { Judge } from '@/components/lesson/judge'
import type { LessonView } from '@/components/lesson/lesson-view'
import { countFindings, markRoom, rankRoom, type RoomGroup } from '@/components/lesson/room'
import { roomScoreOf } from '@/components/lesson/score-of'
import { groupProposals, type ChorusState } from '@/shared/board'
import type { Finding } from '@/shared/rules'
import type { ScoreInput } from '@/shared/notation/score-input'
import type { PresentMember } from '@/shared/wire/rooms'

/** Rows that are drawn; in a room of hundreds the rest are counted. */
export const MOST_GROUPS = 40

export type LecternReading = Readonly<{
  score: ScoreInput
  /** The bars whose proposals are listed: the selection, or else all that is released. */
  bars: readonly number[]
  groups: readonly RoomGroup[]
  /** Members who filled every bar of the span, and those who have only begun. */
  finished: number
  unfinished: number
  distinct: number
}>

const isLaw = ({ level }: Finding): boolean => level === 'law'

/** What the lectern shows of the room. The teacher sees everything, whatever wall and phones are shown. */
export function readLectern(
  view: LessonView,
  chorus: ChorusState,
  judge: Judge,
  selected: readonly number[],
): LecternReading {
  const room = rankRoom(groupProposals(chorus, view.released, view.bars), judge)
  const bars = selected.length > 0 ? selected : view.released
  const isAll =
    bars.length === view.released.length && bars.every((bar, index) => bar === view.released[index])
  const groups = isAll ? room : rankRoom(groupProposals(chorus, bars, view.bars), judge)
  const whole = groups.filter(({ isComplete }) => isComplete)
  const sum = (some: readonly RoomGroup[]): number => some.reduce((total, { count }) => total + count, 0)
  return {
    // Matters of taste would bury the score under arcs: they are in the rows and the margin.
    score: roomScoreOf(view, markRoom(room), judge.ofLine(), {
      ofRoom: countFindings(room).flatMap(({ findings }) => findings.filter(isLaw)),
      ofLine: judge.ofLine().filter(isLaw),
    }),
    bars,
    groups,
    finished: sum(whole),
    unfinished: sum(groups) - sum(whole),
    distinct: whole.length,
  }
}

/** What may be done with some bars as they stand. */
export type BarActs = Readonly<{
  canRelease: boolean
  canFreeze: boolean
  canSetAside: boolean
  canTakeUp: boolean
  canTakeBack: boolean
  canClear: boolean
}>

/** A lesson that has ended is only looked at. */
export const NO_ACTS: BarActs = {
  canRelease: false,
  canFreeze: false,
  canSetAside: false,
  canTakeUp: false,
  canTakeBack: false,
  canClear: false,
}

export function actsFor(view: LessonView, chorus: ChorusState, bars: readonly number[]): BarActs {
  const states = bars.flatMap((bar) => view.bars[bar] ?? [])
  const aside = states.filter(({ setAside }) => setAside).length
  return {
    canRelease: states.some(({ state, setAside }) => state === 'frozen' && !setAside),
    canFreeze: states.some(({ state }) => state === 'released'),
    // A score of fewer than three bars is no exercise any more.
    canSetAside: aside < states.length && view.barCount - view.setAside.size - (states.length - aside) >= 3,
    canTakeUp: aside > 0,
    canTakeBack: bars.some((bar) => view.line[bar] !== undefined),
    canClear: bars.some((bar) => {
      const round = view.bars[bar]?.round
      return Object.values(chorus[bar] ?? {}).some((proposal) => proposal.round === round)
    }),
  }
}

/** The class with raised hands first, then by name; whoever is away comes last. */
export const sortPeople = (people: readonly PresentMember[]): readonly PresentMember[] =>
  [...people].sort(
    (a, b) =>
      Number(b.hand) - Number(a.hand) ||
      Number(b.isOnline) - Number(a.isOnline) ||
      a.name.localeCompare(b.name) ||
      (a.memberId < b.memberId ? -1 : 1),
  )
