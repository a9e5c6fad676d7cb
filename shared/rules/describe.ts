import { findRule } from '@/shared/rules/registry'
import type { Finding } from '@/shared/rules/rule'
import { numberWord } from '@/shared/rules/number-word'
import { parsePitch, parsePitchClass, type Alteration, type PitchClass } from '@/shared/theory/pitch'

/** A finding in plain words of the trade. */
export type Description = Readonly<{
  /** `Bars 6–7`. */
  heading: string
  /** `Both voices rise into a fifth.` */
  sentence: string
  /** `Come to it from above, or let one voice stay.` Empty for a rule nobody knows any more. */
  mend: string
  /** All of it for a screen reader: bars and accidentals in words. */
  spoken: string
}>

const SIGNS: Readonly<Record<Alteration, string>> = { [-2]: '♭♭', [-1]: '♭', 0: '', 1: '♯', 2: '♯♯' }
const SIGN_WORDS: Readonly<Record<Alteration, string>> = {
  [-2]: ' double flat',
  [-1]: ' flat',
  0: '',
  1: ' sharp',
  2: ' double sharp',
}

/** Placeholders for the ends of a compass, where the octave matters; elsewhere the note's name alone is read. */
const WITH_OCTAVE: ReadonlySet<string> = new Set(['low', 'high'])

/** Puts a finding into words: its rule's sentence for its code, filled with its values. */
export function describeFinding(finding: Finding): Description {
  const explain = findRule(finding.ruleId)?.explain
  const heading = nameBars(finding.bars, '–', 'and')
  if (!explain) {
    const sentence = `The rule ${finding.ruleId} has something to say here.`
    return { heading, sentence, mend: '', spoken: `${heading}. ${sentence}` }
  }
  const message = explain.messages[finding.code] ?? `${explain.title}.`
  const mend = explain.messages[`${finding.code}.mend`] ?? explain.mends
  const spokenParts = [
    nameBars(finding.bars, ' to ', 'and'),
    finding.level === 'law' ? 'Law' : 'Remark',
    `${fillIn(message, finding.args, SIGN_WORDS)} ${fillIn(mend, finding.args, SIGN_WORDS)}`,
  ]
  return {
    heading,
    sentence: fillIn(message, finding.args, SIGNS),
    mend: fillIn(mend, finding.args, SIGNS),
    spoken: spokenParts.join('. '),
  }
}

/** Stands behind the name of a note while a sentence is put together, so that the note A is not taken for an article. */
const NAME_END = '\u2060'

/** Fills a sentence's placeholders, numbers as words, and sets its articles and its first letter right. */
function fillIn(
  sentence: string,
  args: Finding['args'],
  signs: Readonly<Record<Alteration, string>>,
): string {
  const filled = sentence.replace(/\{(\w+)\}/g, (placeholder, name: string) => {
    const value = args[name]
    if (value === undefined) return placeholder
    if (typeof value === 'number') return numberWord(value)
    return spellPitch(value, signs, WITH_OCTAVE.has(name))
  })
  const withArticles = filled.replace(/\b([Aa])n? (?=([a-z]+))/g, (_, article: string, word: string) =>
    /^[aeiou]/.test(word) && !word.startsWith('uni') ? `${article}n ` : `${article} `,
  )
  const printed = withArticles.replaceAll(NAME_END, '')
  return printed.charAt(0).toUpperCase() + printed.slice(1)
}

/** Prints `C#5` as C♯, or in words; leaves every other text as it is. */
function spellPitch(text: string, signs: Readonly<Record<Alteration, string>>, keepsOctave: boolean): string {
  const withOctave = parsePitch(text)
  const parsed = withOctave.ok ? withOctave : parsePitchClass(text)
  if (!parsed.ok) return text
  const { letter, alteration }: PitchClass = parsed.value
  const octave = keepsOctave && withOctave.ok ? String(withOctave.value.octave) : ''
  return letter + signs[alteration] + octave + NAME_END
}

/** `Bar 6`, `Bars 6–7`, `Bars 2–4, 7 and 9`. */
function nameBars(bars: readonly number[], dash: string, and: string): string {
  if (bars.length === 0) return 'The whole line'
  const runs: [from: number, to: number][] = []
  for (const bar of bars) {
    const run = runs.at(-1)
    if (run && run[1] === bar - 1) run[1] = bar
    else runs.push([bar, bar])
  }
  const names = runs.map(([from, to]) => (from === to ? String(from) : `${from}${dash}${to}`))
  const list = names.length === 1 ? names[0] : `${names.slice(0, -1).join(', ')} ${and} ${names.at(-1)}`
  return `${bars.length === 1 ? 'Bar' : 'Bars'} ${list}`
}
