/** Limits that the wire need not tell; those that clients should know are in `shared/wire`. */

/** Yjs id under which the server writes chorus and board: one id for ever, for a document's cost grows with every id. */
export const SERVER_CLIENT_ID = 1

/** Yjs ids that one document may see: one a page load that wrote something. */
export const CLIENTS_A_DOCUMENT = 500

/** Depth of plain values; the deepest we write is a rule set's parameters. */
export const VALUE_DEPTH = 12

/** Highest clock taken from a client. Far from the numbers at which Yjs would lose count. */
export const MAX_CLOCK = 2 ** 31

/** Changes after which a document is written whole, so that joining a restarted server stays cheap. */
export const CHANGES_A_SNAPSHOT = 2_000

/** Size at which the changes since the last whole state are folded into it, in memory. */
export const LOG_BYTES = 64 * 1024
