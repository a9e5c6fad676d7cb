import { createChecker, findPreset, type Exercise, type RuleSet } from '@/shared/rules'
import { createLadder, ladderChoices } from '@/shared/rules/ladder-choices'
import { WHOLE_TICKS } from '@/shared/theory/duration'
import type { Line } from '@/shared/theory/note'
import { formatPitch, pitchClassOf, pitchOf } from '@/shared/theory/pitch'
import { FUX_CANTI } from '@/tests/fixtures/canti-firmi'

const fuxMann = findPreset('fux-mann') as RuleSet

function exerciseOn(mode: Exercise['mode'], position: Exercise['position']): Exercise {
  const found = FUX_CANTI.find((one) => one.mode === mode)
  if (!found) throw new Error(`No cantus in ${mode}`)
  const cantus = found.notes.split(' ').map(pitchOf)
  return { cantus, mode, final: pitchClassOf(found.final), species: 1, position }
}

const lineOf = (text: string): Line =>
  Object.fromEntries(
    text
      .split(' ')
      .map((name, index) => [index + 1, [{ pitch: name, ticks: WHOLE_TICKS }]] as const)
      .filter(([, [note]]) => note?.pitch !== '.'),
  )

const dorian = exerciseOn('dorian', 'above')

describe('ladderChoices', () => {
  test('offers the mode from the highest note down, within reach of the cantus', () => {
    const names = ladderChoices(dorian, {}, 1, fuxMann).map(({ pitch }) => formatPitch(pitch))
    expect(names).toEqual([
      'A5',
      'G5',
      'F5',
      'E5',
      'D5',
      'C5',
      'B4',
      'Bb4',
      'A4',
      'G4',
      'F4',
      'E4',
      'D4',
      'C4',
      'B3',
      'Bb3',
    ])
  })

  test('offers the raised seventh in the last bar but one, and the raised sixth before it', () => {
    const at = (mode: Exercise['mode'], bar: number, setAside?: ReadonlySet<number>) =>
      ladderChoices(exerciseOn(mode, 'above'), {}, bar, fuxMann, setAside)
        .map(({ pitch }) => formatPitch(pitch))
        .filter((name) => name.includes('#'))
    expect(at('dorian', 10)).toEqual(['C#5', 'C#4'])
    expect(at('dorian', 9)).toEqual([])
    expect(at('dorian', 9, new Set([10]))).toEqual(['C#5', 'C#4'])
    expect(at('aeolian', 11)).toEqual(['G#4', 'G#3'])
    expect(at('aeolian', 10)).toEqual(['F#5', 'F#4', 'F#3'])
    expect(at('phrygian', 9)).toEqual([])
  })

  test('names the interval, its figure and whether it is consonant, and the motion into it', () => {
    const choices = ladderChoices(dorian, lineOf('A4 A4'), 3, fuxMann)
    const on = (name: string) => choices.find(({ pitch }) => formatPitch(pitch) === name)
    expect(on('G4')).toMatchObject({
      degree: 4,
      alteration: 0,
      interval: { name: 'minor third', figure: '3', isConsonant: true },
      motion: 'parallel',
    })
    expect(on('A4')).toMatchObject({
      interval: { name: 'perfect fourth', isConsonant: false },
      motion: 'oblique',
    })
    expect(on('C5')).toMatchObject({ interval: { name: 'minor sixth', figure: '6' }, motion: 'contrary' })
    expect(on('A4')?.worst).toBe('law')
    expect(on('C5')?.worst).toBeNull()
  })

  test('knows no motion in the first bar, nor after a bar that is not written', () => {
    expect(ladderChoices(dorian, lineOf('A4'), 1, fuxMann).every(({ motion }) => motion === null)).toBe(true)
    expect(ladderChoices(dorian, lineOf('A4'), 3, fuxMann).every(({ motion }) => motion === null)).toBe(true)
    const aside = ladderChoices(dorian, lineOf('A4'), 3, fuxMann, new Set([2]))
    expect(aside.some(({ motion }) => motion === 'contrary')).toBe(true)
  })

  test('says of every pitch what the checker says of the line with it written', () => {
    const texts = [
      'A4 A4 G4 A4 B4 C5 C5 B4 D5 C#5 D5',
      'A4 A4 . A4 . C5',
      '. . . . . . . . . C#5 D5',
      'F4 G4 A4 . B4',
    ]
    for (const position of ['above', 'below'] as const) {
      const exercise = exerciseOn('dorian', position)
      const ladder = createLadder(exercise, fuxMann)
      const checker = createChecker(exercise, fuxMann)
      for (const line of texts.map(lineOf)) {
        for (const setAside of [new Set<number>(), new Set([4, 5])]) {
          for (const bar of [1, 2, 3, 6, 9, 10, 11]) {
            for (const { pitch, findings } of ladder(line, bar, setAside)) {
              const written: Line = { ...line, [bar]: [{ pitch: formatPitch(pitch), ticks: WHOLE_TICKS }] }
              const all = checker.checkLine(written, setAside)
              expect(findings).toEqual(all.filter(({ bars }) => bars.includes(bar)))
            }
          }
        }
      }
    }
  })

  test('offers a bar that is set aside without judging it, and nothing beyond the cantus', () => {
    const choices = ladderChoices(dorian, lineOf('A4 A4'), 3, fuxMann, new Set([3]))
    expect(choices.length).toBeGreaterThan(0)
    expect(choices.every(({ findings }) => findings.length === 0)).toBe(true)
    expect(ladderChoices(dorian, {}, 12, fuxMann)).toEqual([])
  })
})
