import fc from 'fast-check'
import { formatMusicXml, MAX_XML_CHARACTERS, parseLineText, parseMusicXml } from '@/shared/interchange'
import { readExercise, type Exercise } from '@/shared/rules'
import type { Line } from '@/shared/theory/note'
import { formatPitch } from '@/shared/theory/pitch'
import { anyExercise, anyLine, SEED, someBars, without } from '../rules/random-score'

const exercise: Exercise = readExercise({
  cantus: 'D4 F4 E4 D4'.split(' '),
  mode: 'dorian',
  final: 'D',
  species: 4,
  position: 'above',
})
const clefs = { cantus: 'alto', line: 'treble' } as const
const lineOf = (text: string): Line => {
  const parsed = parseLineText(text)
  if (!parsed.ok) throw new Error(parsed.reason.message)
  return parsed.value
}
const TIED = lineOf('r:2 A4:2~ | A4:2 D5:2~ | D5:2 C#5:2 | D5:4')
const write = (line: Line | null) => formatMusicXml({ title: 'Tied', exercise, line, clefs })

test('a score with ties, a rest and an accidental comes back as it went', () => {
  const read = parseMusicXml(write(TIED))
  if (!read.ok) throw new Error(read.reason.message)
  expect(read.value.cantus.map(formatPitch)).toEqual(['D4', 'F4', 'E4', 'D4'])
  expect(read.value.line).toEqual(TIED)
  expect(read.value).toMatchObject({ position: 'above', mode: 'dorian' })
})

test('elements of a note stand in the order that the format demands', () => {
  const xml = write(TIED)
  expect(xml).toContain(
    '<note><pitch><step>A</step><octave>4</octave></pitch><duration>960</duration><tie type="start"/><voice>1</voice><type>half</type><notations><tied type="start"/></notations></note>',
  )
  expect(xml).toContain(
    '<note><pitch><step>C</step><alter>1</alter><octave>5</octave></pitch><duration>960</duration><voice>1</voice><type>half</type><accidental>sharp</accidental></note>',
  )
  expect(xml.indexOf('P-line')).toBeLessThan(xml.indexOf('P-cantus'))
})

test('an accidental is written once a bar, and taken back by a natural', () => {
  const xml = write(lineOf('C#5:1 C#5:1 C5:1 C#5:1 | C5:4'))
  expect(xml.match(/<accidental>\w+/g)).toEqual([
    '<accidental>sharp',
    '<accidental>natural',
    '<accidental>sharp',
  ])
})

test('the cantus alone is one part', () => {
  const read = parseMusicXml(write(null))
  expect(read).toMatchObject({ ok: true, value: { line: null } })
})

test('what is unwritten stays unwritten', () => {
  const partial = lineOf('A4:4 | . | B4:2 | .')
  const read = parseMusicXml(write(partial))
  expect(read.ok && read.value.line).toEqual(partial)
})

test('a title with markup in it stays a title', () => {
  const xml = formatMusicXml({ title: '</work><script> & "\u0000', exercise, line: null, clefs })
  expect(xml).toContain('<work-title>&lt;/work&gt;&lt;script&gt; &amp; &quot;</work-title>')
  expect(parseMusicXml(xml).ok).toBe(true)
})

test(`whatever is written is read again (seed ${SEED})`, () => {
  fc.assert(
    fc.property(anyExercise(6), anyLine(6), someBars(6, 5), (any, whole, gone) => {
      const line = without(whole, gone)
      const read = parseMusicXml(formatMusicXml({ title: '', exercise: any, line, clefs }))
      if (!read.ok) throw new Error(read.reason.message)
      expect(read.value.cantus).toEqual(any.cantus)
      expect(read.value.line).toEqual(line)
    }),
    { seed: SEED, numRuns: 200 },
  )
})

/** A score as a notation program writes it: other divisions, layout, directions, parts without telling names. */
const foreign = (upper: string, lower: string) => `<?xml version='1.0' encoding='utf-8'?>
<!DOCTYPE score-partwise PUBLIC "-//Recordare//DTD MusicXML 3.1 Partwise//EN" "http://www.musicxml.org/dtds/partwise.dtd">
<score-partwise version="3.1"><identification><encoding><software>x</software></encoding></identification>
<part-list><score-part id="P1"><part-name>Voice</part-name></score-part><score-part id="P2"><part-name/></score-part></part-list>
<part id="P1">${upper}</part><part id="P2">${lower}</part></score-partwise>`
const attributes =
  '<attributes><divisions>2</divisions><key><fifths>0</fifths><mode>minor</mode></key></attributes>'
