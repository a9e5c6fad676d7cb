import { valueOf } from '@/shared/theory/note-value'
import { lesson } from './lesson'

type Value = Readonly<{ ticks: number; isRest: boolean }>

function valueSpoken({ ticks, isRest }: Value): string {
  const { value, isDotted } = valueOf(ticks)
  return `${isDotted ? 'dotted ' : ''}${value} ${isRest ? 'rest' : 'note'}`
}

/** The student's desk. */
export const desk = {
  titleReleased: (bars: readonly number[]) => {
    const words = lesson.barsInSentence(bars)
    return words.charAt(0).toUpperCase() + words.slice(1)
  },
  titleNone: 'Nothing to write yet',
  kept: 'kept',
  sending: 'sending',
  waiting: 'waiting for the connection',
  keptSpoken: {
    kept: 'All you wrote is kept.',
    sending: 'What you wrote is on its way.',
    waiting: 'What you wrote is on this device and goes out when the connection is back.',
  },
  here: (count: number) => `${count} here`,
  scoreLabel: (title: string) => `The score of “${title}”`,
  listen: 'Read the score as text',
  pass: {
    previous: (bar: number) => `‹ Bar ${bar}`,
    next: (bar: number) => `Bar ${bar} ›`,
    previousSpoken: (bar: number) => `Back to bar ${bar}`,
    nextSpoken: (bar: number) => `On to bar ${bar}`,
    noneBefore: 'There is no bar before this one',
    noneAfter: 'There is no bar after this one',
    noPrevious: '‹',
    noNext: '›',
  },
  hear: 'Hear',
  stop: 'Stop',
  hearHint: 'Plays on this device, quietly.',
  hearNothing: 'Nothing to hear yet',
  hand: 'Hand',
  handUp: 'Raise hand',
  handDown: 'Lower hand',
  handIsUp: 'Your hand is up.',
  ladder: {
    label: (bar: number) => `Pitches for bar ${bar}, from the highest down`,
    hint: 'Tap a pitch to propose it, tap it again to hear it. Arrow keys move, Enter proposes, Space hears, Backspace takes the note away.',
    letters: 'Letters',
    degrees: 'Degrees',
    naming: 'Name the pitches by',
    accidentals: 'All accidentals',
    accidentalsHint: 'Every note also with a flat and a sharp.',
    erase: 'Take away the note of this bar',
    eraseShort: 'Take away',
    degreeSpoken: (degree: number, alteration: number) =>
      alteration === 0
        ? `degree ${degree}`
        : alteration > 0
          ? `degree ${degree}, raised`
          : `degree ${degree}, lowered`,
    proposed: 'proposed',
    crossing: 'voices cross',
  },
  rhythm: {
    label: 'Rhythm of the bar',
    places: 'Notes of the bar',
    /** `half note, half note held over` */
    rhythmSpoken: (values: readonly Value[], isTiedOver: boolean) =>
      values
        .map((value, i) => valueSpoken(value) + (isTiedOver && i === values.length - 1 ? ' held over' : ''))
        .join(', '),
    placeSpoken: (value: Value, place: number, pitch: string | null) =>
      value.isRest
        ? `${place + 1}: ${valueSpoken(value)}`
        : `${place + 1}: ${valueSpoken(value)}, ${pitch ?? 'not written yet'}`,
    restPrinted: 'rest',
    unwritten: '…',
  },
  rubric: {
    label: 'Findings and the task',
    none: 'No finding on what you have written.',
    hidden: 'The teacher keeps the findings back for now.',
    empty: (bars: readonly number[]) => `Choose a pitch for ${lesson.barsInSentence(bars)}.`,
    more: (count: number) => (count === 1 ? 'One more finding' : `${count} more findings`),
    back: 'Show fewer',
    prompt: 'The task',
  },
  closed: {
    frozenEmpty: 'This bar is closed. It opens when the teacher releases it.',
    frozenAdopted: (pitch: string) => `The class has adopted ${pitch}.`,
    draft: (pitch: string) =>
      `Your ${pitch} is kept here as a draft; it is offered again when the bar is released.`,
    setAside: 'This bar is set aside: the score is read without it.',
    nothingReleased: 'No bar is released. Look at the wall; you can read and hear the score here meanwhile.',
  },
  earlier: (pitch: string) => `The room was cleared for another round. Before, you had ${pitch}.`,
  offerAgain: (pitch: string) => `Propose ${pitch} again`,
  again: 'Propose it again',
  against: (bar: number, cantus: string) => `Bar ${bar}, against ${cantus}`,
  settings: {
    open: 'Settings',
    title: 'This device',
    ground: 'Ground',
    grounds: { system: 'as the device', light: 'light', dark: 'dark' },
  },
  prepared: 'The lesson has not been opened yet. This page comes alive when it is.',
  notMember: 'You have no desk in this lesson. Join it with the syllables on the wall.',
  leave: 'Leave for the home page',
  textTitle: 'The score as text',
}
