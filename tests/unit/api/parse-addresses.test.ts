import { parseAddresses } from '@/shared/api/parse-addresses'

describe('pasted addresses', () => {
  it.each<[string, string, string[], string[]]>([
    ['lines', 'a@x.example\nb@x.example\r\nc@x.example', ['a', 'b', 'c'], []],
    ['commas and semicolons', 'a@x.example, b@x.example; c@x.example,', ['a', 'b', 'c'], []],
    ['spaces', 'a@x.example b@x.example', ['a', 'b'], []],
    ['names with brackets', 'Ana Ó <a@x.example>, Bo <b@x.example>', ['a', 'b'], []],
    ['a quoted name with a comma', '"Last, First" <a@x.example>; b@x.example', ['a', 'b'], []],
    ['a name with a comma', 'Last, First <a@x.example>, Other, One <b@x.example>', ['a', 'b'], []],
    ['columns', 'Ana\tLast\ta@x.example\nb@x.example\tBo\tFirst', ['a', 'b'], []],
    ['a comma-separated table', 'Ana,Last,a@x.example', ['a'], []],
    ['links', 'mailto:a@x.example', ['a'], []],
    ['loose punctuation', '(a@x.example), ‘b@x.example’.', ['a', 'b'], []],
    ['capitals and repeats', 'A@X.example a@x.EXAMPLE', ['a'], []],
    ['words that are none', 'a@x.example, nonsense\nfoo bar', ['a'], ['nonsense', 'foo bar']],
    ['broken ones', 'a@, @x.example, a@b', [], ['a@', '@x.example', 'a@b']],
    ['nothing', ' \n ,;', [], []],
  ])('are found in %s', (_what, pasted, boxes, refused) => {
    expect(parseAddresses(pasted)).toEqual({ addresses: boxes.map((box) => `${box}@x.example`), refused })
  })

  it('are found in twenty thousand characters of anything without stalling', () => {
    for (const piece of ['@', '<', '"', 'a@', '<a@', ' \t', 'mailto:', '("']) {
      const pasted = piece.repeat(20_000 / piece.length)
      expect(parseAddresses(pasted).addresses).toEqual([])
    }
  })
})
