import { emailSchema } from './fields'

export type ParsedAddresses = Readonly<{
  /** Lower case, each once, in the order they came. */
  addresses: readonly string[]
  /** Pieces in which no address could be found. */
  refused: readonly string[]
}>

/** A quoted name keeps its commas; an address in angle brackets is one piece. */
const PIECE = /"[^"]*"|<[^>]*>|[^\s,;"<>]+|[,;\t]/g
const SEPARATOR = /^[,;\t]$/
const LOOSE_ENDS = /^[('“”‘’[{]+|[)'“”‘’\]}.:]+$/g
const MAX_TOLD_CHARACTERS = 100

const isCandidate = (piece: string) => piece.includes('@')

const cleaned = (piece: string) =>
  piece
    .replace(/^<|>$/g, '')
    .trim()
    .replace(/^mailto:/i, '')
    .replace(LOOSE_ENDS, '')

/** The entries of a line: words that stand together between separators. */
function entriesOf(line: string): readonly (readonly string[])[] {
  const entries: string[][] = [[]]
  for (const piece of line.match(PIECE) ?? []) {
    if (SEPARATOR.test(piece)) entries.push([])
    else entries.at(-1)?.push(piece)
  }
  return entries.filter((entry) => entry.length > 0)
}

/**
 * Whether an entry without an address is a name: a bracketed address follows (`Last, First <…>`), or it stands before the
 * only address of its line, or anywhere beside it in a spreadsheet's columns.
 */
function isName(line: string, entries: readonly (readonly string[])[], index: number): boolean {
  if (entries[index + 1]?.some((piece) => piece.startsWith('<') && isCandidate(piece))) return true
  const withAddress = entries.flatMap((entry, place) => (entry.some(isCandidate) ? [place] : []))
  const [only] = withAddress
  return withAddress.length === 1 && only !== undefined && (index < only || line.includes('\t'))
}

/**
 * Finds e-mail addresses in what people paste: lines, commas, semicolons, tabs, `Name <address>`, `"Last, First" <address>`,
 * `Last, First <address>`, `mailto:` links, names and an address side by side as from a spreadsheet.
 */
export function parseAddresses(pasted: string): ParsedAddresses {
  const addresses = new Set<string>()
  const refused: string[] = []
  const refuse = (text: string) => refused.push(text.slice(0, MAX_TOLD_CHARACTERS))
  for (const line of pasted.split(/[\r\n]+/)) {
    const entries = entriesOf(line)
    entries.forEach((entry, index) => {
      const candidates = entry.filter(isCandidate)
      if (candidates.length === 0 && !isName(line, entries, index)) refuse(entry.join(' '))
      for (const candidate of candidates) {
        const parsed = emailSchema.safeParse(cleaned(candidate))
        if (parsed.success) addresses.add(parsed.data)
        else refuse(candidate)
      }
    })
  }
  return { addresses: [...addresses], refused }
}
