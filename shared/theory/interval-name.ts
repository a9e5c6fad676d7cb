import { fail, ok, type Result } from '@/shared/result'
import { qualityOf, type Interval, type Quality } from '@/shared/theory/interval'

const NATURAL_SEMITONES = [0, 2, 4, 5, 7, 9, 11] as const
const SHORT_GRAMMAR = /^(P|M|m|A{1,4}|d{1,4})([1-9][0-9]?)$/

/** Sizes in words; beyond the fifteenth nobody counts in words. */
const SIZE_WORDS = [
  'unison',
  'second',
  'third',
  'fourth',
  'fifth',
  'sixth',
  'seventh',
  'octave',
  'ninth',
  'tenth',
  'eleventh',
  'twelfth',
  'thirteenth',
  'fourteenth',
  'fifteenth',
] as const

const FOLD_WORDS = ['', '', 'doubly ', 'triply ', 'quadruply '] as const
const QUALITY_WORDS: Readonly<Record<string, string>> = {
  P: 'perfect',
  M: 'major',
  m: 'minor',
  A: 'augmented',
  d: 'diminished',
}

/** Writes an interval in the trade's short form: `m3`, `P5`, `A4`, `M10`. */
export const formatInterval = (interval: Interval): string => `${qualityOf(interval)}${interval.steps + 1}`

/** Reads `m3`. Qualities that the size cannot have (a perfect third) are refused. */
export function parseInterval(text: string): Result<Interval, 'not-an-interval'> {
  const match = SHORT_GRAMMAR.exec(text)
  if (!match) return fail('not-an-interval')
  const quality = match[1] as string
  const steps = Number(match[2]) - 1
  const simple = steps % 7
  const natural = (NATURAL_SEMITONES[simple] as number) + 12 * Math.floor(steps / 7)
  const isPerfectSize = simple === 0 || simple === 3 || simple === 4
  const excess = excessOf(quality, isPerfectSize)
  if (excess === null || (steps === 0 && excess < 0)) return fail('not-an-interval')
  return ok({ steps, semitones: natural + excess })
}

/** The interval a literal in code names. Throws on anything that is none. */
export function intervalOf(text: string): Interval {
  const parsed = parseInterval(text)
  if (!parsed.ok) throw new RangeError(`Not an interval: ${JSON.stringify(text)}`)
  return parsed.value
}

/** An interval in words: `minor third`, `perfect twelfth`, and plain `unison` and `octave` where perfect. */
export function nameInterval(interval: Interval): string {
  const key = 256 * interval.steps + interval.semitones
  const known = knownNames.get(key)
  if (known !== undefined) return known
  const name = buildName(interval)
  knownNames.set(key, name)
  return name
}

/** Names by steps and semitones: a few hundred at most, asked for again and again. */
const knownNames = new Map<number, string>()

function buildName(interval: Interval): string {
  const quality = qualityOf(interval)
  const size = nameSize(interval.steps)
  if (quality === 'P' && (size === 'unison' || size === 'octave')) return size
  return `${nameQuality(quality)} ${size}`
}

/** A size in words, from steps: 2 is `third`. */
export const nameSize = (steps: number): string => SIZE_WORDS[steps] ?? `${ordinal(steps + 1)}`

function nameQuality(quality: Quality): string {
  const fold = FOLD_WORDS[quality.length] ?? `${quality.length}-fold `
  return fold + (QUALITY_WORDS[quality.charAt(0)] as string)
}

function excessOf(quality: string, isPerfectSize: boolean): number | null {
  switch (quality.charAt(0)) {
    case 'P':
      return isPerfectSize ? 0 : null
    case 'M':
      return isPerfectSize ? null : 0
    case 'm':
      return isPerfectSize ? null : -1
    case 'A':
      return quality.length
    default:
      return isPerfectSize ? -quality.length : -quality.length - 1
  }
}

function ordinal(count: number): string {
  const tens = count % 100
  if (tens >= 11 && tens <= 13) return `${count}th`
  return `${count}${['th', 'st', 'nd', 'rd'][count % 10] ?? 'th'}`
}
