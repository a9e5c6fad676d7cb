import { lesson } from './lesson'

/** What is projected. */
export const wall = {
  position: { above: 'above', below: 'below' },
  joinBySyllables: 'Join, by the syllables',
  joinAt: (address: string) => `or at ${address}/join`,
  doorClosed: 'The door is closed',
  qrLabel: (code: string) => `Square code that opens the lesson ${code}`,
  offered: (isSpan: boolean) => (isSpan ? 'have offered a gesture' : 'have offered a note'),
  of: (count: number) => `of ${count}`,
  here: 'here',
  nobodyHere: 'Nobody has come in yet.',
  nothingReleased: 'No bar is released yet.',
  andMore: (count: number) => (count === 1 ? 'and one more' : `and ${lesson.inWords(count)} more`),
  moreFindings: (count: number) =>
    count === 1 ? 'One more finding is on the lectern.' : `${count} more findings are on the lectern.`,
  letSound: 'Let this wall sound',
  letSoundHint: 'Sound starts quietly. Set the volume of the room before the first note.',
  soundsNow: 'This wall sounds.',
  ended: 'The lesson has ended.',
  offline: 'Out of touch with the lesson; coming back by itself.',
  linkSpent: 'This wall link has run out or was used up. Ask the teacher for a new one.',
  opening: 'Opening the wall.',
  notHere: 'This screen may not show the lesson. Open the wall from the lectern, or by a wall link.',
  whoOffered: 'Who offered what',
}
