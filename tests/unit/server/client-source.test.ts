import { sourceOf } from '@/server/http/client-source'

describe('the source of a request', () => {
  it.each([
    ['203.0.113.9', '203.0.113.9'],
    ['::ffff:203.0.113.9', '203.0.113.9'],
    ['2001:db8:1:2:3:4:5:6', '2001:db8:1:2::/64'],
    ['2001:db8:1:2::1', '2001:db8:1:2::/64'],
    ['2001:db8::1', '2001:db8::/64'],
    ['::1', '::/64'],
    [undefined, 'unknown'],
  ])('of %s is %s', (ip, source) => {
    expect(sourceOf({ ip })).toBe(source)
  })
})
