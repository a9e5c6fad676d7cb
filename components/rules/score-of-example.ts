import { railOf } from '@/components/lesson/rail'
import { arcsOf } from '@/components/lesson/score-of'
import { suggestClefs } from '@/components/lesson/setup/suggest-clefs'
import type { ScoreBar, ScoreInput, Tone } from '@/shared/notation/score-input'
import type { PlaybackScore } from '@/shared/playback'
import type { Breach, Finding, Level, ReadExample, RuleId } from '@/shared/rules'
import { isComfortable, type Clef } from '@/shared/theory/clef'
import type { BarNotes } from '@/shared/theory/note'
import { signatureOf } from '@/shared/theory/key'
import { parsePitch, type Pitch } from '@/shared/theory/pitch'

const NONE: ReadonlySet<number> = new Set()

const pitchesIn = (bars: readonly (BarNotes | undefined)[]): readonly Pitch[] =>
  bars.flatMap((notes) =>
    (notes ?? []).flatMap(({ pitch }) => {
      const parsed = parsePitch(pitch ?? '')
      return parsed.ok ? [parsed.value] : []
    }),
  )

/** The clef that was suggested, unless the notes themselves are carried better by the other common one. */
function clefFor(pitches: readonly Pitch[], suggested: Clef): Clef {
  const fits = (clef: Clef) => pitches.every((pitch) => isComfortable(pitch, clef))
  return fits(suggested)
    ? suggested
    : ((['treble', 'bass', 'alto', 'tenor'] as const).find(fits) ?? suggested)
}

/** What a rule says at a level, as findings; nothing when it is off. */
export const findingsOfBreaches = (
  breaches: readonly Breach[],
  ruleId: RuleId,
  level: Level,
): readonly Finding[] =>
  level === 'off'
    ? []
    : breaches.map((breach) => ({
        ...breach,
        ruleId,
        voice: breach.notes[0]?.voice ?? 'line',
        level: breach.isRemark ? 'preference' : level,
      }))

/** The bars of a reading, 1 and onward. */
const barsOf = ({ barCount }: ReadExample): readonly number[] =>
  Array.from({ length: barCount }, (_, index) => index + 1)

/** A cantus whose bars hold one note each, as a score draws it; one in other values is drawn on the line's staff. */
const isInWholes = (example: ReadExample): boolean =>
  barsOf(example).every((bar) => (example.cantusLine[bar]?.length ?? 0) === 1)

/**
 * An example of three voices as two of two: each added line over the same cantus, as a score of two staves can show it.
 * An example of two voices is itself.
 */
export const pairsOfExample = (example: ReadExample): readonly ReadExample[] =>
  Object.keys(example.second).length === 0
    ? [example]
    : [example, { ...example, line: example.second, second: {} }]

/**
 * A rule's small example as a score, what the rule says of it inked in. A level of `off` inks nothing; without a line the
 * cantus stands alone.
 */
export function scoreOfExample(example: ReadExample, breaches: readonly Breach[], level: Level): ScoreInput {
  const { exercise, cantusLine, line } = example
  const bars = barsOf(example)
  const isAlone = Object.keys(line).length === 0
  const drawsCantus = isInWholes(example)
  const shownLine = drawsCantus ? line : cantusLine
  const rail = drawsCantus && !isAlone ? railOf(exercise, line, NONE) : []
  const told = level === 'off' ? [] : breaches
  const tones = new Map<number, Tone>()
  for (const { bars: at, isRemark } of told) {
    const last = at.at(-1)
    if (last !== undefined) tones.set(last, level === 'law' && !isRemark ? 'breach' : 'remark')
  }
  const cantusPitches = pitchesIn(bars.map((bar) => cantusLine[bar]))
  const suggested = suggestClefs(
    exercise.cantus.length > 0 ? exercise.cantus : cantusPitches,
    exercise.position,
    'treble',
  )
  const lineClef = clefFor(pitchesIn(bars.map((bar) => shownLine[bar])), suggested.line)
  return {
    position: exercise.position,
    clefs: {
      cantus: clefFor(cantusPitches, suggested.cantus),
      line: isAlone && drawsCantus ? null : lineClef,
    },
    signature: signatureOf(exercise.mode, exercise.final) ?? 0,
    bars: bars.map((number): ScoreBar => {
      const entry = rail[number - 1]
      const tone = tones.get(number)
      return {
        number,
        state: 'plain',
        isSetAside: false,
        cantus: drawsCantus ? (cantusLine[number]?.[0]?.pitch ?? null) : null,
        line: isAlone && drawsCantus ? null : (shownLine[number] ?? null),
        proposals: [],
        figure: entry?.figure ? { text: entry.figure, tone: tone ?? 'cantus' } : null,
        motion: entry?.motion ?? null,
        label: null,
      }
    }),
    arcs: arcsOf(findingsOfBreaches(breaches, '', level)),
    brackets: [],
  }
}

/** The same example as it is heard. */
export function playbackOfExample(example: ReadExample): PlaybackScore {
  const bars = barsOf(example)
  const isWhole = isInWholes(example)
  return {
    cantus: isWhole ? bars.flatMap((bar) => example.cantusLine[bar]?.[0]?.pitch ?? []) : [],
    line: isWhole ? example.line : example.cantusLine,
    setAside: [],
  }
}
