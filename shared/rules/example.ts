import { readMoments, readTrio, readVoice } from '@/shared/rules/reading'
import type { AnyRule, Breach, Example, Exercise, Moment } from '@/shared/rules/rule'
import { QUARTER_TICKS, WHOLE_TICKS } from '@/shared/theory/duration'
import type { BarNotes, Line, Note } from '@/shared/theory/note'
import { parsePitch, pitchClassOf, type Pitch } from '@/shared/theory/pitch'

const NOTE_GRAMMAR = /^(r|[A-G](?:##|#|bb|b)?[0-8])(?::([1-4]|[0-3]\.5))?(~)?$/

/** An example made ready to be drawn, played or judged. `cantus` has one pitch a bar; an unwritten bar repeats none. */
export type ReadExample = Readonly<{
  exercise: Exercise
  cantusLine: Line
  line: Line
  second: Line
  barCount: number
}>

/** Reads an example's tiny score. Throws on a fault in it: examples are our own data and under test. */
export function readExample(example: Example): ReadExample {
  const cantusLine = readLine(example.cantus)
  const barCount = example.cantus.trim().split(/\s+/).length
  const cantus = Object.values(cantusLine).flatMap(firstPitch)
  return {
    exercise: {
      cantus,
      mode: example.mode,
      final: pitchClassOf(example.final),
      species: example.species ?? 1,
      position: example.position ?? 'above',
    },
    cantusLine,
    line: example.line === undefined ? {} : readLine(example.line),
    second: example.second === undefined ? {} : readLine(example.second),
    barCount,
  }
}

/** All that one rule has to say of an example, with the parameters the example asks for. */
export function judgeExample(rule: AnyRule, example: Example): readonly Breach[] {
  const { exercise, cantusLine, line, second, barCount } = readExample(example)
  if (rule.scope === 'trio') {
    return runRule(rule, exercise, readTrio(exercise, [line, second]), example.params ?? {}, 'line')
  }
  const judgesCantus = rule.scope === 'cantus' || (rule.scope === 'melody' && example.line === undefined)
  const moments = judgesCantus
    ? readVoice(barCount, cantusLine)
    : rule.scope === 'pair'
      ? readMoments(exercise, line)
      : readVoice(barCount, line)
  return runRule(rule, exercise, moments, example.params ?? {}, judgesCantus ? 'cantus' : 'line')
}

/** Runs one rule alone over a reading. */
export function runRule(
  rule: AnyRule,
  exercise: Exercise,
  moments: readonly Moment[],
  givenParams: unknown,
  voice: 'cantus' | 'line',
): readonly Breach[] {
  const params: unknown = rule.params.parse(givenParams)
  const breaches: Breach[] = []
  let state: unknown = rule.start(exercise, params, voice)
  for (const moment of moments) {
    const next = rule.step(state, moment, params)
    state = next.state
    if (next.breach) breaches.push(next.breach)
  }
  const isComplete = moments.every(({ note }) => note !== null)
  const last = rule.finish(state, params, isComplete)
  if (last) breaches.push(last)
  return breaches
}

function readLine(text: string): Line {
  const line: Record<number, BarNotes> = {}
  for (const [index, bar] of text.trim().split(/\s+/).entries()) {
    if (bar !== '.') line[index + 1] = bar.split(',').map(readNote)
  }
  return line
}

function readNote(text: string): Note {
  const match = NOTE_GRAMMAR.exec(text)
  if (!match) throw new RangeError(`Not a note of an example: ${JSON.stringify(text)}`)
  const [, name, quarters, tie] = match
  const note: Note = {
    pitch: name === 'r' ? null : (name as string),
    ticks: quarters === undefined ? WHOLE_TICKS : Number(quarters) * QUARTER_TICKS,
  }
  return tie === undefined ? note : { ...note, tied: true }
}

function firstPitch(notes: BarNotes): readonly Pitch[] {
  const parsed = parsePitch(notes[0]?.pitch ?? '')
  return parsed.ok ? [parsed.value] : []
}
