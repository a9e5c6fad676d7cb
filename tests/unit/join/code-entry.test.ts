import {
  formatCode,
  isComplete,
  parseTypedCode,
  withoutLast,
  withSyllable,
} from '@/components/join/code-entry'
import { CODE_SYLLABLES, lessonCodeSchema, type Syllable } from '@/shared/api/lessons'

describe('a code is entered syllable by syllable', () => {
  test('six taps make a code the server takes', () => {
    const taps: Syllable[] = ['re', 'fa', 'mi', 'la', 'sol', 'do']
    const entry = taps.reduce(withSyllable, [] as readonly Syllable[])
    expect(isComplete(entry)).toBe(true)
    expect(formatCode(entry)).toBe('re-fa-mi-la-sol-do')
    expect(lessonCodeSchema.safeParse(formatCode(entry)).success).toBe(true)
  })

  test('a seventh tap changes nothing, backspace takes the last away', () => {
    const full: readonly Syllable[] = ['do', 're', 'mi', 'fa', 'sol', 'la']
    expect(withSyllable(full, 'ti')).toEqual(full)
    expect(withoutLast(full)).toEqual(['do', 're', 'mi', 'fa', 'sol'])
    expect(withoutLast([])).toEqual([])
  })
})

describe('typed syllables are read as people type them', () => {
  test.each([
    ['re fa mi la sol do', 're-fa-mi-la-sol-do'],
    ['RE-FA-MI-LA-SOL-DO', 're-fa-mi-la-sol-do'],
    ['refamilasoldo', 're-fa-mi-la-sol-do'],
    ['re · fa · mi', 're-fa-mi'],
    ['ut re mi so si', 'do-re-mi-sol-ti'],
    ['sol la', 'sol-la'],
    ['', ''],
  ])('%j reads as %j', (text, code) => {
    expect(parseTypedCode(text)).toEqual({ ok: true, value: code === '' ? [] : code.split('-') })
  })

  test.each(['re fo', '483921', 'domifas', '<b>do</b>'])(
    '%j is refused with the word that was not understood',
    (text) => {
      expect(parseTypedCode(text)).toMatchObject({ ok: false, reason: { kind: 'not-a-syllable' } })
    },
  )

  test('seven syllables are one too many', () => {
    expect(parseTypedCode('do re mi fa sol la ti')).toEqual({ ok: false, reason: { kind: 'too-many' } })
  })

  test('any run of syllables written together is read back', () => {
    for (const a of CODE_SYLLABLES)
      for (const b of CODE_SYLLABLES)
        for (const c of CODE_SYLLABLES)
          expect(parseTypedCode(a + b + c)).toEqual({ ok: true, value: [a, b, c] })
  })
})
