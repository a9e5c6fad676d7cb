import { lesson } from './lesson'

const bars = lesson.barsInSentence

/** The library of cantus firmi, and writing one. */
export const cantus = {
  title: 'Cantus firmi',
  lede: 'Melodies to write a second voice to.',
  write: 'Write one',
  search: 'Search by title or source',
  modeFilter: 'Mode',
  anyMode: 'any mode',
  groups: { own: 'Written here', published: 'Out of the books', invented: 'Invented for this library' },
  none: 'None of that kind',
  noneMore: 'Try another word, or write one.',
  bars: (count: number) => `${count} bars`,
  modeOn: (mode: string, final: string) => `${mode} on ${final}`,
  invented: 'Invented for this library; nobody’s name is on it.',
  noSource: 'No source named.',
  mine: 'yours',
  shared: 'shared with a course',
  gestureNames: {
    rise: 'rises',
    fall: 'falls',
    arch: 'rises and falls',
    valley: 'falls and rises',
    level: 'level',
  },
  view: {
    change: 'Change it',
    copy: 'Write another from it',
    remove: 'Remove',
    removeTitle: 'Remove this cantus?',
    removeMore: 'Lessons that were made with it keep their own copy.',
  },
  edit: {
    newTitle: 'A new cantus firmus',
    up: 'Cantus firmi',
    staffLabel: 'The cantus on its staff. Arrows left and right move from bar to bar.',
    staffHint: 'Tap the staff, or type letters.',
    keysHint:
      'On the staff: A to G write a note, up and down move it, + and − raise and lower it, Delete takes the bar out.',
    text: 'Notes',
    textHint: 'Such as D4 F4 E4 D4. Without an octave a note goes the nearer way.',
    clef: 'Clef',
    mode: 'Mode',
    final: 'Final',
    modeAuto: (mode: string) => `as the notes: ${mode}`,
    finalAuto: (final: string) => `as the last note: ${final}`,
    titleLabel: 'Title',
    source: 'Source',
    sourceHint: 'Book, year and page, or leave it empty if it is your own.',
    share: 'Who may use it',
    shareMe: 'only you',
    shareWith: (course: string) => `everyone who teaches in ${course}`,
    preset: 'Judged by',
    save: 'Keep it',
    saveChanges: 'Keep the changes',
    discard: 'Throw the draft away',
    draftFound: 'This is your unfinished draft from this browser.',
    kept: 'The cantus is kept.',
    takeBack: 'Take the last note back',
    hear: 'Hear it',
    stop: 'Stop',
  },
  problems: {
    notNotes: (words: readonly string[], places: readonly number[]) =>
      words.length === 1
        ? `“${words[0]}” in ${bars(places)} is not a note.`
        : `${lesson.listed(words.map((word) => `“${word}”`))} in ${bars(places)} are not notes.`,
    'too-short': (min: number) => `A cantus has ${lesson.inWords(min)} bars at least.`,
    'too-long': (max: number) => `A cantus has ${max} bars at most.`,
    'out-of-clef-range': (at: readonly number[], clef: string) =>
      `${capital(bars(at))} lie${at.length === 1 ? 's' : ''} too far from the staff in the ${clef} clef. Choose another clef, or another octave.`,
    'wrong-final': (last: string, final: string) =>
      `It ends on ${last}, and its final is ${final}. End on the final, or choose another one.`,
    'not-diatonic': (at: readonly number[]) =>
      `${capital(bars(at))} ${at.length === 1 ? 'has a note' : 'have notes'} from outside the mode.`,
    noSignature: 'No clef carries this mode on this final: it would take more than seven signs.',
    noNotes: 'Write the notes first.',
  },
  facts: {
    title: 'What it is like',
    waiting: 'It is analysed as you write: final, mode, range, apex, leaps and cadence.',
    final: 'Final',
    mode: 'Mode',
    also: (modes: readonly string[]) => `; the notes would also be ${lesson.listed(modes)}`,
    range: 'Range',
    rangeOf: (low: string, high: string, interval: string) => `${low} to ${high}, ${article(interval)}`,
    apex: 'Apex',
    apexOnce: (note: string, bar: number) => `${note}, once, in bar ${bar}`,
    apexMore: (note: string, at: readonly number[]) => `${note}, ${times(at.length)}, in ${bars(at)}`,
    moves: 'Steps',
    movesOf: (steps: number, moves: number) => `${steps} of ${moves} moves`,
    leaps: 'Leaps',
    noLeaps: 'none',
    leap: (interval: string, direction: 1 | 0 | -1, bar: number) =>
      `${interval} ${direction === 1 ? 'up' : 'down'} into bar ${bar}`,
    recovery: {
      'step-back': 'then a step back',
      'turns-back': 'then it turns back',
      none: 'then it goes on the same way',
      end: 'and there it ends',
    },
    cadence: 'Cadence',
    cadenceOf: (from: number, to: number) => `${ordinalDegree(from)} to ${ordinalDegree(to)} degree`,
    gestures: 'Gestures',
    gesture: {
      rise: (at: readonly number[]) => `${bars(at)} rise`,
      fall: (at: readonly number[]) => `${bars(at)} fall`,
      arch: (at: readonly number[]) => `${bars(at)} rise and fall`,
      valley: (at: readonly number[]) => `${bars(at)} fall and rise`,
      level: (at: readonly number[]) => `${bars(at)} stay level`,
    },
  },
  findings: {
    title: 'What the rules say',
    none: 'Nothing. It keeps every law and every preference of this rule set.',
    waiting: 'Once it has notes, the rules of the chosen set are read over it.',
  },
}

function capital(text: string): string {
  return text.charAt(0).toUpperCase() + text.slice(1)
}
function article(interval: string): string {
  return `${/^[aeiou]/.test(interval) ? 'an' : 'a'} ${interval}`
}
function times(count: number): string {
  return count === 2 ? 'twice' : `${lesson.inWords(count)} times`
}
function ordinalDegree(degree: number): string {
  return ['first', 'second', 'third', 'fourth', 'fifth', 'sixth', 'seventh'][degree - 1] ?? String(degree)
}
