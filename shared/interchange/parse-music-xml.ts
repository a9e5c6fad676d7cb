import { cantusOf } from '@/shared/interchange/line-text'
import { quote, type ReadingProblem } from '@/shared/interchange/reading-problem'
import { childNamed, childrenNamed, parseXml, textOf, type XmlElement } from '@/shared/interchange/xml'
import { fail, ok, type Result } from '@/shared/result'
import { QUARTER_TICKS, WHOLE_TICKS } from '@/shared/theory/duration'
import { MODES, type Mode } from '@/shared/theory/mode'
import type { Line, Note } from '@/shared/theory/note'
import { comparePitches, parsePitch, pitchOf, type Pitch } from '@/shared/theory/pitch'

/** Most bars of a file; more is refused before an exercise is made of it. */
const MAX_MEASURES = 200
const SIGNS: Readonly<Record<string, string>> = { '-2': 'bb', '-1': 'b', '0': '', '1': '#', '2': '##' }
const NUMBER = /^-?\d{1,6}(?:\.\d{1,6})?$/

/** What a file holds: a cantus, and a line over or under it where it has two parts. */
export type MusicXmlScore = Readonly<{
  cantus: readonly Pitch[]
  line: Line | null
  position: 'above' | 'below'
  /** The mode it names, where it names one of the six. */
  mode: Mode | null
}>

type Part = Readonly<{ name: string; bars: readonly (readonly Note[])[]; mode: Mode | null }>

const problem = (code: ReadingProblem['code'], message: string) => fail({ code, message })

/**
 * Reads a MusicXML score, partwise, of one or two parts. The cantus is the part that says so by its name, else the one
 * with one note a bar, else the lower.
 */
export function parseMusicXml(text: string): Result<MusicXmlScore, ReadingProblem> {
  const parsed = parseXml(text)
  if (!parsed.ok) return parsed
  const root = parsed.value
  if (root.name === 'score-timewise') {
    return problem('not-supported', 'The score is written timewise; export it partwise.')
  }
  if (root.name !== 'score-partwise') {
    return problem('not-music', `The file is no MusicXML score; it begins with ${quote(root.name)}.`)
  }
  const elements = childrenNamed(root, 'part')
  if (elements.length < 1 || elements.length > 2) {
    return problem('not-supported', `A score of one or two parts is read; this one has ${elements.length}.`)
  }
  const parts: Part[] = []
  for (const [index, element] of elements.entries()) {
    const part = readPart(element, nameOf(root, element), index + 1)
    if (!part.ok) return part
    parts.push(part.value)
  }
  return scoreOf(parts)
}

function scoreOf(parts: readonly Part[]): Result<MusicXmlScore, ReadingProblem> {
  const [upper, lower] = parts as [Part, Part | undefined]
  const cantusPart = lower === undefined ? upper : chooseCantus(upper, lower)
  const linePart = parts.find((part) => part !== cantusPart)
  const notes: Note[] = []
  for (const [index, bar] of cantusPart.bars.entries()) {
    const [note, ...more] = bar
    if (!note || more.length > 0) {
      return problem('not-one-note-a-bar', `Bar ${index + 1} of the cantus has not one note.`)
    }
    notes.push(note)
  }
  if (notes.length === 0) return problem('empty', 'The cantus has no notes.')
  const cantus = cantusOf(notes)
  if (!cantus.ok) return cantus
  if (linePart && linePart.bars.length > cantus.value.length) {
    return problem(
      'too-long',
      `The line has ${linePart.bars.length} bars and its cantus ${cantus.value.length}.`,
    )
  }
  const line = linePart
    ? Object.fromEntries(
        linePart.bars.flatMap((bar, index) => (bar.length > 0 ? [[index + 1, bar] as const] : [])),
      )
    : null
  return ok({
    cantus: cantus.value,
    line,
    position: line === null ? 'above' : positionOf(cantus.value, line, linePart === upper),
    mode: cantusPart.mode ?? linePart?.mode ?? null,
  })
}

const hasOneNoteABar = ({ bars }: Part): boolean =>
  bars.every((bar) => bar.length === 1 && bar[0]?.pitch !== null)