const note = (step: string, octave: number, duration: number, more = '') =>
  `<note default-x="80"><pitch><step>${step}</step><octave>${octave}</octave></pitch><duration>${duration}</duration>${more}</note>`
const measure = (content: string) => `<measure number="1"><print/>${content}</measure>`

test('reads what notation programs write; the part with one note a bar is the cantus', () => {
  const upper = measure(attributes + note('A', 3, 8)) + measure(note('B', 3, 8)) + measure(note('A', 3, 8))
  const lower =
    measure(`${attributes}<direction/>${note('A', 2, 4)}${note('B', 2, 4)}`) +
    measure(note('G', 2, 8)) +
    measure(note('A', 2, 8))
  const read = parseMusicXml(foreign(upper, lower))
  if (!read.ok) throw new Error(read.reason.message)
  expect(read.value.cantus.map(formatPitch)).toEqual(['A3', 'B3', 'A3'])
  expect(read.value).toMatchObject({ position: 'below', mode: 'aeolian' })
  expect(read.value.line?.[1]).toEqual([
    { pitch: 'A2', ticks: 960 },
    { pitch: 'B2', ticks: 960 },
  ])
})

const one = (content: string) => foreign(measure(attributes + content), measure(attributes + note('A', 3, 8)))

test.each([
  ['nothing', '', 'not-music'],
  ['no XML', 'D4 F4 E4', 'not-music'],
  ['unclosed', '<score-partwise><part>', 'not-music'],
  ['a page', '<html><body/></html>', 'not-music'],
  ['a timewise score', '<score-timewise/>', 'not-supported'],
  ['no part', '<score-partwise/>', 'not-supported'],
  ['three parts', `<score-partwise>${'<part id="P"/>'.repeat(3)}</score-partwise>`, 'not-supported'],
  ['entities', `<!DOCTYPE a [<!ENTITY b "c">]><score-partwise>&b;</score-partwise>`, 'not-music'],
  ['an entity nobody declared', '<score-partwise>&b;</score-partwise>', 'not-music'],
  ['too large', `<a>${' '.repeat(MAX_XML_CHARACTERS)}</a>`, 'not-music'],
  ['nested beyond reason', '<a>'.repeat(500) + '</a>'.repeat(500), 'not-music'],
  ['a chord', one(note('A', 4, 8, '<chord/>')), 'not-supported'],
  ['two voices', one(`${note('A', 4, 8)}<backup><duration>8</duration></backup>`), 'not-supported'],
  ['a bar too full', one(note('A', 4, 8) + note('A', 4, 8)), 'bar-overfull'],
  ['a length of nothing', one(note('A', 4, 0)), 'off-the-grid'],
  ['a length that is no number', one(note('A', 4, NaN)), 'off-the-grid'],
  ['a note called H', one(note('H', 4, 8)), 'not-a-note'],
  ['a quarter tone', one(note('A', 4, 8).replace('<octave>', '<alter>0.5</alter><octave>')), 'not-a-note'],
])('%s is refused', (_name, xml, code) => {
  const read = parseMusicXml(xml)
  expect(read).toMatchObject({ ok: false, reason: { code } })
  if (!read.ok) expect(read.reason.message).toMatch(/^[A-Z“].*\.$/)
})

test(`no text whatever makes the reader throw (seed ${SEED})`, () => {
  const whole = write(TIED)
  fc.assert(
    fc.property(
      fc.nat(whole.length),
      fc.nat(40),
      fc.constantFrom('', '<', '>', '&', '"', '<!', ']]>', '<?', '\u0000', '<note>', '</part>'),
      (at, cut, put) => {
        const broken = whole.slice(0, at) + put + whole.slice(at + cut)
        expect(typeof parseMusicXml(broken).ok).toBe('boolean')
      },
    ),
    { seed: SEED, numRuns: 800 },
  )
})
