import { Txt } from '@/components/ui'

const ADDRESS = /(https?:\/\/[^\s<>"]+)/g

/** A message as it was written, with its addresses made into links that stay on this site. */
export function MessageText({ text }: Readonly<{ text: string }>) {
  return (
    <Txt style={{ whiteSpace: 'pre-wrap' } as never}>
      {text.split(ADDRESS).map((part, place) => {
        if (place % 2 === 0) return part
        return (
          <a key={place} href={part} rel="noreferrer" style={{ color: 'inherit', overflowWrap: 'anywhere' }}>
            {part}
          </a>
        )
      })}
    </Txt>
  )
}
