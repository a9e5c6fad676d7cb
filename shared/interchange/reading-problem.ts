/** Why a text or a file could not be read, in one sentence, with where in it the fault lies when that can be said. */
export type ReadingProblem = Readonly<{
  code:
    | 'empty'
    | 'too-long'
    | 'not-a-note'
    | 'off-the-grid'
    | 'bar-overfull'
    | 'bar-not-full'
    | 'rest-in-cantus'
    | 'not-one-note-a-bar'
    | 'no-such-tie'
    | 'not-music'
    | 'not-supported'
  message: string
}>

/** A text from outside as it may be quoted in a sentence: short, on one line, with nothing invisible in it. */
export function quote(text: string): string {
  const visible = text.replace(/[^\p{L}\p{N}\p{P}\p{S} ]/gu, '·')
  return `“${visible.length > 24 ? `${visible.slice(0, 24)}…` : visible}”`
}
