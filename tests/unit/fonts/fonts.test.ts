import { existsSync, readFileSync, statSync } from 'node:fs'
// @ts-expect-error -- ships no types
import { convert } from 'fontverter'
import { fonts } from '@/components/theme/scale'

const html = readFileSync('public/index.html', 'utf8')
const css = readFileSync('public/fonts/fonts.css', 'utf8')
const MAX_PRELOADED_BYTES = 40 * 1024

describe('the shipped fonts', () => {
  const preloaded = [...html.matchAll(/rel="preload" href="([^"]+)"/g)].map(([, href]) => href as string)

  test('what the page preloads is there, is used, and is small', () => {
    expect(preloaded.length).toBeGreaterThan(0)
    let bytes = 0
    for (const href of preloaded) {
      expect(css).toContain(`url(${href})`)
      bytes += statSync(`public${href}`).size
    }
    expect(bytes).toBeLessThan(MAX_PRELOADED_BYTES)
  })

  test('every file the stylesheet names is there', () => {
    const named = [...css.matchAll(/url\(([^)]+)\)/g)].map(([, url]) => url as string)
    expect(named.length).toBeGreaterThan(20)
    for (const url of named) expect(existsSync(`public${url}`)).toBe(true)
  })

  test.each(Object.entries(fonts))('%s has its faces and a stand-in of the same width', (family, stack) => {
    expect(css).toContain(`font-family: ${family};`)
    const standIn = /"([^"]+)"/.exec(stack)?.[1]
    expect(css).toContain(`font-family: '${standIn}'`)
  })

  test.each(['Alegreya', 'AlegreyaSans', 'Bravura'])('the licence of %s travels with it', (name) => {
    expect(readFileSync(`public/fonts/OFL-${name}.txt`, 'utf8')).toContain('SIL OPEN FONT LICENSE')
  })

  test('what is cut from Bravura calls itself by another name, inside and out', async () => {
    const sfnt: Buffer = await convert(readFileSync('public/fonts/accidentals.woff2'), 'sfnt')
    const utf16 = (text: string) => Buffer.from(text, 'utf16le').swap16()
    expect(sfnt.includes(utf16('BicSign'))).toBe(true)
    expect(sfnt.includes(utf16('Bravura'))).toBe(false)
    expect(sfnt.includes('Bravura')).toBe(false)
    expect(css).not.toContain('Bravura')
  })
})
