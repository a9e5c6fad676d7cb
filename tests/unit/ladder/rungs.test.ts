import { homeRung, isCrossing, ladderPitches, rungOfLetter } from '@/components/ladder/rungs'
import type { Exercise } from '@/shared/rules'
import { MODES } from '@/shared/theory/mode'
import { comparePitches, formatPitch, pitchOf } from '@/shared/theory/pitch'

const exercise = (position: Exercise['position'], mode: Exercise['mode'] = 'dorian'): Exercise => ({
  cantus: ['D4', 'F4', 'E4', 'D4', 'G4', 'F4', 'A4', 'G4', 'F4', 'E4', 'D4'].map(pitchOf),
  mode,
  final: { letter: 'D', alteration: 0 },
  species: 1,
  position,
})
const names = (position: Exercise['position'], isChromatic = false) =>
  ladderPitches(exercise(position), isChromatic).map(formatPitch)

describe('the ladder', () => {
  test('above, it runs from a third under the cantus to a twelfth over its lowest note, highest first', () => {
    expect(names('above')).toEqual('A5 G5 F5 E5 D5 C#5 C5 B4 A4 G4 F4 E4 D4 C#4 C4 B3'.split(' '))
  })

  test('below, it is the mirror of that', () => {
    const below = names('below')
    expect(below[0]).toBe('C#5')
    expect(below).toContain('C#4')
    expect(below.at(-1)).toBe('D3')
  })

  test('with accidentals every single flat and sharp is at hand', () => {
    const all = names('above', true)
    for (const name of ['Bb4', 'F#5', 'Eb5', 'C#5', 'B4']) expect(all).toContain(name)
    expect(new Set(all).size).toBe(all.length)
  })

  test.each(MODES)('in %s every rung is higher than the next, and no rung comes twice', (mode) => {
    const rungs = ladderPitches(exercise('above', mode), false)
    rungs.slice(1).forEach((pitch, index) => {
      expect(comparePitches(rungs[index] ?? pitch, pitch)).toBeGreaterThan(0)
    })
  })

  test('it opens at the note in hand, else a fifth from the cantus', () => {
    const rungs = ladderPitches(exercise('above'), false)
    expect(formatPitch(rungs[homeRung(rungs, pitchOf('E5'), pitchOf('A4'), 'above')] ?? pitchOf('C0'))).toBe(
      'E5',
    )
    expect(formatPitch(rungs[homeRung(rungs, null, pitchOf('D4'), 'above')] ?? pitchOf('C0'))).toBe('A4')
  })

  test('a letter goes to the nearest rung of that letter, and on to the other one', () => {
    const rungs = ladderPitches(exercise('above'), false)
    const at = rungs.findIndex((pitch) => formatPitch(pitch) === 'D5')
    const c = rungOfLetter(rungs, 'c', at)
    expect(formatPitch(rungs[c ?? 0] ?? pitchOf('C0'))).toBe('C#5')
    expect(formatPitch(rungs[rungOfLetter(rungs, 'c', c ?? 0) ?? 0] ?? pitchOf('C0'))).toBe('C5')
    expect(rungOfLetter(rungs, 'x', 0)).toBeNull()
  })

  test('crossing is being on the wrong side of the cantus', () => {
    expect(isCrossing(pitchOf('C4'), pitchOf('D4'), 'above')).toBe(true)
    expect(isCrossing(pitchOf('D4'), pitchOf('D4'), 'above')).toBe(false)
    expect(isCrossing(pitchOf('E4'), pitchOf('D4'), 'below')).toBe(true)
  })
})
