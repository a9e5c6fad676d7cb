import { CODE_LENGTH, CODE_SYLLABLES, type Syllable } from '@/shared/api/lessons'
import { fail, ok, type Result } from '@/shared/result'

/** What has been entered of a lesson's code, in order, at most `CODE_LENGTH` syllables. */
export type CodeEntry = readonly Syllable[]

/** Syllables other schools sing for ours. */
const OTHER_NAMES: Readonly<Record<string, Syllable>> = { ut: 'do', so: 'sol', si: 'ti' }
const SEPARATORS = /[\s,.;:·•◆◇–—-]+/u
const RUN_OF_SYLLABLES = new RegExp(`^(?:${CODE_SYLLABLES.join('|')})+$`)
const EACH_SYLLABLE = new RegExp(CODE_SYLLABLES.join('|'), 'g')

const isSyllable = (text: string): text is Syllable => (CODE_SYLLABLES as readonly string[]).includes(text)

export const isComplete = (entry: CodeEntry): boolean => entry.length === CODE_LENGTH

/** Adds a syllable; a full entry stays as it is. */
export const withSyllable = (entry: CodeEntry, syllable: Syllable): CodeEntry =>
  isComplete(entry) ? entry : [...entry, syllable]

export const withoutLast = (entry: CodeEntry): CodeEntry => entry.slice(0, -1)

/** Writes an entry as addresses and requests carry it: `re-fa-mi-la-sol-do`. */
export const formatCode = (entry: CodeEntry): string => entry.join('-')

export type TypedCodeProblem = Readonly<{ kind: 'not-a-syllable'; text: string } | { kind: 'too-many' }>

/**
 * Reads syllables as people type them: `re fa mi`, `Re-Fa-Mi`, `refami`. `ut`, `so` and `si` are read as `do`, `sol` and
 * `ti` where they stand alone. An empty text is an empty entry.
 */
export function parseTypedCode(text: string): Result<CodeEntry, TypedCodeProblem> {
  const entry: Syllable[] = []
  for (const word of text.toLowerCase().split(SEPARATORS)) {
    if (word === '') continue
    const other = OTHER_NAMES[word]
    if (other) entry.push(other)
    else if (isSyllable(word)) entry.push(word)
    else if (RUN_OF_SYLLABLES.test(word)) entry.push(...((word.match(EACH_SYLLABLE) ?? []) as Syllable[]))
    else return fail({ kind: 'not-a-syllable', text: word })
  }
  return entry.length > CODE_LENGTH ? fail({ kind: 'too-many' }) : ok(entry)
}
