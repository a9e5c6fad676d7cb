import { describeBar } from '@/components/score/describe-bar'
import { lesson } from '@/components/words/en/lesson'
import { score } from '@/components/words/en/score'
import { barOf, proposal, whole } from './sample-scores'

const words = { lesson, score }

describe('a bar as a screen reader tells it', () => {
  test('names the notes, the interval, the motion and how the bar stands', () => {
    const bar = barOf(4, { cantus: 'F4', line: whole('A5'), motion: 'contrary', state: 'released' })
    expect(describeBar(bar, words)).toBe('bar 4, cantus F, line A, tenth, contrary motion, released')
  })

  test('says accidentals in words, and an interval below as one above', () => {
    const bar = barOf(2, { cantus: 'F#4', line: whole('Bb3'), state: 'frozen' })
    expect(describeBar(bar, words)).toBe('bar 2, cantus F sharp, line B flat, fifth, frozen')
  })

  test('counts what is proposed', () => {
    const bar = barOf(6, { state: 'released', proposals: [proposal('C5', 11), proposal('A4', 6)] })
    expect(describeBar(bar, words)).toBe('bar 6, cantus D, C by 11 and A by 6, released')
    expect(describeBar(barOf(6, { state: 'released', proposals: [proposal('C5', null)] }), words)).toBe(
      'bar 6, cantus D, C proposed, released',
    )
  })

  test('says only that a bar is set aside', () => {
    expect(describeBar(barOf(3, { isSetAside: true }), words)).toBe('bar 3, set aside')
  })

  test('tells lengths where notes have several, and rests and ties', () => {
    const line = [
      { pitch: null, ticks: 960 },
      { pitch: 'A4', ticks: 720 },
      { pitch: 'C#5', ticks: 240, tied: true as const },
    ]
    expect(describeBar(barOf(1, { line }), words)).toBe(
      'bar 1, cantus D, line half rest dotted quarter A eighth C sharp held over, frozen',
    )
  })
})
