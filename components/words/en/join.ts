/** Coming into a lesson by its code. */
export const join = {
  title: 'Join the lesson',
  lead: 'Tap the syllables on the wall.',
  leadTyped: 'Type the syllables on the wall.',
  staffLabel: 'The seven syllables, from do up to ti',
  syllableHint: (syllable: string) => `${syllable}, add to the code`,
  enteredLabel: (syllables: readonly string[]) =>
    syllables.length === 0
      ? 'Nothing entered yet. A code has six syllables.'
      : `Entered: ${syllables.join(', ')}. ${6 - syllables.length} to go.`,
  takeBack: 'Take the last one back',
  typeInstead: 'Type them instead',
  tapInstead: 'Tap them instead',
  typedLabel: 'Syllables of the lesson',
  typedHint: 'Six of do, re, mi, fa, sol, la and ti, with spaces between.',
  typedGo: 'Find the lesson',
  scan: 'Or point your phone’s camera at the square on the wall: it opens the lesson by itself.',
  soundOn: 'Let them sound',
  soundOff: 'Silence them',
  looking: 'Looking for the lesson.',
  nameTitle: 'Your name',
  nameLead: (title: string) => `You are joining “${title}”.`,
  nameLabel: 'Name',
  nameHint: 'The teacher sees it. The class does not, unless the teacher shows names.',
  nameGo: 'Join the lesson',
  kept: 'What you propose in this lesson is kept with the name you give here, for as long as the school keeps the lesson. Ask the teacher to have it removed.',
  otherCode: 'Another code',
  entering: 'Opening the lesson.',
  problems: {
    notASyllable: (text: string) => `“${text}” is not one of do, re, mi, fa, sol, la and ti.`,
    tooMany: 'A code has six syllables; these are more.',
    tooFew: (missing: number) =>
      missing === 1 ? 'One syllable is missing.' : `${missing} syllables are missing; a code has six.`,
    unknown:
      'No open lesson has these syllables. Compare them with the wall, or ask whether the door is closed.',
    doorClosed: 'The teacher has closed the door of this lesson.',
    full: 'The lesson is full. Ask the teacher to make room.',
    tooManyTries: (seconds: number | null) =>
      seconds === null
        ? 'Too many tries from here. Wait a little, then try again.'
        : seconds < 90
          ? `Too many tries from here. Try again in ${seconds} seconds.`
          : `Too many tries from here. Try again in ${Math.ceil(seconds / 60)} minutes.`,
    nameEmpty: 'Give a name, so that the teacher knows who is writing.',
    nameTooLong: (limit: number) => `At most ${limit} characters.`,
    nameHidden: 'The name holds characters that cannot be seen. Type it again.',
    nameRefused: 'The name was not taken. Use letters, at most sixty of them.',
    offline: 'The lesson cannot be reached. Check the connection, then try again.',
    other: 'That did not work. Try again in a moment.',
  },
}
