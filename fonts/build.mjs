/**
 * Cuts the shipped fonts down to what a phone needs and writes them, with their licences and one stylesheet, to
 * `public/fonts/`. Run `node fonts/build.mjs` after changing a range or a family; the output is committed.
 *
 * Alegreya and Alegreya Sans declare no Reserved Font Name, so their subsets may keep their names. Bravura does, so the
 * three accidentals taken from it carry another name inside and out (SIL OFL 1.1, condition 3).
 */
import { copyFile, mkdir, readFile, writeFile } from 'node:fs/promises'
import { createRequire } from 'node:module'
import { dirname, join } from 'node:path'
import { fileURLToPath } from 'node:url'
import fontverter from 'fontverter'
import subsetFont from 'subset-font'

const here = dirname(fileURLToPath(import.meta.url))
const out = join(here, '..', 'public', 'fonts')
const require = createRequire(import.meta.url)
const packageOf = (name) => dirname(require.resolve(`${name}/package.json`))

/** The family names that the interface asks for, one a cut, so that a style names exactly one file. */
const CUTS = [
  {
    family: 'Alegreya',
    file: 'alegreya-400',
    from: 'alegreya/400Regular/Alegreya_400Regular.ttf',
    like: 'serif',
  },
  {
    family: 'AlegreyaItalic',
    file: 'alegreya-400-italic',
    from: 'alegreya/400Regular_Italic/Alegreya_400Regular_Italic.ttf',
    like: 'serif',
  },
  {
    family: 'AlegreyaMedium',
    file: 'alegreya-500',
    from: 'alegreya/500Medium/Alegreya_500Medium.ttf',
    like: 'serif',
  },
  {
    family: 'AlegreyaSans',
    file: 'alegreya-sans-400',
    from: 'alegreya-sans/400Regular/AlegreyaSans_400Regular.ttf',
    like: 'sans',
  },
  {
    family: 'AlegreyaSansMedium',
    file: 'alegreya-sans-500',
    from: 'alegreya-sans/500Medium/AlegreyaSans_500Medium.ttf',
    like: 'sans',
  },
  {
    family: 'AlegreyaSansBold',
    file: 'alegreya-sans-700',
    from: 'alegreya-sans/700Bold/AlegreyaSans_700Bold.ttf',
    like: 'sans',
  },
]

/** Only `base` is asked for by every page; a browser fetches the others when a name needs them. */
const RANGES = {
  base: [
    '20-7E',
    'A0',
    'A9',
    'AB',
    'B7',
    'BB',
    'D7',
    '2013-2014',
    '2018-201A',
    '201C-201E',
    '2020-2022',
    '2026',
    '2032-2033',
  ].concat(['2039-203A', '20AC', '2190-2193', '2212', '2260']),
  latin: [
    'A1-A8',
    'AA',
    'AC-B6',
    'B8-BA',
    'BC-D6',
    'D8-24F',
    '259',
    '2B0-2FF',
    '300-345',
    '1E00-1EFF',
    '2070-209F',
    '2116',
    '2122',
  ],
  greek: ['370-3FF', '1F00-1FFF'],
  cyrillic: ['400-52F'],
}
const FEATURES = ['kern', 'liga', 'mark', 'mkmk', 'ccmp', 'locl', 'lnum', 'onum', 'pnum', 'tnum']

/** Local faces that stand in until ours arrive, scaled to the same run of text so that nothing moves. */
const STAND_INS = {
  serif: { family: 'Alegreya Stand-in', local: ['Times New Roman', 'Liberation Serif', 'Tinos'] },
  sans: { family: 'Alegreya Sans Stand-in', local: ['Arial', 'Liberation Sans', 'Arimo'] },
}
/** Measured in Chromium over the interface's own sentences: our width over the stand-in's. */
const STAND_IN_WIDTH = { serif: '100.5%', sans: '84.3%' }

const textOf = (ranges) =>
  ranges
    .flatMap((range) => {
      const [from, to = from] = range.split('-').map((hex) => Number.parseInt(hex, 16))
      return Array.from({ length: to - from + 1 }, (_, place) => String.fromCodePoint(from + place))
    })
    .join('')
const cssRange = (ranges) => ranges.map((range) => `U+${range}`).join(', ')

const face = ({ family, url, range }) =>
  `@font-face { font-family: ${family}; src: url(${url}) format('woff2'); font-display: swap; unicode-range: ${range}; }`

/** With the height of a text face: a music font's own is four times as much, and would push lines apart. */
const accidentalsFace = (family) =>
  face({ family, url: '/fonts/accidentals.woff2', range: cssRange(['266D-266F']) }).replace(
    ' }',
    ' ascent-override: 90%; descent-override: 25%; line-gap-override: 0%; }',
  )

