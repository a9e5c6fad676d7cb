import { describeFinding, judgeExample, RULES, type Finding } from '@/shared/rules'
import { numberWord } from '@/shared/rules/number-word'

const finding = (more: Partial<Finding>): Finding => ({
  ruleId: 'dir-perfect',
  level: 'law',
  voice: 'line',
  code: 'rise-into',
  bars: [6, 7],
  notes: [],
  args: { interval: 'fifth' },
  ...more,
})

describe('describeFinding', () => {
  test('says what is wrong and what would mend it', () => {
    expect(describeFinding(finding({}))).toEqual({
      heading: 'Bars 6–7',
      sentence: 'Both voices rise into a fifth.',
      mend: 'Come to it from above, or let one voice stay.',
      spoken:
        'Bars 6 to 7. Law. Both voices rise into a fifth. Come to it from above, or let one voice stay.',
    })
  })

  test.each([
    [[6], 'Bar 6'],
    [[6, 7], 'Bars 6–7'],
    [[2, 9], 'Bars 2 and 9'],
    [[2, 3, 4, 7, 9], 'Bars 2–4, 7 and 9'],
    [[], 'The whole line'],
  ])('names the bars %j', (bars, heading) => {
    expect(describeFinding(finding({ bars })).heading).toBe(heading)
  })

  test.each([
    ['fifth', 'Both voices rise into a fifth.'],
    ['octave', 'Both voices rise into an octave.'],
    ['unison', 'Both voices rise into a unison.'],
  ])('sets the article before %s', (interval, sentence) => {
    expect(describeFinding(finding({ args: { interval } })).sentence).toBe(sentence)
  })

  test('prints accidentals as signs and speaks them as words', () => {
    const told = describeFinding(
      finding({
        ruleId: 'rel-chromatic',
        code: 'cross',
        level: 'preference',
        args: { first: 'C', second: 'C#' },
      }),
    )
    expect(told.sentence).toBe('The C of one voice is followed by C♯ in the other.')
    expect(told.spoken).toContain('Remark. The C of one voice is followed by C sharp in the other.')
  })

  test('writes numbers as words', () => {
    const told = describeFinding(
      finding({ ruleId: 'imperfect-run', code: 'thirds', args: { count: 4, max: 3 } }),
    )
    expect(told.sentence).toBe('This makes four thirds in a row.')
    expect([0, 1, 12, 20, 21, 99, 100].map(numberWord)).toEqual([
      'no',
      'one',
      'twelve',
      'twenty',
      'twenty-one',
      'ninety-nine',
      '100',
    ])
  })

  test('has something to say of a rule it does not know', () => {
    const told = describeFinding(finding({ ruleId: 'no-such-rule' }))
    expect(told.sentence).toContain('no-such-rule')
    expect(told.mend).toBe('')
  })

  test.each(RULES.map((rule) => [rule.id, rule] as const))(
    'fills every sentence of %s and leaves no placeholder',
    (id, rule) => {
      for (const breach of judgeExample(rule, rule.explain.wrong)) {
        const { sentence, mend, spoken } = describeFinding({
          ...breach,
          ruleId: id,
          level: rule.level,
          voice: 'line',
        })
        for (const text of [sentence, mend, spoken]) {
          expect(text).toMatch(/^[A-Z].*\.$/)
          expect(text).not.toMatch(/[{}!]|undefined|\ba [aeio]/)
        }
      }
    },
  )
})

test('the note A before a word is not taken for an article', () => {
  const repeated = finding({ ruleId: 's2-repeat', code: 'over-barline', bars: [1, 2], args: { note: 'A4' } })
  expect(describeFinding(repeated).sentence).toBe('The line repeats its A over the bar line.')
})
