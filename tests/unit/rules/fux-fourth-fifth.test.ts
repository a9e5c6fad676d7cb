import { checkLine, findPreset, findRule, judgeExample, readExample, type RuleSet } from '@/shared/rules'
import { FUX_FOURTH_FIFTH, type FuxTiedExample } from '@/tests/fixtures/fux-fourth-fifth'

const asExample = ({ species, mode, final, position, cantus, line }: FuxTiedExample) => ({
  species,
  mode,
  final,
  position,
  cantus,
  line,
  breaches: [],
})

function lawsBrokenIn(example: FuxTiedExample, preset: RuleSet): readonly string[] {
  const { exercise, line } = readExample(asExample(example))
  return checkLine(exercise, line, preset)
    .filter(({ level }) => level === 'law')
    .map(({ ruleId, bars }) => [ruleId, ...bars].join(' '))
}

describe.each(FUX_FOURTH_FIFTH.map((example) => [`Fux, figure ${example.figure}`, example] as const))(
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

    test('is judged alike bar by bar: no law is broken by any beginning of it', () => {
      const { exercise, line } = readExample(asExample(example))
      for (let bars = 1; bars < exercise.cantus.length; bars += 1) {
        const begun = Object.fromEntries(Object.entries(line).filter(([bar]) => Number(bar) <= bars))
        const findings = checkLine(exercise, begun, findPreset('fux-mann') as RuleSet)
        expect([bars, findings.filter(({ level }) => level === 'law')]).toEqual([bars, []])
      }
    })
  },
)
