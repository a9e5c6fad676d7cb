import type { Citation } from '@/shared/rules/rule'

/**
 * Citations from their short form: the source's key, its place after a blank, `°` after the key where the statement
 * is known from memory. `cite('FUXE r1', 'JEPP°')`.
 */
export const cite = (...texts: readonly string[]): readonly Citation[] => texts.map(readCitation)

function readCitation(text: string): Citation {
  const [key, ...rest] = text.split(' ') as [string, ...string[]]
  const place = rest.join(' ')
  return {
    source: key.replace(/°$/, ''),
    ...(place === '' ? {} : { place }),
    ...(key.endsWith('°') ? { fromMemory: true as const } : {}),
  }
}
