import { useCallback, useEffect, useMemo, useRef, useState } from 'react'
import {
  eraseInDraft,
  isComplete,
  notesOfDraft,
  withRhythm,
  writeInDraft,
  type BarDraft,
  type RhythmChoice,
} from '@/components/ladder/bar-draft'
import { ladderPitches, rungOfLetter } from '@/components/ladder/rungs'
import { nextReadBar } from '@/components/lesson/desk-bars'
import { identityOfLine, lineWithout } from '@/components/lesson/line-with'
import type { LessonView } from '@/components/lesson/lesson-view'
import { deskScoreOf } from '@/components/lesson/score-of'
import { firstPitch } from '@/components/lesson/spoken'
import { useLessonView } from '@/components/lesson/use-lesson-view'
import { useWords } from '@/components/words'
import type { BoardState, SheetState } from '@/shared/board'
import type { BarNotes, Line } from '@/shared/theory/note'
import {
  comparePitches,
  formatPitch,
  parsePitch,
  pitchOf,
  type Pitch,
  type PitchName,
} from '@/shared/theory/pitch'
import { barInHand, readDesk } from './desk-model'
import { useBarDrafts } from './use-bar-drafts'
import { placeOnLadder, readRungs, wholeNote, type Naming } from './ladder-model'

/** How the desk writes on the student's own sheet. */
export type SheetPen = Readonly<{
  write: (bar: number, notes: BarNotes, round: number) => void
  erase: (bar: number) => void
}>

const NO_FINDINGS = [] as const

