import { EMPTY_DRAFT } from '@/components/cantus/draft'
import { finalsOf, judgeDraft } from '@/components/cantus/judge-draft'

const judge = (text: string, more = {}) => judgeDraft({ ...EMPTY_DRAFT, text, ...more })

describe('a cantus while it is written', () => {
  test.each([
    ['D4 F4 E4 D4 G4 F4 A4 G4 F4 E4 D4', 'D', 'dorian', 0],
    // One flat makes the sixth degree minor: Aeolian on D.
    ['D4 A4 Bb4 A4 F4 E4 D4', 'D', 'aeolian', -1],
    ['E4 C4 D4 C4 A3 A4 G4 E4 F4 E4', 'E', 'phrygian', 0],
    ['A4 B4 C#5 B4 A4', 'A', 'mixolydian', 2],
  ])('%s follows its notes to a final and a mode', (text, letter, mode, signature) => {
    const judged = judge(text)
    expect(judged.final.letter).toBe(letter)
    expect(judged.mode).toBe(mode)
    expect(judged.signature).toBe(signature)
    expect(judged.problems).toEqual([])
  })

  test('says what keeps it from being used, and where', () => {
    expect(judge('D4 E4').problems.map(({ code }) => code)).toContain('too-short')
    expect(judge(Array(41).fill('D4').join(' ')).problems.map(({ code }) => code)).toContain('too-long')
    expect(judge('D4 D2 D4').problems).toContainEqual({ code: 'out-of-clef-range', bars: [2] })
    expect(judge('D4 F4 E4', { final: 'D' }).problems).toContainEqual({ code: 'wrong-final', bars: [3] })
  })

  test('a word that is no note leaves the others analysed and nothing judged', () => {
    const judged = judge('D4 oops F4 E4 D4')
    expect(judged.notes).toBeNull()
    expect(judged.findings).toEqual([])
    expect(judged.analysis?.length).toBe(4)
  })

  test('the rules of the chosen preset speak of it', () => {
    // Ends by a leap of a fourth: no cadence any of the sources knows.
    const findings = judge('D4 F4 E4 D4 G4 F4 A4 G4 F4 A4 D4').findings
    expect(findings.length).toBeGreaterThan(0)
    for (const { bars } of findings) expect(bars.every((bar) => bar >= 1 && bar <= 11)).toBe(true)
  })

  test('offers only finals whose signature can be written', () => {
    expect(finalsOf('dorian')).toContain('D')
    expect(finalsOf('lydian')).not.toContain('D#')
    expect(finalsOf('ionian')).not.toContain('G#')
  })
})
