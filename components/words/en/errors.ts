import type { ApiErrorCode } from '@/shared/api/errors'

/** What is said when a request is refused. A heading, and what can be done about it. */
type Refusal = Readonly<{ title: string; more: string }>

const byCode: Readonly<Record<ApiErrorCode | 'offline' | 'bad-reply', Refusal>> = {
  'bad-request': {
    title: 'The server did not understand this request.',
    more: 'Load the page again; it may be older than the server.',
  },
  'signed-out': { title: 'You are signed out.', more: 'Sign in, and this page will come back.' },
  'address-unverified': {
    title: 'Your address is not confirmed yet.',
    more: 'Open the link in the message we sent you, then try again.',
  },
  forbidden: {
    title: 'This is not yours to open.',
    more: 'Ask the teacher of the course, or the administrator of the school.',
  },
  'not-found': {
    title: 'There is nothing here.',
    more: 'It was removed, or it belongs to a course you are not in.',
  },
  conflict: { title: 'Somebody changed this before you.', more: 'Load it again to see what stands now.' },
  ended: { title: 'This has ended.', more: 'Ask the teacher whether it will be opened again.' },
  'door-closed': { title: 'The door of this lesson is closed.', more: 'Ask the teacher to open it.' },
  'lesson-full': {
    title: 'This lesson is full.',
    more: 'The teacher can make room by removing someone who left.',
  },
  'code-unknown': {
    title: 'No open lesson has this code.',
    more: 'Compare the syllables with the wall and try again.',
  },
  'name-refused': { title: 'This name cannot be used.', more: 'Choose one without hidden characters.' },
  invalid: { title: 'Something is not right yet.', more: 'See beside the fields.' },
  'too-large': { title: 'This is too large to be taken.', more: 'Make it shorter and try again.' },
  'too-many-tries': { title: 'Too many tries.', more: 'Wait a little before the next one.' },
  unavailable: {
    title: 'The server cannot keep anything just now.',
    more: 'Nothing you wrote is lost. Try again in a moment.',
  },
  internal: { title: 'The server stumbled.', more: 'It has been noted. Try again in a moment.' },
  offline: { title: 'The server cannot be reached.', more: 'Check the connection and try again.' },
  'bad-reply': {
    title: 'The answer made no sense.',
    more: 'Something between you and the server answered in its place. Try again.',
  },
}

/** What is wrong with one field, by code; `args` come with the code. */
const fields: Readonly<Record<string, (args: Readonly<Record<string, string | number>>) => string>> = {
  empty: () => 'Please fill this in.',
  'too-long': ({ max }) => (max ? `At most ${max} characters.` : 'This is too long.'),
  'too-short': ({ min }) => (min ? `At least ${min} characters.` : 'This is too short.'),
  'hidden-characters': () => 'This holds characters that cannot be seen. Type it afresh.',
  'not-an-address': () => 'This is not an e-mail address.',
  'not-a-pitch': () => 'This is not the name of a note.',
  'not-a-code': () => 'A code is six syllables, such as re fa mi la sol do.',
  'wrong-password': () => 'This is not your password.',
  taken: () => 'This is taken already.',
  'no-such-pair': () => 'This address and this password do not belong together.',
  'password-short': () => 'A password has at least ten characters.',
  'password-long': () => 'This password is too long.',
  'address-taken': () => 'There is an account with this address already. Sign in, or set a new password.',
  'unknown-rule': () => 'There is no rule of this name.',
  'bad-params': () => 'A rule has a value it cannot take.',
  'not-alike': () => 'The two are not alike.',
}

export const errors = {
  of: (code: keyof typeof byCode): Refusal => byCode[code],
  field: (code: string, args: Readonly<Record<string, string | number>> = {}): string =>
    fields[code]?.(args) ?? 'This cannot be taken as it is.',
  wait: (seconds: number) =>
    seconds < 90 ? `Try again in ${seconds} seconds.` : `Try again in ${Math.ceil(seconds / 60)} minutes.`,
} as const