/** All that a desk shows and does, each part made anew only when what it is made of changes. */
export function useDesk(board: BoardState, sheet: SheetState, pen: SheetPen) {
  const words = useWords()
  const { view, judge } = useLessonView(board)
  const [chosen, setChosen] = useState<number | null>(null)
  const [naming, setNaming] = useState<Naming>('letters')
  const [isChromatic, setChromatic] = useState(false)

  const { unfinished, draftAt, keep } = useBarDrafts(view)
  const desk = useMemo(() => readDesk(view, sheet, judge, unfinished), [view, sheet, judge, unfinished])
  const hand = barInHand(desk.bars, chosen)
  const bar = desk.bars[hand - 1]

  // When the teacher opens other bars, a desk that holds a closed one takes up the work.
  const releasedKey = view.released.join(',')
  const latest = useRef(desk)
  latest.current = desk
  useEffect(() => {
    setChosen((before) =>
      before !== null && releasedKey !== '' && latest.current.bars[before - 1]?.kind !== 'open'
        ? null
        : before,
    )
  }, [releasedKey])

  const score = useMemo(
    () => deskScoreOf(view, desk.own, desk.findings ?? NO_FINDINGS, hand),
    [view, desk, hand],
  )

  // From the second species on a bar is written note by note.
  const isMeasured = view.exercise.species > 1
  const isOpen = bar?.kind === 'open'
  const draft = useMemo(
    () => (isMeasured && isOpen ? draftAt(hand, bar, desk.own) : null),
    [isMeasured, isOpen, draftAt, hand, bar, desk.own],
  )
  const inHand = useMemo(() => draft && pitchesInHand(draft), [draft])
  const written = inHand ? inHand.written : firstPitch(desk.own[hand])
  const pitches = useMemo(() => {
    const ladder = ladderPitches(view.exercise, isChromatic)
    // A note written on the staff, or with accidentals, keeps its rung.
    const isMissing = written && !ladder.some((pitch) => comparePitches(pitch, written) === 0)
    return isMissing ? [...ladder, written].sort((a, b) => comparePitches(b, a)) : ladder
  }, [view.exercise, isChromatic, written])
  const { isTold, elsewhere } = useSteady(view, desk.own, hand)
  const rungs = useMemo(
    () =>
      isOpen
        ? readRungs(
            { view, elsewhere, bar: hand, pitches, judge, naming, isTold, inHand: inHand ?? undefined },
            words,
          )
        : null,
    [isOpen, view, elsewhere, hand, pitches, judge, naming, isTold, inHand, words],
  )
  const places = useMemo(
    () => placeOnLadder(view, desk.own, hand, pitches, inHand ?? undefined),
    [view, desk.own, hand, pitches, inHand],
  )
  const ladder = useMemo(() => rungs && { rungs, ...places }, [rungs, places])

  /** A bar goes to the sheet when it is whole, and comes off it when it no longer is. */
  const putDraft = useCallback(
    (at: number, next: BarDraft) => {
      const state = view.bars[at]
      if (!state) return
      keep(at, next)
      if (isComplete(next)) pen.write(at, notesOfDraft(next), state.round)
      else if (sheet.notes[at]) pen.erase(at)
    },
    [view, keep, pen, sheet],
  )
  const propose = useCallback(
    (at: number, name: PitchName) => {
      const pitch = parsePitch(name)
      const state = view.bars[at]
      if (!pitch.ok || !state) return
      if (isMeasured) putDraft(at, writeInDraft(draftAt(at, desk.bars[at - 1], desk.own), name))
      else pen.write(at, wholeNote(pitch.value), state.round)
    },
    [view, isMeasured, putDraft, draftAt, desk, pen],
  )
  const proposeRung = useCallback(
    (index: number) => {
      const pitch = pitches[index]
      if (!pitch) return
      // A bar that was written in stays in hand when it freezes, or the desk would leave it for the first bar.
      setChosen(hand)
      propose(hand, formatPitch(pitch))
    },
    [pitches, hand, propose],
  )
  const offerAgain = useCallback(
    (at: number, notes: BarNotes) => {
      const state = view.bars[at]
      if (state) pen.write(at, notes, state.round)
    },
    [view, pen],
  )
  const erase = useCallback(() => {
    if (draft) putDraft(hand, eraseInDraft(draft))
    else pen.erase(hand)
  }, [draft, putDraft, pen, hand])
  const chooseRhythm = useCallback(
    (rhythm: RhythmChoice) => {
      if (draft) putDraft(hand, withRhythm(draft, rhythm))
    },
    [draft, putDraft, hand],
  )
  const choosePlace = useCallback(
    (place: number) => {
      if (draft) keep(hand, { ...draft, place })
    },
    [draft, keep, hand],
  )
  const step = useCallback(
    (by: 1 | -1) => {
      const next = nextReadBar(latest.current.bars, hand, by)
      if (next !== null) setChosen(next)
    },
    [hand],
  )
  const letterRung = useCallback(
    (letter: string, from: number) => rungOfLetter(pitches, letter, from),
    [pitches],
  )

  return {
    view,
    judge,
    desk,
    score,
    hand,
    bar,
    take: setChosen,
    step,
    before: nextReadBar(desk.bars, hand, -1),
    after: nextReadBar(desk.bars, hand, 1),
    pitches,
    ladder,
    draft,
    chooseRhythm,
    choosePlace,
    letterRung,
    propose,
    proposeRung,
    offerAgain,
    erase,
    naming,
    setNaming,
    isChromatic,
    setChromatic,
  }
}

/** The value in hand as the ladder sees it: what stands there, what stands before it in the bar, and the bar with another pitch. */
function pitchesInHand(draft: BarDraft) {
  const named = (name: PitchName | null | undefined): Pitch | null => (name ? pitchOf(name) : null)
  return {
    written: named(draft.pitches[draft.place]),
    before: named(draft.pitches.slice(0, draft.place).findLast((pitch) => pitch !== null)),
    notesWith: (pitch: Pitch): BarNotes => notesOfDraft(writeInDraft(draft, formatPitch(pitch))),
  }
}

/** The notes in the other bars, the same object until one of them changes: a tap in this bar asks nothing anew. */
function useSteady(
  view: LessonView,
  own: Line,
  hand: number,
): Readonly<{ isTold: boolean; elsewhere: Line }> {
  const others = lineWithout(own, [hand])
  const identity = identityOfLine(others)
  // eslint-disable-next-line react-hooks/exhaustive-deps -- equal texts are equal notes
  const elsewhere = useMemo(() => others, [identity, hand])
  return { isTold: view.stage.showsFindings, elsewhere }
}

export type DeskModel = ReturnType<typeof useDesk>
