/** Facts every teacher of counterpoint would sign. Common practice, no source. */
import { isGestureSpan } from '@/shared/board'
import { checkLine, PRESETS, readExample, RULES, type Example, type RuleSet } from '@/shared/rules'
import { intervalOf } from '@/shared/theory/interval-name'
import { intervalBetween, isSameInterval, simpleInterval } from '@/shared/theory/interval'
import { motionBetween } from '@/shared/theory/motion'
import { pitchOf, type PitchName } from '@/shared/theory/pitch'

const presets = PRESETS.map((preset) => [preset.name, preset] as const)
const CADENCE_RULES: ReadonlySet<string> = new Set([
  's1-close',
  's1-cadence-above',
  's1-cadence-motion',
  'cad-raise-seventh',
  'cad-phrygian',
])

type Fact = Pick<Example, 'cantus' | 'line' | 'mode' | 'final'>

const findingsOn = (fact: Fact, preset: RuleSet) => {
  const { exercise, line } = readExample({ ...fact, breaches: [] })
  return checkLine(exercise, line, preset)
}

/** A cantus falling 2–1 in each mode, with the close above it. */
const CLOSES: readonly Fact[] = [
  { mode: 'ionian', final: 'C', cantus: 'D4 C4', line: 'B4 C5' },
  { mode: 'dorian', final: 'D', cantus: 'E4 D4', line: 'C#5 D5' },
  { mode: 'phrygian', final: 'E', cantus: 'F4 E4', line: 'D5 E5' },
  { mode: 'lydian', final: 'F', cantus: 'G3 F3', line: 'E4 F4' },
  { mode: 'mixolydian', final: 'G', cantus: 'A3 G3', line: 'F#4 G4' },
  { mode: 'aeolian', final: 'A', cantus: 'B3 A3', line: 'G#4 A4' },
]

const notes = (text: string | undefined): readonly PitchName[] => (text ?? '').split(' ')

describe('the close above a cantus that falls 2–1', () => {
  test.each(CLOSES.map((fact) => [fact.mode, fact] as const))(
    'in %s is a major sixth that opens to the octave by contrary motion',
    (_mode, fact) => {
      const [second, final] = notes(fact.cantus).map(pitchOf) as [
        ReturnType<typeof pitchOf>,
        ReturnType<typeof pitchOf>,
      ]
      const [leading, top] = notes(fact.line).map(pitchOf) as [typeof second, typeof final]
      expect(isSameInterval(intervalBetween(second, leading), intervalOf('M6'))).toBe(true)
      expect(isSameInterval(intervalBetween(final, top), intervalOf('P8'))).toBe(true)
      expect(motionBetween(second, final, leading, top)).toBe('contrary')
      for (const preset of PRESETS) {
        const atClose = findingsOn(fact, preset).filter(({ ruleId }) => CADENCE_RULES.has(ruleId))
        expect([preset.id, atClose]).toEqual([preset.id, []])
      }
    },
  )

  test.each(presets)('wants the raised leading tone in the minor modes: %s', (_name, preset) => {
    for (const [mode, final, cantus, line] of [
      ['dorian', 'D', 'E4 D4', 'C5 D5'],
      ['aeolian', 'A', 'B3 A3', 'G4 A4'],
      ['mixolydian', 'G', 'A3 G3', 'F4 G4'],
    ] as const) {
      const broken = findingsOn({ mode, final, cantus, line }, preset).map(({ ruleId, level }) => [
        ruleId,
        level,
      ])
      expect(broken).toContainEqual(['cad-raise-seventh', 'law'])
      expect(broken).toContainEqual(['s1-cadence-above', 'law'])
    }
  })
})

describe.each(presets)('a line above, by %s', (_name, preset) => {
  const opening = (line: PitchName) =>
    findingsOn({ mode: 'dorian', final: 'D', cantus: 'D4 F4 E4 D4', line: `${line} . . .` }, preset).filter(
      ({ ruleId }) => ruleId === 's1-open-above',
    ).length

  test.each(['A4', 'D5', 'A5'])('may open on %s: a fifth, an octave or a twelfth', (line) => {
    expect(opening(line)).toBe(0)
  })

  test.each(['F4', 'B4', 'E4', 'G4', 'C5', 'F5'])('may not open on %s', (line) => {
    expect(opening(line)).toBe(1)
  })
})

describe('a perfect twelfth', () => {
  const distance = RULES.find(({ id }) => id === 'dist-max')

  test('is the outer limit between the voices', () => {
    expect(distance?.params.parse({})).toMatchObject({ max: 12 })
    expect(simpleInterval(intervalBetween(pitchOf('D4'), pitchOf('A5')))).toEqual(intervalOf('P5'))
  })

  test.each(presets)('bounds every rule set: %s', (_name, preset) => {
    const far = (line: PitchName) =>
      findingsOn({ mode: 'dorian', final: 'D', cantus: 'D4 E4 D4', line: `. ${line} .` }, preset).filter(
        ({ ruleId }) => ruleId === 'dist-max',
      ).length
    expect(far('C6')).toBe(1)
    expect(far('G5')).toBe(0)
  })
})

describe('a gesture', () => {
  test('has three notes or more: two are only an interval', () => {
    expect(isGestureSpan({ from: 4, to: 5 }, 11)).toBe(false)
    expect(isGestureSpan({ from: 4, to: 6 }, 11)).toBe(true)
    expect(isGestureSpan({ from: 4, to: 4 }, 11)).toBe(false)
  })
})
