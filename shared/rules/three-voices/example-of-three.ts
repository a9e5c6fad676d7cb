import type { Example } from '@/shared/rules/rule'

type Rest = Partial<Omit<Example, 'line' | 'second' | 'breaches'>>

/** Over `D4 F4 E4 D4`: what every rule of three voices accepts. */
export const RIGHT_LINE = 'A4 A4 C#5 D5'
export const RIGHT_SECOND = 'D5 C5 G4 A4'

/** Makes the examples of rules of three voices: two lines over or round one cantus, Dorian on D. */
export const trio = (
  line: string,
  second: string,
  breaches: readonly number[] = [],
  rest: Rest = {},
): Example => ({
  cantus: 'D4 F4 E4 D4',
  line,
  second,
  mode: 'dorian',
  final: 'D',
  breaches,
  ...rest,
})
