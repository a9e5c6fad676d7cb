import { checkCantus, checkLine, createChecker } from '@/shared/rules'
import { readExample } from '@/shared/rules/example'
import { findPreset, PRESETS } from '@/shared/rules/presets'
import type { Exercise, Finding, RuleSet } from '@/shared/rules/rule'
import { FUX_CANTUS } from './fux-cantus'

const setOf = (rules: RuleSet['rules']): RuleSet => ({ id: 'test', name: 'Test', rules })
const score = (cantus: string, line = '') => {
  const { exercise, line: notes } = readExample({
    cantus,
    mode: 'dorian',
    final: 'D',
    breaches: [],
    ...(line && { line }),
  })
  return { exercise, line: notes }
}
const short = ({ ruleId, code, level, bars, voice }: Finding): string =>
  `${voice} ${ruleId} ${code} ${level} ${bars.join(',')}`

test('a finding carries its rule, the level of the rule set, its voice and its bars', () => {
  const { exercise, line } = score('D4 F4 E4 D4', 'A4 B4 F4 D4')
  for (const level of ['law', 'preference'] as const) {
    expect(checkLine(exercise, line, setOf({ 'mel-aug-dim': { level } })).map(short)).toEqual([
      `line mel-aug-dim augmented ${level} 2,3`,
    ])
  }
  expect(checkLine(exercise, line, setOf({ 'mel-aug-dim': { level: 'off' } }))).toEqual([])
})

test('a remark stays a preference where the rule is law', () => {
  const { exercise } = score('D4 E5 D5 D4')
  const ruleSet = setOf({ 'cf-range': { level: 'law', params: { most: 10, preferred: 8 } } })
  expect(checkCantus(exercise, ruleSet).map(short)).toEqual(['cantus cf-range rather-wide preference 1,2'])
})

test('findings come in the order of the bars they end in', () => {
  const { exercise, line } = score('D4 F4 E4 G4 F4 E4 D4', 'D4 C5 D4 B4 B3 A4 D4')
  for (const preset of PRESETS) {
    const ends = checkLine(exercise, line, preset).map(({ bars }) => bars.at(-1) as number)
    expect(ends.length).toBeGreaterThan(3)
    expect([...ends].sort((a, b) => a - b)).toEqual(ends)
  }
})

test('rules of a cantus judge the cantus, rules of a line the line, rules of a melody either', () => {
  const { exercise, line } = score('D4 F4 B4 D4', 'D5 E4 D5 D5')
  const ruleSet = setOf({
    'cf-approach-final': { level: 'law' },
    'voice-compass': { level: 'law', params: { aboveLow: 'F4' } },
    'mel-seventh': { level: 'law' },
    'mel-aug-dim': { level: 'law' },
  })
  expect(checkCantus(exercise, ruleSet).map(short)).toEqual([
    'cantus mel-aug-dim augmented law 2,3',
    'cantus cf-approach-final not-by-step law 3,4',
  ])
  expect(checkLine(exercise, line, ruleSet).map(short)).toEqual([
    'line voice-compass below law 2',
    'line mel-seventh seventh law 1,2',
    'line mel-seventh seventh law 2,3',
  ])
})

test('rules that do not govern the exercise’s species are silent on the line', () => {
  const { exercise, line } = score('D4 F4 E4 D4', 'D4 E4 F4 A4')
  const fifth: Exercise = { ...exercise, species: 5 }
  const names = (findings: readonly Finding[]) => new Set(findings.map(({ ruleId }) => ruleId))
  const openUndergrad = findPreset('open-undergrad') as RuleSet
  expect(names(checkLine(exercise, line, openUndergrad))).toContain('vert-consonance-set')
  expect(names(checkLine(fifth, line, openUndergrad))).not.toContain('vert-consonance-set')
})

test('unknown rules and bad parameters are left out, and the rest is judged', () => {
  const { exercise, line } = score('D4 F4 E4 D4', 'D4 C5 F4 D4')
  const ruleSet = setOf({
    'no-such-rule': { level: 'law' },
    'mel-leap-run': { level: 'law', params: { most: 'many' } },
    'mel-seventh': { level: 'law' },
  })
  expect(checkLine(exercise, line, ruleSet).map(({ ruleId }) => ruleId)).toEqual(['mel-seventh'])
})

test('bars set aside are not read: the neighbours are those of the reduction', () => {
  const { exercise, line } = score('D4 F4 E4 G4 D4', 'D5 C5 B4 B4 D5')
  const ruleSet = setOf({
    'mel-seventh': { level: 'law' },
    'mel-chromatic-step': { level: 'law' },
    'mel-leap-recovery': { level: 'law', params: { threshold: 3 } },
  })
  expect(checkLine(exercise, line, ruleSet)).toEqual([])
  const widened = { ...line, 2: [{ pitch: 'E4', ticks: 1920 }] }
  expect(checkLine(exercise, widened, ruleSet).map(short)).toContain('line mel-seventh seventh law 1,2')
  expect(checkLine(exercise, widened, ruleSet, { setAside: new Set([2]) })).toEqual(
    checkLine(exercise, line, ruleSet, { setAside: new Set([2]) }),
  )
  const left = { ...line, 4: [{ pitch: 'E4', ticks: 1920 }] }
  expect(checkLine(exercise, left, ruleSet, { setAside: new Set([2, 3]) }).map(short)).toContain(
    'line mel-seventh seventh law 1,4',
  )
})

test('an unwritten line has no findings under any preset, above or below', () => {
  for (const preset of PRESETS) {
    for (const position of ['above', 'below'] as const) {
      const { exercise } = score('D4 F4 E4 D4 G4 F4 A4 G4 F4 E4 D4')
      expect(checkLine({ ...exercise, position }, {}, preset)).toEqual([])
    }
  }
})

test.each(FUX_CANTUS.map(({ mode, final, notes }) => [mode, final, notes] as const))(
  'Fux’s %s cantus on %s breaks no law of fux-mann',
  (mode, final, notes) => {
    const { exercise } = readExample({ cantus: notes, mode, final, breaches: [] })
    const findings = checkCantus(exercise, findPreset('fux-mann') as RuleSet)
    expect(findings.filter(({ level }) => level === 'law').map(short)).toEqual([])
  },
)

test('a checker made once answers as one made anew, and keeps nothing of the line before', () => {
  const { exercise, line } = score('D4 F4 E4 D4 G4 F4 D4', 'D4 C5 D4 B4 B3 A4 D4')
  for (const preset of PRESETS) {
    const checker = createChecker(exercise, preset)
    const first = checker.checkLine(line)
    expect(checker.checkLine({})).toEqual([])
    expect(checker.checkLine(line)).toEqual(first)
    expect(first).toEqual(checkLine(exercise, line, preset))
  }
})
