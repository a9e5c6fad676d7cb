import { checkLine, findPreset, findRule, judgeExample, readExample, type RuleSet } from '@/shared/rules'
import { FUX_SECOND_THIRD, type FuxQuickExample } from '@/tests/fixtures/fux-second-third'

const asExample = ({ species, mode, final, position, cantus, line }: FuxQuickExample) => ({
  species,
  mode,
  final,
  position,
  cantus,
  line,
  breaches: [],
})

const FUX = findPreset('fux-mann') as RuleSet

describe.each(FUX_SECOND_THIRD.map((example) => [`Fux, figure ${example.figure}`, example] as const))(
  '%s',
  (_name, example) => {
    const { exercise, line } = readExample(asExample(example))

    test('breaks no law of the rule set that follows him', () => {
      expect(checkLine(exercise, line, FUX).filter(({ level }) => level === 'law')).toEqual([])
    })

    test.each(example.departures.map((departure) => [departure.rule, departure] as const))(
      'departs from %s at its listed bars',
      (id, { params, bars }) => {
        const rule = findRule(id)
        if (!rule) throw new Error(`There is no rule called ${id}`)
        const found = judgeExample(rule, { ...asExample(example), params }).map((breach) => breach.bars)
        expect(found).toEqual(bars)
      },
    )

    test('has nothing against it in any part that is written', () => {
      for (let bars = 1; bars < exercise.cantus.length; bars += 1) {
        for (const isBegun of [true, false]) {
          const part = Object.entries(line).filter(([bar]) => Number(bar) <= bars === isBegun)
          const findings = checkLine(exercise, Object.fromEntries(part), FUX)
          expect([bars, isBegun, findings.filter(({ level }) => level === 'law')]).toEqual([
            bars,
            isBegun,
            [],
          ])
        }
      }
    })
  },
)

test('both species are there, above and below', () => {
  const kinds = new Set(FUX_SECOND_THIRD.map(({ species, position }) => `${species} ${position}`))
  expect([...kinds].sort()).toEqual(['2 above', '2 below', '3 above', '3 below'])
})
