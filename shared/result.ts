/** A value, or the reason there is none. Every parser of text answers with one; nothing throws at the edge. */
export type Result<Value, Reason> =
  Readonly<{ ok: true; value: Value }> | Readonly<{ ok: false; reason: Reason }>

export const ok = <Value>(value: Value): Result<Value, never> => ({ ok: true, value })

export const fail = <Reason>(reason: Reason): Result<never, Reason> => ({ ok: false, reason })
