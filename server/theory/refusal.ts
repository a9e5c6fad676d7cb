/** A fault in what was asked, told in one sentence on the error stream; the program then ends with 2. */
export class Refusal extends Error {
  constructor(sentence: string) {
    super(/[.…]$/.test(sentence) ? sentence : `${sentence}.`)
  }
}

/** The value of a result, or its problem as a refusal. */
export function accept<Value>(
  result:
    Readonly<{ ok: true; value: Value }> | Readonly<{ ok: false; reason: Readonly<{ message: string }> }>,
): Value {
  if (!result.ok) throw new Refusal(result.reason.message)
  return result.value
}
