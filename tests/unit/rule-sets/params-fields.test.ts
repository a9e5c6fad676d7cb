import { z } from 'zod'
import { formatParam, paramFields, parseParam } from '@/components/rule-sets/params-fields'

describe("a rule's parameters become plain controls", () => {
  const params = z.strictObject({
    maxRepeats: z.int().min(0).max(8).default(2).describe('How often a note may come again.'),
    isStrict: z.boolean().default(true),
    openings: z.array(z.enum(['P1', 'P5', 'P8'])).default(['P5', 'P8']),
    where: z.enum(['anywhere', 'inside']).default('inside'),
    ratio: z.number().min(0).max(1).default(0.5),
  })

  test('each with the name in words, its bounds and its default', () => {
    expect(paramFields(params)).toEqual([
      {
        name: 'maxRepeats',
        label: 'max repeats',
        description: 'How often a note may come again.',
        control: { kind: 'whole-number', min: 0, max: 8 },
        fallback: 2,
      },
      {
        name: 'isStrict',
        label: 'is strict',
        description: null,
        control: { kind: 'switch' },
        fallback: true,
      },
      {
        name: 'openings',
        label: 'openings',
        description: null,
        control: { kind: 'list', options: ['P1', 'P5', 'P8'] },
        fallback: ['P5', 'P8'],
      },
      {
        name: 'where',
        label: 'where',
        description: null,
        control: { kind: 'choice', options: ['anywhere', 'inside'] },
        fallback: 'inside',
      },
      {
        name: 'ratio',
        label: 'ratio',
        description: null,
        control: { kind: 'number', min: 0, max: 1 },
        fallback: 0.5,
      },
    ])
  })

  test('no parameters, no controls', () => {
    expect(paramFields(z.strictObject({}))).toEqual([])
  })

  test.each([
    ['whole-number', '7', 7],
    ['whole-number', ' 12 ', 12],
    ['whole-number', 'seven', undefined],
    ['whole-number', '', undefined],
    ['number', '0.5', 0.5],
    ['number', '1e9', undefined],
  ] as const)('a %s reads %j as %j', (kind, text, value) => {
    expect(parseParam({ kind, min: null, max: null }, text)).toBe(value)
  })

  test('a list is read from commas or spaces, and written back', () => {
    const list = { kind: 'list', options: null } as const
    expect(parseParam(list, 'P5, P8 P1')).toEqual(['P5', 'P8', 'P1'])
    expect(formatParam(list, ['P5', 'P8'])).toBe('P5, P8')
    expect(parseParam(list, '')).toEqual([])
  })
})