/**
 * In a music font an accidental is centred on its staff line; in a text it must stand on the line of writing, with air on
 * both sides. The first move of each outline carries the rest, so that raising it raises the whole: its operands are
 * replaced by others of the same length (Type 2 charstrings, Adobe Technical Note 5177). Units are thousandths of an em.
 */
const RAISED = [
  { sign: 'flat', was: [34, 151, 251, 62], is: [34, 191, 247, 2], advance: [226, 300] }, // 12 −170 to 52 110
  {
    sign: 'natural',
    was: [251, 54, 247, 33, 247, 73, 21],
    is: [251, 54, 247, 73, 248, 117, 21],
    advance: [169, 250],
  },
  { sign: 'sharp', was: [57, 247, 129, 247, 10, 21], is: [57, 247, 169, 248, 54, 21], advance: [249, 320] },
]

function raiseSigns(font) {
  const tableAt = (tag) => font.readUInt32BE(font.indexOf(tag, 12, 'latin1') + 8)
  const hmtx = tableAt('hmtx')
  const cff = tableAt('CFF ')
  RAISED.forEach(({ sign, was, is, advance }, index) => {
    const at = font.indexOf(Buffer.from(was), cff)
    const widthAt = hmtx + 4 * (index + 1) // After the glyph for what is missing.
    const isKnown =
      at > 0 && font.indexOf(Buffer.from(was), at + 1) < 0 && font.readUInt16BE(widthAt) === advance[0]
    if (!isKnown) throw new Error(`The outline of the ${sign} is not the one this was written for.`)
    Buffer.from(is).copy(font, at)
    font.writeUInt16BE(advance[1], widthAt)
  })
}

async function cutAccidentals() {
  const source = await readFile(join(packageOf('@vexflow-fonts/bravura'), 'bravura.otf'))
  const cut = await subsetFont(source, '\u266d\u266e\u266f', {
    targetFormat: 'sfnt',
    keepFeatures: [],
    noHinting: true,
    dropTables: ['GPOS', 'GSUB', 'GDEF'],
  })
  // Same length, so that no table moves: once as bytes, once as the UTF-16 of the name table.
  const renamed = Buffer.from(cut)
  for (const encoding of ['latin1', 'utf16be']) {
    const encode = (text) =>
      encoding === 'latin1' ? Buffer.from(text, 'latin1') : Buffer.from(text, 'utf16le').swap16()
    const [reserved, ours] = [encode('Bravura'), encode('BicSign')]
    for (let at = renamed.indexOf(reserved); at >= 0; at = renamed.indexOf(reserved, at))
      ours.copy(renamed, at)
  }
  raiseSigns(renamed)
  return fontverter.convert(renamed, 'woff2')
}

await mkdir(out, { recursive: true })
const css = ['/* Written by fonts/build.mjs. */']
let total = 0
const keep = async (name, bytes) => {
  await writeFile(join(out, name), bytes)
  total += bytes.length
  console.log(`${String(bytes.length).padStart(7)}  ${name}`)
}

await keep('accidentals.woff2', await cutAccidentals())
for (const { family, file, from } of CUTS) {
  const source = await readFile(join(packageOf('@expo-google-fonts/alegreya'), '..', from))
  for (const [rangeName, ranges] of Object.entries(RANGES)) {
    const name = `${file}.${rangeName}.woff2`
    const options = { targetFormat: 'woff2', keepFeatures: FEATURES, noHinting: true }
    await keep(name, await subsetFont(source, textOf(ranges), options))
    css.push(face({ family, url: `/fonts/${name}`, range: cssRange(ranges) }))
  }
  css.push(accidentalsFace(family))
}
for (const [like, { family, local }] of Object.entries(STAND_INS)) {
  const src = local.map((name) => `local('${name}')`).join(', ')
  css.push(`@font-face { font-family: '${family}'; src: ${src}; size-adjust: ${STAND_IN_WIDTH[like]}; }`)
}
await writeFile(join(out, 'fonts.css'), css.join('\n') + '\n')
await copyFile(join(packageOf('@expo-google-fonts/alegreya'), 'LICENSE_FONT'), join(out, 'OFL-Alegreya.txt'))
await copyFile(
  join(packageOf('@expo-google-fonts/alegreya-sans'), 'LICENSE_FONT'),
  join(out, 'OFL-AlegreyaSans.txt'),
)
await copyFile(join(packageOf('@vexflow-fonts/bravura'), 'LICENSE.txt'), join(out, 'OFL-Bravura.txt'))
console.log(`${String(total).padStart(7)}  in all`)
