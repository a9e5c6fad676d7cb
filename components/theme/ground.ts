/** Which ground the reader chose: the system's, or one of the two whatever the system says. */
export const GROUNDS = ['system', 'light', 'dark'] as const
export type Ground = (typeof GROUNDS)[number]

/** Also read by `public/theme.js` before the app is loaded. */
const KEY = 'bicinium.ground'

export function readGround(): Ground {
  try {
    const stored = localStorage.getItem(KEY)
    return stored === 'light' || stored === 'dark' ? stored : 'system'
  } catch {
    return 'system'
  }
}

/** Stores the choice and tells the page's own stylesheet. Storage that refuses costs only the memory of the choice. */
export function writeGround(ground: Ground): void {
  if (ground === 'system') delete document.documentElement.dataset.ground
  else document.documentElement.dataset.ground = ground
  try {
    if (ground === 'system') localStorage.removeItem(KEY)
    else localStorage.setItem(KEY, ground)
  } catch {
    // Private windows may refuse; the choice holds until the page is closed.
  }
}
