import { lineContent, marksAt } from '@/shared/notation/bar-content'
import { spaceMoments } from '@/shared/notation/bar-moments'
import { uniteBoxes } from '@/shared/notation/box'
import { moveMark } from '@/shared/notation/mark'
import { paintMarks, type Painted } from '@/shared/notation/paint-marks'

const SPACE_PX = 6
const PADDING_PX = 3
/** A place without ledger lines below the middle of the treble staff: every stem goes up. */
const PITCH = 'A4'

export type RhythmPicture = Readonly<{ painted: readonly Painted[]; widthPx: number; heightPx: number }>

/** A rhythm by itself, without a staff: notes at one height, and a tie that leads on where the last is held over. */
export function paintRhythm(
  values: readonly Readonly<{ ticks: number; isRest: boolean }>[],
  isTiedOver: boolean,
): RhythmPicture {
  const notes = values.map(({ ticks, isRest }, i) => {
    const pitch = isRest ? null : PITCH
    return isTiedOver && i === values.length - 1 ? { pitch, ticks, tied: true as const } : { pitch, ticks }
  })
  const bar = {
    number: 1,
    state: 'plain',
    isSetAside: false,
    cantus: null,
    line: notes,
    proposals: [],
    figure: null,
    motion: null,
    label: null,
  } as const
  const setting = { clef: 'treble', spacePx: SPACE_PX } as const
  const context = { signature: 0, setting, isMeasured: true, isHeldInto: false, isTiedOver: false }
  const content = lineContent(bar, context)
  const { leastXs } = spaceMoments([content.columns], [], SPACE_PX)
  const marks = marksAt(content, leastXs, SPACE_PX)
  const box = uniteBoxes(marks.map((mark) => mark.box))
  const moved = marks.map((mark) => moveMark(mark, PADDING_PX - box.left, PADDING_PX - box.top))
  return {
    painted: paintMarks(moved),
    widthPx: Math.ceil(box.right - box.left + 2 * PADDING_PX),
    heightPx: Math.ceil(box.bottom - box.top + 2 * PADDING_PX),
  }
}
