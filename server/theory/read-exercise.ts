import { readRuleSet, USUAL_RULES } from '@/server/theory/read-rule-set'
import { accept, Refusal } from '@/server/theory/refusal'
import { readChoice, readNumber, type Request } from '@/server/theory/request'
import {
  lastBarOf,
  parseCantusWords,
  parseLineText,
  parseMusicXml,
  type MusicXmlScore,
} from '@/shared/interchange'
import type { Exercise, RuleSet, SetAside, Species } from '@/shared/rules'
import type { Compass } from '@/shared/search'
import { analyseCantus } from '@/shared/theory/analyse-cantus'
import { MODES, type Mode } from '@/shared/theory/mode'
import type { Line } from '@/shared/theory/note'
import { comparePitches, formatPitch, parsePitch, parsePitchClass, type Pitch } from '@/shared/theory/pitch'
import { scaleOf } from '@/shared/theory/scale'
import { MAX_BARS, MIN_BARS } from '@/shared/wire/documents'

/** All that a command about one exercise needs. */
export type Asked = Readonly<{
  exercise: Exercise
  ruleSet: RuleSet
  line: Line
  /** False where no line was given at all. */
  hasLine: boolean
  setAside: SetAside
  compass: Compass | undefined
}>

type ReadFile = (path: string) => string

/** Reads the exercise options of a request. */
export function readAsked({ words, values }: Request, readFile: ReadFile): Asked {
  const compass = readCompass(values)
  const { cantus, line, position, mode: named } = readMelodies(words, values, readFile)
  const { mode, final } = readTonality({ ...values, mode: values.mode ?? named }, cantus)
  const exercise: Exercise = {
    cantus,
    mode,
    final,
    species: readNumber('species', values.species, { least: 1, most: 5, usual: 1 }) as Species,
    position: readChoice('position', values.position, ['above', 'below'], position),
  }
  if (line !== null && lastBarOf(line) > cantus.length) {
    throw new Refusal(`The line has ${lastBarOf(line)} bars and its cantus ${cantus.length}.`)
  }
  return {
    exercise,
    ruleSet: readRuleSet(values.rules ?? USUAL_RULES, compass, readFile),
    line: line ?? {},
    hasLine: line !== null,
    setAside: readAside(values.aside, cantus.length),
    compass,
  }
}

/** The lowest and highest note asked for, or `undefined` where neither is given. */
export function readCompass({ low, high }: Request['values']): Compass | undefined {
  if (low === undefined && high === undefined) return undefined
  if (low === undefined || high === undefined) throw new Refusal('A compass wants both --low and --high.')
  const lowest = readPitch('low', low)
  const highest = readPitch('high', high)
  if (comparePitches(lowest, highest) > 0) throw new Refusal(`--low ${low} lies above --high ${high}.`)
  return { lowest: formatPitch(lowest), highest: formatPitch(highest) }
}

function readPitch(name: string, text: string): Pitch {
  const parsed = parsePitch(text)
  if (!parsed.ok) throw new Refusal(`--${name} wants a pitch like D4, not ${text}.`)
  return parsed.value
}

/** The mode and final asked for; what is not given is taken from the melody, which ends on its final. */
export function readTonality(
  { mode, final }: Request['values'],
  cantus: readonly Pitch[],
): Pick<Exercise, 'mode' | 'final'> {
  const last = cantus.at(-1)
  const parsed = final === undefined ? null : parsePitchClass(final)
  if (parsed && !parsed.ok) throw new Refusal(`--final wants a note like D or F#, not ${final}.`)
  const noteOfFinal = parsed?.value ?? (last && { letter: last.letter, alteration: last.alteration })
  if (!noteOfFinal) throw new Refusal('Give the final with --final.')
  const fitting = analyseCantus(cantus, { mode: 'ionian', final: noteOfFinal })?.modes[0]
  if (mode === undefined && fitting === undefined) {
    throw new Refusal('The melody fits no mode on its final; give one with --mode.')
  }
  const named = readChoice('mode', mode, MODES, fitting ?? 'dorian')
  if (!scaleOf(named, noteOfFinal).ok) throw new Refusal(`Nobody can spell ${named} on ${final}.`)
  return { mode: named, final: noteOfFinal }
}

type Melodies = Readonly<{
  cantus: readonly Pitch[]
  /** `null` where none was given. */
  line: Line | null
  position: Exercise['position']
  mode: Mode | undefined
}>

/** The cantus in words or from a file; a line from the same file, from `--line`, or none. */
function readMelodies(
  words: readonly string[],
  { cantus: option, line: lineOption }: Request['values'],
  readFile: ReadFile,
): Melodies {
  if (option !== undefined && words.length > 0) {
    throw new Refusal('Give the cantus once: after the options, or with --cantus.')
  }
  const text = (option ?? words.join(' ')).trim()
  if (text === '') throw new Refusal('Give a cantus, such as "D4 F4 E4 D4".')
  const file = isScoreFile(text) ? readScore(text, readFile) : null
  const cantus = file?.cantus ?? accept(parseCantusWords(text))
  if (cantus.length < MIN_BARS || cantus.length > MAX_BARS) {
    throw new Refusal(`A cantus has from ${MIN_BARS} to ${MAX_BARS} notes; this one has ${cantus.length}.`)
  }
  const line = lineOption === undefined ? (file?.line ?? null) : accept(parseLineText(lineOption))
  return { cantus, line, position: file?.position ?? 'above', mode: file?.mode ?? undefined }
}

const isScoreFile = (text: string): boolean => /\.(?:musicxml|xml|mxl)$/i.test(text)

function readScore(path: string, readFile: ReadFile): MusicXmlScore {
  if (/\.mxl$/i.test(path)) throw new Refusal(`${path} is compressed; export it as .musicxml.`)
  const score = parseMusicXml(readFile(path))
  if (!score.ok) throw new Refusal(`${path}: ${score.reason.message}`)
  return score.value
}

function readAside(text: string | undefined, barCount: number): SetAside {
  const bars = (text ?? '').split(',').filter((word) => word.trim() !== '')
  const aside = new Set(
    bars.map((word) => readNumber('aside', word.trim(), { least: 1, most: barCount, usual: 0 })),
  )
  if (aside.size > barCount - 2) throw new Refusal('At least two bars have to be read.')
  return aside
}
