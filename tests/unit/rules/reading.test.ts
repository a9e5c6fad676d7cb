import { isWhollyWritten, readCantus, readMoments, readVoice } from '@/shared/rules/reading'
import { readExample } from '@/shared/rules/example'
import type { Moment } from '@/shared/rules/rule'
import { formatPitch, pitchOf } from '@/shared/theory/pitch'

const score = (cantus: string, line: string, setAside: readonly number[] = []) => {
  const read = readExample({ cantus, line, mode: 'dorian', final: 'D', breaches: [] })
  return {
    pair: readMoments(read.exercise, read.line, new Set(setAside)),
    solo: readVoice(read.barCount, read.line, new Set(setAside)),
  }
}

/** A moment in short: bar, place in quarters, note, length in quarters, `~` where it is held. */
const short = ({ bar, place, note, ticks, isStruck }: Moment): string => {
  const name = note === null ? '?' : note === 'rest' ? 'r' : formatPitch(note)
  return `${bar}.${place / 480} ${name}:${ticks / 480}${isStruck ? '' : '~'}`
}

test('first species has one moment a bar, with the cantus against it', () => {
  const { pair } = score('D4 F4 E4 D4', 'A4 A4 . D5')
  expect(pair.map(short)).toEqual(['1.0 A4:4', '2.0 A4:4', '3.0 ?:0', '4.0 D5:4'])
  expect(pair.map(({ other }) => other && formatPitch(other))).toEqual(['D4', 'F4', 'E4', 'D4'])
  expect(
    pair.map(({ index, isFirst, isPenultimate, isLast }) => [index, isFirst, isPenultimate, isLast]),
  ).toEqual([
    [0, true, false, false],
    [1, false, false, false],
    [2, false, true, false],
    [3, false, false, true],
  ])
  expect(isWhollyWritten(pair)).toBe(false)
})

test('a tie makes a moment held in both voices’ reading, and one note in the line’s own', () => {
  const { pair, solo } = score('D4 F4 E4 D4', 'r:2,A4:2~ A4:2,G4:2~ G4:1,F4:1,E4:2 D4')
  expect(pair.map(short)).toEqual([
    '1.0 r:2',
    '1.2 A4:4',
    '2.0 A4:2~',
    '2.2 G4:3',
    '3.0 G4:1~',
    '3.1 F4:1',
    '3.2 E4:2',
    '4.0 D4:4',
  ])
  expect(solo.map(short)).toEqual(['1.0 r:2', '1.2 A4:4', '2.2 G4:3', '3.1 F4:1', '3.2 E4:2', '4.0 D4:4'])
  expect(solo.map(({ other }) => other)).toEqual([null, null, null, null, null, null])
})

test('a bar that is not filled up ends in an unwritten moment', () => {
  const { pair } = score('D4 F4 D4', 'A4:2 A4 D5')
  expect(pair.map(short)).toEqual(['1.0 A4:2', '1.2 ?:0', '2.0 A4:4', '3.0 D5:4'])
})

test('a note longer than its bar is heard in the empty bars after it, as far as it reaches', () => {
  const { exercise } = readExample({ cantus: 'D4 F4 E4 D4', mode: 'dorian', final: 'D', breaches: [] })
  const long = {
    1: [
      { pitch: null, ticks: 960 },
      { pitch: 'A4', ticks: 3840 },
    ],
    4: [{ pitch: 'D5', ticks: 1920 }],
  }
  expect(readMoments(exercise, long).map(short)).toEqual([
    '1.0 r:2',
    '1.2 A4:8',
    '2.0 A4:6~',
    '3.0 A4:2~',
    '3.2 ?:0',
    '4.0 D5:4',
  ])
  expect(readVoice(4, long).map(short)).toEqual(['1.0 r:2', '1.2 A4:8', '3.2 ?:0', '4.0 D5:4'])
  const kept = readMoments(exercise, { ...long, 2: [{ pitch: 'B4', ticks: 1920 }] })
  expect(kept.map(short).slice(0, 4)).toEqual(['1.0 r:2', '1.2 A4:8', '2.0 B4:4', '3.0 ?:0'])
})

test('bars set aside are not read, and a tie out of one is not heard', () => {
  const { pair, solo } = score('D4 F4 E4 D4', 'A4 D5:2,A4:2~ A4:2,G4:2 D4', [2])
  expect(pair.map(short)).toEqual(['1.0 A4:4', '3.0 A4:2', '3.2 G4:2', '4.0 D4:4'])
  expect(solo.map(short)).toEqual(['1.0 A4:4', '3.0 A4:2', '3.2 G4:2', '4.0 D4:4'])
  expect(pair.map(({ isFirst, isLast }) => [isFirst, isLast]).at(-1)).toEqual([false, true])
})

test('a tie to another pitch, or over a gap, holds nothing', () => {
  expect(score('D4 F4 D4', 'A4~ B4 D5').pair.map(short)).toEqual(['1.0 A4:4', '2.0 B4:4', '3.0 D5:4'])
  expect(score('D4 F4 D4', 'A4~ . A4').pair.map(short)).toEqual(['1.0 A4:4', '2.0 ?:0', '3.0 A4:4'])
})

test('what is no pitch counts as unwritten', () => {
  const { exercise } = readExample({ cantus: 'D4 F4 D4', mode: 'dorian', final: 'D', breaches: [] })
  const moments = readMoments(exercise, { 1: [{ pitch: 'H4', ticks: 1920 }], 2: [] })
  expect(moments.map(({ note }) => note)).toEqual([null, null, null])
})

test('the cantus is read as one whole note a bar', () => {
  expect(readCantus(['D4', 'F4'].map(pitchOf)).map(short)).toEqual(['1.0 D4:4', '2.0 F4:4'])
})
