/** Drawn by the score once it stands. */
export function Bicinium() {
  return null
}
