import { PRESETS } from '@/shared/rules/presets'
import { RULES } from '@/shared/rules/registry'
import { ruleSetProblems } from '@/shared/rules/rule-set'
import { ruleSetSchema } from '@/shared/wire/documents'

test('there are the five presets of the catalogue', () => {
  expect(PRESETS.map(({ id }) => id)).toEqual([
    'fux-mann',
    'jeppesen-16c',
    'open-undergrad',
    'conservatoire',
    'starter',
  ])
})

describe.each(PRESETS.map((preset) => [preset.id, preset] as const))('%s', (_id, preset) => {
  test('names only rules there are, with parameters they have', () => {
    expect(ruleSetProblems(preset)).toEqual([])
  })

  test('says of every rule what it makes of it, in the order of the catalogue', () => {
    expect(Object.keys(preset.rules)).toEqual(RULES.map(({ id }) => id))
  })

  test('is plain data that the board carries unchanged', () => {
    expect(JSON.parse(JSON.stringify(preset))).toEqual(preset)
    expect(ruleSetSchema.parse(preset)).toEqual(preset)
  })
})

test('unknown rules and bad parameters are refused in words', () => {
  const problems = ruleSetProblems({
    id: 'mine',
    name: 'Mine',
    rules: {
      'no-such-rule': { level: 'law' },
      'mel-leap-run': { level: 'law', params: { most: 0 } },
      'mel-seventh': { level: 'off', params: { loud: true } },
    },
  })
  expect(problems.map(({ ruleId, code, path }) => [ruleId, code, path])).toEqual([
    ['no-such-rule', 'unknown-rule', ''],
    ['mel-leap-run', 'bad-params', 'most'],
    ['mel-seventh', 'bad-params', ''],
  ])
  for (const { message } of problems) expect(message.length).toBeGreaterThan(10)
})
