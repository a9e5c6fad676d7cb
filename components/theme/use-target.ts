import { TOUCH_TARGET_PX, WIDE_PX } from './scale'
import { useMedia } from './use-media'

export type Target = Readonly<{
  /** Least height of a control: a finger's where fingers are used, less where a mouse is. */
  heightPx: number
  /** Size of the words on it. */
  kind: 'text' | 'note'
  isForFingers: boolean
}>

const FINGERS: Target = { heightPx: TOUCH_TARGET_PX, kind: 'text', isForFingers: true }
const MOUSE: Target = { heightPx: 36, kind: 'note', isForFingers: false }

/** How large a control must be here: for fingers on phones and tablets, and on any narrow window. */
export const useTarget = (): Target =>
  useMedia(`(pointer: coarse), (max-width: ${WIDE_PX - 1}px)`) ? FINGERS : MOUSE
