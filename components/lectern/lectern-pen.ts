import type * as Y from 'yjs'
import {
  adoptBars,
  clearRoom,
  freezeBars,
  releaseBars,
  setBarsAside,
  takeBackBars,
  takeBarsUp,
  updateStage,
  type BoardState,
} from '@/shared/board'
import type { BarNotes, Line } from '@/shared/theory/note'
import type { BarAct } from './bar-acts'
import type { LecternPen } from './lectern'

const ACTS: Readonly<Record<BarAct, (doc: Y.Doc, bars: readonly number[]) => void>> = {
  release: releaseBars,
  freeze: freezeBars,
  'set-aside': setBarsAside,
  'take-up': takeBarsUp,
  'take-back': takeBackBars,
  clear: clearRoom,
}

/** The lectern's acts on a board's document. */
export const createLecternPen = (doc: Y.Doc): LecternPen => ({
  act: (kind, bars) => ACTS[kind](doc, bars),
  adopt: (notes) => adoptBars(doc, notes),
  undoAdopt: (notes, before) => undoAdopt(doc, notes, before),
  stage: (patch) => updateStage(doc, patch),
})

/** Puts the bars of an adoption back as they stood: what was in the line before, and open where they were open. */
function undoAdopt(doc: Y.Doc, notes: Line, before: BoardState): void {
  const bars = Object.keys(notes).map(Number)
  const former: Record<number, BarNotes> = {}
  for (const bar of bars) {
    const stood = before.line[bar]
    if (stood) former[bar] = stood
  }
  doc.transact(() => {
    takeBackBars(
      doc,
      bars.filter((bar) => !former[bar]),
    )
    adoptBars(doc, former)
    releaseBars(
      doc,
      bars.filter((bar) => before.bars[bar]?.state === 'released'),
    )
  })
}
