import { countFailure, failuresNow, lockedForMs, type TryCount, type TryPolicy } from '@/server/limits/tries'

const policy: TryPolicy = { tries: 3, windowMs: 1_000, lockMs: 100, maxLockMs: 250 }
const at = (ms: number) => new Date(1_700_000_000_000 + ms)

const failAt = (...times: number[]) =>
  times.reduce<TryCount | null>((count, ms) => countFailure(count, policy, at(ms)), null)

describe('counting tries', () => {
  it('locks at the failure that makes the number full, for a while', () => {
    expect(lockedForMs(failAt(0, 1), at(1))).toBe(0)
    const locked = failAt(0, 1, 2)
    expect(lockedForMs(locked, at(2))).toBe(100)
    expect(lockedForMs(locked, at(101))).toBe(1)
    expect(lockedForMs(locked, at(102))).toBe(0)
  })

  it('forgets what lies before the window', () => {
    const count = failAt(0, 1, 1_100)
    expect(lockedForMs(count, at(1_100))).toBe(0)
    expect(failuresNow(count, policy, at(1_100))).toBe(1)
    expect(failuresNow(count, policy, at(2_200))).toBe(0)
  })

  it('counts nothing while locked', () => {
    const locked = failAt(0, 1, 2)
    expect(countFailure(locked, policy, at(50))).toBe(locked)
  })

  it('locks twice as long each time in a row, up to a most, and begins anew after a good day', () => {
    let count = failAt(0, 1, 2)
    const lockAt = (ms: number) => {
      for (const more of [0, 1, 2]) count = countFailure(count, policy, at(ms + more))
      return lockedForMs(count, at(ms + 2))
    }
    expect(lockAt(200)).toBe(200)
    expect(lockAt(1_000)).toBe(250)
    expect(lockAt(90_000_000)).toBe(100)
  })

  it('lets one try in before it knows anything', () => {
    expect(lockedForMs(null, at(0))).toBe(0)
    expect(lockedForMs(undefined, at(0))).toBe(0)
  })
})
