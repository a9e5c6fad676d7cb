import { expectedRange, suggestClefs } from '@/components/lesson/setup/suggest-clefs'
import { formatPitch, pitchOf } from '@/shared/theory/pitch'

const pitches = (text: string) => text.split(' ').map(pitchOf)
const DORIAN = pitches('D4 F4 E4 D4 G4 F4 A4 G4 F4 E4 D4')
const LOW = pitches('D3 F3 E3 D3 G3 F3 A3 G3 F3 E3 D3')

describe('clefs follow the ranges', () => {
  test('over a cantus in D4 to A4 both staves are treble', () => {
    expect(suggestClefs(DORIAN, 'above', 'treble')).toEqual({ cantus: 'treble', line: 'treble' })
  })

  test('under it the line goes to a lower clef', () => {
    expect(suggestClefs(DORIAN, 'below', 'treble').line).not.toBe('treble')
  })

  test('a low cantus leaves the treble clef even when it was written there', () => {
    expect(suggestClefs(LOW, 'above', 'treble').cantus).not.toBe('treble')
  })

  test('a clef that serves as well as the best is kept', () => {
    expect(suggestClefs(LOW, 'above', 'tenor').cantus).toBe('tenor')
    expect(suggestClefs(LOW, 'above', 'bass').cantus).toBe('bass')
  })

  test('the expected range lies on the side of the line', () => {
    const above = expectedRange(DORIAN, 'above')
    expect([above.low, above.high].map(formatPitch)).toEqual(['F4', 'A5'])
    const below = expectedRange(DORIAN, 'below')
    expect([below.low, below.high].map(formatPitch)).toEqual(['D3', 'F4'])
  })
})
