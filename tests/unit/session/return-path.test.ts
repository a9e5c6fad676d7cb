import { parseReturnPath } from '@/components/session/return-path'

describe('the way back after signing in', () => {
  test.each([
    ['/courses/abc', '/courses/abc'],
    ['/join/re-fa?x=1', '/join/re-fa?x=1'],
    [undefined, '/home'],
    ['', '/home'],
    ['home', '/home'],
    ['https://elsewhere.example/', '/home'],
    ['//elsewhere.example/', '/home'],
    ['/\\elsewhere.example/', '/home'],
    ['/\t/elsewhere.example/', '/home'],
    ['javascript:alert(1)', '/home'],
    [['/a', '/b'], '/home'],
  ])('%j leads to %s', (to, expected) => expect(parseReturnPath(to)).toBe(expected))
})
