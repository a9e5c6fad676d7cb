import { checkLine, findPreset, findRule, judgeExample, readExample, type RuleSet } from '@/shared/rules'
import { FUX_FIRST_SPECIES, type FuxExample } from '@/tests/fixtures/fux-first-species'

const asExample = ({ mode, final, position, cantus, line }: FuxExample) => ({
  mode,
  final,
  position,
  cantus,
  line,
  breaches: [],
})

function lawsBrokenIn(example: FuxExample, preset: RuleSet): readonly string[] {
  const { exercise, line } = readExample(asExample(example))
  return checkLine(exercise, line, preset)
    .filter(({ level }) => level === 'law')
    .map(({ ruleId, bars }) => [ruleId, ...bars].join(' '))
}

describe.each(FUX_FIRST_SPECIES.map((example) => [`Fux, figure ${example.figure}`, example] as const))(
  '%s',
  (_name, example) => {
    test('breaks no law of the rule set that follows him', () => {
      expect(lawsBrokenIn(example, findPreset('fux-mann') as RuleSet)).toEqual([])
    })

    test('breaks the laws of today’s textbooks that it is known to break, and no other', () => {
      const broken = lawsBrokenIn(example, findPreset('open-undergrad') as RuleSet)
      expect([...broken].sort()).toEqual([...example.laws].sort())
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
  },
)
