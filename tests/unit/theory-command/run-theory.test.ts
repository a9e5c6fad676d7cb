import { spawnSync } from 'node:child_process'
import { mkdtempSync, rmSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import path from 'node:path'
import { Refusal } from '@/server/theory/refusal'
import { runTheory } from '@/server/theory/run-theory'
import { formatMusicXml, parseLineText } from '@/shared/interchange'
import { readExercise } from '@/shared/rules'

const DORIAN = 'D4 F4 E4 D4 G4 F4 A4 G4 F4 E4 D4'
const FUX_5 = 'A4:4 | A4:4 | G4:4 | A4:4 | B4:4 | C5:4 | C5:4 | B4:4 | D5:4 | C#5:4 | D5:4'
const CORE_1 = [
  '--species',
  '1',
  '--rules',
  'core-1',
  '--mode',
  'dorian',
  '--final',
  'D',
  '--position',
  'above',
].concat(['--low', 'D4', '--high', 'D6'])

const files: Readonly<Record<string, string>> = {
  'fux.musicxml': formatMusicXml({
    title: 'Fux, figure 5',
    exercise: readExercise({
      cantus: DORIAN.split(' '),
      mode: 'dorian',
      final: 'D',
      species: 1,
      position: 'above',
    }),
    line: (() => {
      const parsed = parseLineText(FUX_5)
      return parsed.ok ? parsed.value : null
    })(),
    clefs: { cantus: 'alto', line: 'treble' },
  }),
  'mine.json': JSON.stringify({
    version: 1,
    name: 'Mine',
    rules: { 's1-repeat': { level: 'law', params: { maxRepeats: 0 } } },
  }),
  'bad-params.json': JSON.stringify({
    version: 1,
    name: 'Bad',
    rules: { 'dist-max': { level: 'law', params: { max: 'far' } } },
  }),
  'unknown-rule.json': JSON.stringify({ version: 1, name: 'Bad', rules: { 'no-such': { level: 'law' } } }),
  'no-json.json': '{',
  'no-rule-set.json': '{"version":1,"name":"Bad","rules":{"a":{"level":"sometimes"}}}',
  'page.xml': '<html/>',
}
const readFile = (name: string): string => {
  const text = files[name]
  if (text === undefined) throw new Refusal(`${name} could not be read.`)
  return text
}
const run = (...argv: readonly string[]) => runTheory(argv, readFile)
const json = (...argv: readonly string[]) => {
  const { out, error, exitCode } = run(...argv, '--json')
  expect({ error, exitCode }).toEqual({ error: '', exitCode: 0 })
  return JSON.parse(out)
}

test('counts the known ways by core-1, with the alive notes', () => {
  const { count, isExact, alive, deadEnd } = json('count', ...CORE_1, DORIAN)
  expect({ count, isExact, deadEnd }).toEqual({ count: '118', isExact: true, deadEnd: null })
  expect(alive).toHaveLength(11)
  expect(alive[0]).toEqual({ bar: 1, notes: { A4: '30', D5: '53', A5: '35' } })
  expect(alive[9]).toEqual({ bar: 10, notes: { 'C#5': '118' } })
})

test('below, with another compass, 55', () => {
  const below = ['--rules', 'core-1', '--position', 'below', '--low', 'A2', '--high', 'A4']
  expect(json('count', ...below, DORIAN).count).toBe('55')
})

test('second species by core-2, with rests, wholes and beats in the alive notes', () => {
  const core2 = ['--species', '2', '--rules', 'core-2', '--low', 'D4', '--high', 'D6']
  const { count, alive } = json('count', ...core2, DORIAN)
  expect(count).toBe('51164')
  expect(alive[0]).toMatchObject({ bar: 1, beat: 1, notes: { R: '13439' } })
  expect(alive[1]).toMatchObject({ bar: 1, beat: 3 })
  // Bar 10 is a whole note or two halves: what does not begin a second half is a whole.
  const second = alive.find(({ bar, beat }: { bar: number; beat: number }) => bar === 10 && beat === 3)
  const sum = Object.values<string>(second.notes).reduce((total, ways) => total + BigInt(ways), 0n)
  expect(sum).toBe(51164n)
  expect(second.notes['-']).toBeDefined()
})

test('notes may be given as words of their own, and the cantus as an option', () => {
  expect(json('count', ...CORE_1, ...DORIAN.split(' ')).count).toBe('118')
  expect(json('count', ...CORE_1, '--cantus', DORIAN).count).toBe('118')
})

test('checks a line, with the rule, the level and the bars of each finding', () => {
  const { findings } = json('check', '--rules', 'open-undergrad', '--cantus', DORIAN, '--line', FUX_5)
  const laws = findings.filter(({ level }: { level: string }) => level === 'law')
  expect(laws.map(({ rule, bars }: { rule: string; bars: number[] }) => [rule, bars])).toEqual([
    ['s1-repeat', [6, 7]],
    ['mel-single-climax', [9, 11]],
  ])
  expect(findings[0]).toMatchObject({ voice: 'line', heading: 'Bars 6–7' })
})

test('checks the cantus where there is no line', () => {
  const { findings } = json(
    'check',
    '--rules',
    'open-undergrad',
    '--mode',
    'dorian',
    '--final',
    'D',
    'D4 B4 F4 E4 D4',
  )
  expect(findings.map(({ voice }: { voice: string }) => voice)).toContain('cantus')
})

test('bars that are set aside are not read', () => {
  const { findings } = json('check', '--rules', 'mine.json', '--line', FUX_5, DORIAN)
  expect(findings.map(({ bars }: { bars: number[] }) => bars)).toEqual([
    [1, 2],
    [6, 7],
  ])
  const less = json('check', '--rules', 'mine.json', '--aside', '2,7', '--line', FUX_5, DORIAN)
  expect(less.findings).toEqual([])
})

test('finishes what is written, and says where it stops', () => {
  expect(json('count', ...CORE_1, '--line', 'D5', DORIAN).count).toBe('53')
  const stuck = json('count', ...CORE_1, '--line', 'A4 | A3', DORIAN)
  expect(stuck.count).toBe('0')
  expect(stuck.deadEnd).toMatchObject({ bar: 2 })
  expect(run('count', ...CORE_1, '--line', 'A4 | A3', DORIAN).out).toMatch(
    /^0 ways\. No note is left for bar 2, by /,
  )
})

test('solves in the order of notes, all of them', () => {
  const { solutions } = json('solve', ...CORE_1, '--order', 'notes', '--limit', '200', DORIAN)
  const lines = solutions.map(({ line }: { line: string }) => line)
  expect(new Set(lines).size).toBe(118)
})

test('solves best first', () => {
  const { solutions } = json('solve', '--rules', 'open-undergrad', '--limit', '5', DORIAN)
  const costs = solutions.map(({ cost }: { cost: number }) => cost)
  expect(costs).toHaveLength(5)
  expect(costs).toEqual([...costs].sort((a, b) => a - b))
})

test('draws the same from the same seed', () => {
  const draw = (seed: string) => json('draw', ...CORE_1, '--seed', seed, '--times', '3', DORIAN).lines
  expect(draw('4')).toHaveLength(3)
  expect(draw('4')).toEqual(draw('4'))
  expect(draw('4')).not.toEqual(draw('5'))
})

test('generates canti, solutions and fault exercises with their answer keys', () => {
  const { canti } = json(
    'generate',
    'cantus',
    '--mode',
    'phrygian',
    '--final',
    'E',
    '--length',
    '9',
    '--times',
    '2',
  )
  expect(canti).toHaveLength(2)
  expect(canti[0].split(' ')).toHaveLength(9)
  expect(json('generate', 'solution', ...CORE_1, DORIAN).lines).toHaveLength(1)
  const { exercises } = json('generate', 'faults', '--fault', 'par-perfect/fifths:2', '--times', '2', DORIAN)
  for (const { line, answerKey } of exercises) {
    expect(line.split(' | ')).toHaveLength(11)
    expect(answerKey.map(({ rule }: { rule: string }) => rule)).toEqual(['par-perfect', 'par-perfect'])
  }
})

test('reads both voices, mode and position from a MusicXML file', () => {
  const { findings } = json('check', '--rules', 'open-undergrad', 'fux.musicxml')
  expect(findings.some(({ rule }: { rule: string }) => rule === 's1-repeat')).toBe(true)
})

test('help is printed where it is asked for, and where nothing is', () => {
  expect(run('--help')).toMatchObject({ error: '', exitCode: 0 })
  expect(run().out).toContain('count')
})

describe('bad input is one sentence on the error stream, and 2', () => {
  test.each<[string, ...string[]]>([
    ['a command nobody knows', 'compose'],
    ['an option nobody knows', 'count', '--loud', DORIAN],
    ['no melody', 'count'],
    ['two melodies', 'count', '--cantus', DORIAN, DORIAN],
    ['a note nobody knows', 'count', 'D4 H4 D4'],
    ['a melody of one note', 'count', 'D4'],
    ['a melody of forty-one notes', 'count', 'D4 '.repeat(41)],
    ['a sixth species', 'count', '--species', '6', DORIAN],
    ['half a species', 'count', '--species', '1.5', DORIAN],
    ['a mode nobody knows', 'count', '--mode', 'locrian', DORIAN],
    ['a final that is none', 'count', '--final', 'X', DORIAN],
    ['a position beside', 'count', '--position', 'beside', DORIAN],
    ['half a compass', 'count', '--low', 'D4', DORIAN],
    ['a compass upside down', 'count', '--low', 'D6', '--high', 'D4', DORIAN],
    ['a compass of no pitch', 'count', '--low', 'D', '--high', 'D6', DORIAN],
    ['rules nobody keeps', 'count', '--rules', 'mine', DORIAN],
    ['core-1 without its compass', 'count', '--rules', 'core-1', DORIAN],
    ['a rule set that is not there', 'count', '--rules', 'nowhere.json', DORIAN],
    ['a rule set that is no JSON', 'count', '--rules', 'no-json.json', DORIAN],
    ['a rule set of another form', 'count', '--rules', 'no-rule-set.json', DORIAN],
    ['parameters out of range', 'count', '--rules', 'bad-params.json', DORIAN],
    ['a rule nobody knows', 'count', '--rules', 'unknown-rule.json', DORIAN],
    ['a line longer than its cantus', 'check', '--line', `${FUX_5} | D5`, DORIAN],
    ['notes off the grid', 'check', '--line', 'A4:1.3', DORIAN],
    ['a bar too full', 'check', '--line', 'A4:3 A4:2 | A4', DORIAN],
    ['a bar aside that is not there', 'check', '--aside', '12', '--line', FUX_5, DORIAN],
    ['everything set aside', 'check', '--aside', '1,2,3,4,5,6,7,8,9,10,11', '--line', FUX_5, DORIAN],
    ['a seed that is no number', 'draw', '--seed', 'x', DORIAN],
    ['a number of lines beyond reason', 'draw', '--times', '1000000', DORIAN],
    ['a file that is not there', 'check', 'nowhere.xml'],
    ['a file that is no score', 'check', 'page.xml'],
    ['a compressed file', 'check', 'fux.mxl'],
    ['nothing to generate', 'generate'],
    ['something else to generate', 'generate', 'fugue'],
    ['no fault', 'generate', 'faults', DORIAN],
    ['a fault that is none', 'generate', 'faults', '--fault', 'PAR!', DORIAN],
    ['a fault of an unknown rule', 'generate', 'faults', '--fault', 'no-such', DORIAN],
    ['an impossible fault', 'generate', 'faults', '--fault', 'mel-seventh', DORIAN],
    ['an impossible cantus', 'generate', 'cantus', '--low', 'E4', '--high', 'G4'],
  ])('%s', (_name, ...argv) => {
    const { out, error, exitCode } = run(...argv)
    expect({ out, exitCode }).toEqual({ out: '', exitCode: 2 })
    expect(error).toMatch(/^[^\n]{8,}\.\n$/)
    expect(error).not.toMatch(/undefined|\[object|Error:/)
  })
})

test('a melody of forty bars is answered', () => {
  const forty = 'D4 F4 E4 D4 G4 F4 A4 G4 F4 E4 '.repeat(4).replace(/F4 E4 $/, 'E4 D4')
  const { count } = json('count', '--rules', 'open-undergrad', forty)
  expect(count).toMatch(/^\d+$/)
})

test('the program itself prints JSON, or one sentence and 2', () => {
  const folder = mkdtempSync(path.join(tmpdir(), 'bicinium-theory-'))
  const root = path.resolve(__dirname, '../../..')
  const start = (...argv: readonly string[]) =>
    spawnSync(process.execPath, ['--import', 'tsx', 'server/theory/main.ts', ...argv], {
      cwd: root,
      encoding: 'utf8',
    })
  try {
    const score = path.join(folder, 'fux.musicxml')
    writeFileSync(score, files['fux.musicxml'] as string)
    const good = start('count', ...CORE_1, '--line', '. |', '--json', score)
    expect({ status: good.status, stderr: good.stderr }).toEqual({ status: 0, stderr: '' })
    expect(JSON.parse(good.stdout).count).toBe('118')
    const bad = start('count', path.join(folder, 'nowhere.xml'))
    expect({ status: bad.status, stdout: bad.stdout }).toEqual({ status: 2, stdout: '' })
    expect(bad.stderr).toMatch(/could not be read\.\n$/)
  } finally {
    rmSync(folder, { recursive: true })
  }
})
