import { memo } from 'react'

/** The score as a list of sentences, for those who hear the page read. Takes no room on the screen. */
export const ScoreText = memo(function ScoreText({
  title,
  sentences,
}: Readonly<{ title: string; sentences: readonly Readonly<{ bar: number; sentence: string }>[] }>) {
  return (
    <ol
      aria-label={title}
      style={{
        position: 'absolute',
        width: 1,
        height: 1,
        margin: 0,
        padding: 0,
        overflow: 'hidden',
        clipPath: 'inset(50%)',
        whiteSpace: 'nowrap',
      }}
    >
      {sentences.map(({ bar, sentence }) => (
        <li key={bar}>{sentence}</li>
      ))}
    </ol>
  )
})