function chooseCantus(upper: Part, lower: Part): Part {
  const named = [upper, lower].find(({ name }) => /cantus|c\.\s*f\./i.test(name))
  if (named) return named
  return hasOneNoteABar(lower) || !hasOneNoteABar(upper) ? lower : upper
}

/** By the notes themselves; where the voices cross as often one way as the other, by the order of the parts. */
function positionOf(cantus: readonly Pitch[], line: Line, isUpper: boolean): 'above' | 'below' {
  let balance = 0
  for (const [bar, notes] of Object.entries(line)) {
    const under = cantus[Number(bar) - 1]
    for (const { pitch } of notes) {
      if (pitch !== null && under) balance += Math.sign(comparePitches(pitchOf(pitch), under))
    }
  }
  return balance > 0 || (balance === 0 && isUpper) ? 'above' : 'below'
}

function nameOf(root: XmlElement, part: XmlElement): string {
  const list = childNamed(root, 'part-list')
  const entry = list?.children.find(({ attributes }) => attributes['id'] === part.attributes['id'])
  return (entry && textOf(entry, 'part-name')) ?? ''
}

function readPart(part: XmlElement, name: string, number: number): Result<Part, ReadingProblem> {
  const measures = childrenNamed(part, 'measure')
  if (measures.length > MAX_MEASURES) {
    return problem('too-long', `Part ${number} has more than ${MAX_MEASURES} bars.`)
  }
  let divisions = 1
  let mode: Mode | null = null
  const bars: (readonly Note[])[] = []
  for (const [index, measure] of measures.entries()) {
    const bar = index + 1
    const notes: Note[] = []
    let filled = 0
    for (const element of measure.children) {
      if (element.name === 'attributes') {
        divisions = readNumber(textOf(element, 'divisions')) ?? divisions
        const key = childNamed(element, 'key')
        mode = (key && readMode(textOf(key, 'mode'))) ?? mode
      }
      if (element.name === 'backup') {
        return problem(
          'not-supported',
          `Part ${number} has several voices in bar ${bar}; give each its own part.`,
        )
      }
      // A gap: from here on the bar is unwritten.
      if (element.name === 'forward') break
      if (element.name !== 'note' || childNamed(element, 'grace')) continue
      const note = readNote(element, divisions, `in bar ${bar} of part ${number}`)
      if (!note.ok) return note
      filled += note.value.ticks
      if (filled > WHOLE_TICKS) {
        return problem('bar-overfull', `Bar ${bar} of part ${number} holds more than four quarters.`)
      }
      notes.push(note.value)
    }
    bars.push(notes)
  }
  return ok({ name, bars, mode })
}

function readNote(element: XmlElement, divisions: number, where: string): Result<Note, ReadingProblem> {
  if (childNamed(element, 'chord')) return problem('not-supported', `There is a chord ${where}.`)
  const duration = readNumber(textOf(element, 'duration'))
  const ticks = duration === null ? NaN : (duration / divisions) * QUARTER_TICKS
  if (!Number.isInteger(ticks) || ticks <= 0) {
    return problem('off-the-grid', `A note ${where} has a length that is off the grid.`)
  }
  if (childNamed(element, 'rest')) return ok({ pitch: null, ticks })
  const pitch = childNamed(element, 'pitch')
  const name = pitch && pitchNameOf(pitch)
  if (!name) return problem('not-a-note', `A note ${where} has no pitch that can be written.`)
  const isTied = childrenNamed(element, 'tie').some(({ attributes }) => attributes['type'] === 'start')
  return ok(isTied ? { pitch: name, ticks, tied: true } : { pitch: name, ticks })
}

function pitchNameOf(pitch: XmlElement): string | null {
  const alter = readNumber(textOf(pitch, 'alter') ?? '0')
  const sign = alter === null ? undefined : SIGNS[String(alter)]
  const name = `${textOf(pitch, 'step') ?? ''}${sign ?? '?'}${textOf(pitch, 'octave') ?? ''}`
  return parsePitch(name).ok ? name : null
}

const readNumber = (text: string | null): number | null =>
  text !== null && NUMBER.test(text) ? Number(text) : null

function readMode(text: string | null): Mode | null {
  if (text === 'major') return 'ionian'
  if (text === 'minor') return 'aeolian'
  return MODES.find((mode) => mode === text) ?? null
}
