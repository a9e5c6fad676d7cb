import type { Species } from '@/shared/rules'
import { QUARTER_TICKS, WHOLE_TICKS } from '@/shared/theory/duration'
import type { BarNotes, Note } from '@/shared/theory/note'
import type { PitchName } from '@/shared/theory/pitch'

/** A way to fill a bar that is offered to be written in: notes and rests in order, and whether the last is held over. */
export type RhythmChoice = Readonly<{
  values: readonly Readonly<{ ticks: number; isRest: boolean }>[]
  tieOut: boolean
}>

/** A bar as it is being written: a pitch for each value, null where none is yet, and in rests. */
export type BarDraft = Readonly<{
  rhythm: RhythmChoice
  pitches: readonly (PitchName | null)[]
  /** The value in hand. */
  place: number
}>

const HALF = 2 * QUARTER_TICKS
const Q = QUARTER_TICKS
const E = QUARTER_TICKS / 2

/** Negative lengths are rests. */
const choice = (lengths: readonly number[], tieOut = false): RhythmChoice => ({
  values: lengths.map((ticks) => ({ ticks: Math.abs(ticks), isRest: ticks < 0 })),
  tieOut,
})

const WHOLE = choice([WHOLE_TICKS])
const HALVES = choice([HALF, HALF])
const HALVES_TIED = choice([HALF, HALF], true)
const REST_HALF = choice([-HALF, HALF])
const REST_HALF_TIED = choice([-HALF, HALF], true)
const QUARTERS = choice([Q, Q, Q, Q])
const FLORID: readonly RhythmChoice[] = [
  HALVES,
  HALVES_TIED,
  QUARTERS,
  choice([HALF, Q, Q]),
  choice([Q, Q, HALF]),
  choice([Q, Q, HALF], true),
  choice([HALF, Q, E, E]),
  choice([Q, E, E, HALF]),
  choice([Q, E, E, HALF], true),
  choice([HALF + Q, Q]),
  WHOLE,
]

/** The rhythms offered for a bar, the likeliest first. Any other that is already written there is kept beside them. */
export function rhythmChoices(species: Species, bar: number, barCount: number): readonly RhythmChoice[] {
  if (species === 1 || bar === barCount) return [WHOLE]
  const isFirst = bar === 1
  switch (species) {
    case 2:
      return isFirst ? [REST_HALF, HALVES] : bar === barCount - 1 ? [HALVES, WHOLE] : [HALVES]
    case 3:
      return isFirst ? [QUARTERS, choice([-Q, Q, Q, Q])] : [QUARTERS]
    case 4:
      if (isFirst) return [REST_HALF_TIED, HALVES_TIED, HALVES, REST_HALF]
      return bar === barCount - 1 ? [HALVES, HALVES_TIED] : [HALVES_TIED, HALVES]
    case 5:
      return isFirst ? [REST_HALF_TIED, REST_HALF, choice([-HALF, Q, Q]), ...FLORID] : FLORID
  }
}

export const isSameRhythm = (a: RhythmChoice, b: RhythmChoice): boolean =>
  a.tieOut === b.tieOut &&
  a.values.length === b.values.length &&
  a.values.every(({ ticks, isRest }, i) => ticks === b.values[i]?.ticks && isRest === b.values[i]?.isRest)

const isOpenPlace = ({ rhythm, pitches }: Omit<BarDraft, 'place'>, i: number): boolean =>
  rhythm.values[i]?.isRest === false && pitches[i] === null

/** The first value without a pitch; the last note where there is none. */
function firstOpen(draft: Omit<BarDraft, 'place'>): number {
  const open = draft.pitches.findIndex((_, i) => isOpenPlace(draft, i))
  return open >= 0 ? open : draft.rhythm.values.findLastIndex(({ isRest }) => !isRest)
}

const placed = (draft: Omit<BarDraft, 'place'>): BarDraft => ({ ...draft, place: firstOpen(draft) })

/** An empty bar; a note that is held over from the bar before stands in it already. */
export function startDraft(rhythm: RhythmChoice, held: PitchName | null): BarDraft {
  const pitches = rhythm.values.map(({ isRest }, i) => (i === 0 && !isRest ? held : null))
  return placed({ rhythm, pitches })
}

/** What is written in a bar, taken up again. */
export function draftOf(notes: BarNotes, place: number | null): BarDraft {
  const rhythm = {
    values: notes.map(({ ticks, pitch }) => ({ ticks, isRest: pitch === null })),
    tieOut: notes.at(-1)?.tied === true,
  }
  const draft = { rhythm, pitches: notes.map(({ pitch }) => pitch) }
  const isPlace = place !== null && rhythm.values[place]?.isRest === false
  return isPlace ? { ...draft, place } : placed(draft)
}

/** Another rhythm for the same bar: the pitches stay, in their order. */
export function withRhythm(draft: BarDraft, rhythm: RhythmChoice): BarDraft {
  const kept = draft.pitches.filter((pitch, i) => pitch !== null && !draft.rhythm.values[i]?.isRest)
  let next = 0
  return placed({
    rhythm,
    pitches: rhythm.values.map(({ isRest }) => (isRest ? null : (kept[next++] ?? null))),
  })
}

/** A pitch for the value in hand; the hand goes on to the next. */
export function writeInDraft(draft: BarDraft, pitch: PitchName): BarDraft {
  const pitches = draft.pitches.map((before, i) => (i === draft.place ? pitch : before))
  const next = draft.rhythm.values.findIndex(({ isRest }, i) => i > draft.place && !isRest)
  return { ...draft, pitches, place: next < 0 ? draft.place : next }
}

/** Takes away the pitch in hand, and where there is none the one before it. What comes after it goes too. */
export function eraseInDraft(draft: BarDraft): BarDraft {
  const last = draft.pitches.findLastIndex((pitch, i) => pitch !== null && i <= draft.place)
  if (last < 0) return draft
  return placed({ ...draft, pitches: draft.pitches.map((pitch, i) => (i < last ? pitch : null)) })
}

/** Whether the hand may be put on a value: one that is written, or the first that is not. */
export const isReachable = (draft: BarDraft, place: number): boolean =>
  draft.rhythm.values[place]?.isRest === false && (isComplete(draft) || place <= firstOpen(draft))

export const isComplete = (draft: BarDraft): boolean => !draft.pitches.some((_, i) => isOpenPlace(draft, i))

/** What is written from the start of the bar to the first gap: a bar of its own once it is complete. */
export function notesOfDraft(draft: BarDraft): BarNotes {
  const notes: Note[] = []
  const { values, tieOut } = draft.rhythm
  for (const [i, { ticks }] of values.entries()) {
    if (isOpenPlace(draft, i)) break
    const pitch = draft.pitches[i] ?? null
    const isTied = tieOut && i === values.length - 1 && pitch !== null
    notes.push(isTied ? { pitch, ticks, tied: true } : { pitch, ticks })
  }
  return notes.some(({ pitch }) => pitch !== null) ? notes : []
}
