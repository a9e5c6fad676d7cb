import { exampleOn, groundsFor, isSameTrial, tryRule } from '@/components/rule-sets/try-rule'
import { findRule, RULES, type AnyRule } from '@/shared/rules'

const ruleOf = (id: string): AnyRule => {
  const rule = findRule(id)
  if (!rule) throw new Error(`no rule ${id}`)
  return rule
}
const barsOf = ({ breaches }: ReturnType<typeof tryRule>) => breaches?.map(({ bars }) => bars) ?? null

describe('trying a rule on an example', () => {
  const repeat = ruleOf('s1-repeat')
  const fux = exampleOn('fux', repeat.explain)

  it('tells what a change of parameter does to an exercise of Fux', () => {
    const strict = tryRule(repeat, fux, { level: 'law', params: { maxRepeats: 0 } })
    const lax = tryRule(repeat, fux, { level: 'law', params: { maxRepeats: 9 } })
    expect(barsOf(strict)).toEqual([
      [1, 2],
      [6, 7],
    ])
    expect(barsOf(lax)).toEqual([])
    expect(isSameTrial(strict, lax)).toBe(false)
  })

  it('says nothing while the rule is off or left out, and cannot say with a bad value', () => {
    expect(barsOf(tryRule(repeat, fux, { level: 'off', params: { maxRepeats: 0 } }))).toEqual([])
    expect(barsOf(tryRule(repeat, fux, undefined))).toEqual([])
    expect(barsOf(tryRule(repeat, fux, { level: 'law', params: { maxRepeats: 'many' } }))).toBeNull()
  })

  it('tells law from preference', () => {
    const trials = (['law', 'preference'] as const).map((level) =>
      tryRule(repeat, exampleOn('wrong', repeat.explain), { level }),
    )
    expect(isSameTrial(trials[0] as never, trials[1] as never)).toBe(false)
  })

  it.each(RULES.map((rule) => [rule.id, rule] as const))(
    '%s can be tried on all its grounds',
    (_id, rule) => {
      for (const ground of groundsFor(rule)) {
        const { breaches } = tryRule(rule, exampleOn(ground, rule.explain), { level: 'law' })
        expect(breaches).not.toBeNull()
      }
    },
  )
})
