import { formatCount, formatList } from '../format'

/** Rule sets: what a teacher makes law, taste or neither. */
export const ruleSets = {
  title: 'Rule sets',
  lede: 'Which rules are law this term, which are taste, and which are not looked at.',
  up: 'Rule sets',
  book: 'Read the rule book',
  compare: 'Compare two',
  import: 'Take in a file',
  importHint: 'A rule set that was exported from here, or written by its schema.',
  importNotJson: 'This file is not JSON. Choose one that was exported as a rule set.',
  importTooLarge: 'This file is too large for a rule set.',
  importRefused: (fields: readonly string[]) =>
    fields.length === 0
      ? 'This file is not a rule set as the schema has it.'
      : `This file cannot be taken. Look at ${formatList(fields)}.`,
  chosen: 'the one chosen',
  option: (name: string, isMine: boolean) => (isMine ? `${name} (yours)` : `${name} (shared with you)`),
  offered: 'Offered here',
  own: 'Yours',
  shared: 'Shared with your courses',
  none: 'None of your own yet',
  noneMore: 'Open one that is offered here and start your own from it.',
  counts: (laws: number, preferences: number) =>
    `${formatCount(laws, 'law', 'laws')}, ${formatCount(preferences, 'preference', 'preferences')}`,
  basedOn: (name: string) => `started from ${name}`,
  sharedSome: 'shared with a course',
  newTitle: 'A rule set of your own',
  newLede: (name: string) => `Started from ${name}. Nothing is kept until you keep it.`,
  presetLede: 'Offered to everyone. It stays as it is; make your own from it to change it.',
  othersLede: 'Shared by somebody who teaches with you. Make your own from it to change it.',
  makeOwn: 'Make my own from it',
  compareThis: 'Compare it',
  export: 'Export as a file',
  remove: 'Remove',
  removeTitle: 'Remove this rule set?',
  removeMore: 'Lessons that were made with it keep their own copy.',
  name: 'Name',
  ownName: (name: string) => `${name}, changed`,
  share: 'Who may use it',
  keep: 'Keep it',
  keepChanges: 'Keep the changes',
  kept: 'The rule set is kept.',
  undo: 'Undo the changes',
  changes: (count: number) => (count === 0 ? 'As it was' : `${formatCount(count, 'rule', 'rules')} changed`),
  species: 'Rules for',
  everySpecies: 'every species',
  rules: 'The rules',
  tryIt: 'See what it does',
  tryItClose: 'Close the example',
  tryItSpoken: (rule: string) => `See what it does: ${rule}`,
  before: 'Before',
  now: 'As set now',
  same: 'As set now, the same as before',
  saysNothing: 'It has nothing to say.',
  isOff: 'It is off and says nothing.',
  badValue: 'A value it cannot take; it is not asked.',
  exampleOf: {
    right: 'The rule’s own right example',
    wrong: 'The rule’s own wrong example',
    fux: 'Fux, first species, on D',
  },
  examples: 'Example',
  conflicts: {
    title: 'This rule set contradicts itself',
    lead: 'It can be kept; a class could not keep it.',
    'crossed-bounds': (rule: string, low: string, high: string) =>
      `“${rule}” has a “${low}” that lies above its “${high}”.`,
    'nothing-allowed': (rule: string) => `“${rule}” is law and allows nothing at all.`,
    'no-line': (position: 'above' | 'below', bar: number, rules: readonly string[]) =>
      `Nothing can be written ${position} the plainest cantus, Fux’s in D: in bar ${bar} every note is refused${
        rules.length === 0 ? '' : ` by ${formatList(rules.map((rule) => `“${rule}”`))}`
      }.`,
    sound: 'Its laws leave room to write.',
  },
  compared: {
    title: 'Two rule sets side by side',
    first: 'First',
    second: 'Second',
    swap: 'Change sides',
    rule: 'Rule',
    same: 'They are the same',
    sameMore: 'No rule has another level or another value in the one than in the other.',
    count: (count: number, all: number) =>
      `${formatCount(count, 'rule differs', 'rules differ')}, out of ${all}.`,
    table: 'Rules that differ',
  },
} as const
