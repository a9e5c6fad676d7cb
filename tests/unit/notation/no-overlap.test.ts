import fc from 'fast-check'
import { layoutScore } from '@/shared/notation/layout-score'
import type { Mark } from '@/shared/notation/mark'
import { isColliding } from '@/shared/notation/placing'
import type {
  ProposalMark,
  ScoreArc,
  ScoreBar,
  ScoreBracket,
  ScoreInput,
} from '@/shared/notation/score-input'
import type { ScoreLayout, ScoreSize } from '@/shared/notation/score-layout'
import { pitchAtPlace } from '@/shared/notation/staff-place'
import { CLEFS, type Clef } from '@/shared/theory/clef'
import type { BarNotes } from '@/shared/theory/note'
import { formatPitch, type Alteration } from '@/shared/theory/pitch'
import { allMarks } from './render-svg'
import { whole } from './sample-scores'

const SEED = 20261201
const WIDTHS_PX = [320, 390, 768, 1366, 1920, 3840]
const SIZES: readonly ScoreSize[] = ['wall', 'page', 'strip']

/** Any written pitch, four ledger lines beyond the staff and now and then twice as far, with any accidental. */
const pitchIn = (clef: Clef): fc.Arbitrary<string> =>
  fc
    .record({
      place: fc.oneof(
        { weight: 5, arbitrary: fc.integer({ min: -3, max: 11 }) },
        { weight: 2, arbitrary: fc.integer({ min: -8, max: 16 }) },
        { weight: 1, arbitrary: fc.integer({ min: -12, max: 20 }) },
      ),
      alteration: fc.constantFrom<Alteration>(0, 0, 0, 0, 1, -1, 2, -2),
    })
    .map(({ place, alteration }) => formatPitch({ ...pitchAtPlace(place, clef), alteration }))

/** Bars of every value there is, the divisions of the species among them and some that are not. */
const TICKS = [
  [1920],
  [960, 960],
  [480, 480, 480, 480],
  [960, 480, 480],
  [480, 480, 960],
  [1440, 480],
  [720, 240, 960],
  [480, 240, 240, 960],
  [960, 480, 240, 240],
  [240, 240, 240, 240, 480, 240, 240],
  [720, 240, 720, 240],
  [960],
  [300, 77, 1000],
] as const

const rhythmIn = (clef: Clef): fc.Arbitrary<BarNotes> =>
  fc.constantFrom<readonly number[]>(...TICKS).chain((ticks) =>
    fc
      .tuple(
        ...ticks.map((length) =>
          fc.record({
            pitch: fc.option(pitchIn(clef), { freq: 8 }),
            ticks: fc.constant(length),
            tied: fc.constantFrom<true | undefined>(undefined, undefined, true),
          }),
        ),
      )
      .chain((notes) =>
        // Now and then what is tied is really held.
        fc
          .boolean()
          .map((isHeld) =>
            isHeld
              ? notes.map((note, i) =>
                  notes[i - 1]?.tied ? { ...note, pitch: notes[i - 1]?.pitch ?? null } : note,
                )
              : notes,
          ),
      ),
  )

const notesIn = (clef: Clef, isMeasured: boolean): fc.Arbitrary<BarNotes> =>
  isMeasured ? rhythmIn(clef) : pitchIn(clef).map(whole)

const identityOf = (notes: BarNotes): string =>
  notes.map(({ pitch, ticks, tied }) => `${pitch}/${ticks}/${tied}`).join()

const proposalsIn = (clef: Clef, isMeasured: boolean): fc.Arbitrary<ProposalMark[]> =>
  fc.uniqueArray(
    fc.record({
      notes: notesIn(clef, isMeasured),
      count: fc.option(fc.oneof(fc.integer({ min: 1, max: 30 }), fc.integer({ min: 1, max: 500 })), {
        freq: 8,
      }),
      tone: fc.constantFrom<ProposalMark['tone']>('line', 'line', 'breach', 'remark'),
    }),
    { maxLength: isMeasured ? 4 : 12, selector: ({ notes }) => identityOf(notes) },
  )

const label = fc.oneof(
  fc.constantFrom(
    're',
    'sol',
    '5',
    'final',
    'Größe, ſehr lang und breit',
    'a label that is far too long for its bar',
  ),
  fc.string({ minLength: 1, maxLength: 24 }),
)

const barIn = (
  cantus: Clef,
  line: Clef | null,
  isMeasured: boolean,
): fc.Arbitrary<Omit<ScoreBar, 'number'>> =>
  fc.record({
    state: fc.constantFrom<ScoreBar['state']>('released', 'frozen', 'plain'),
    isSetAside: fc.integer({ min: 0, max: 5 }).map((n) => n === 0),
    cantus: fc.option(pitchIn(cantus), { freq: 9 }),
    line: line ? fc.option(notesIn(line, isMeasured)) : fc.constant(null),
    proposals: line ? fc.oneof(fc.constant([]), proposalsIn(line, isMeasured)) : fc.constant([]),
    figure: fc.option(
      fc.record({
        text: fc.constantFrom('1', '3', '5', '8', '10', '12', '15'),
        tone: fc.constantFrom('cantus' as const, 'breach' as const),
      }),
    ),
    laterFigures: isMeasured
      ? fc
          .uniqueArray(fc.constantFrom(240, 480, 720, 960, 1440, 1680), { maxLength: 5 })
          .chain((places) =>
            fc
              .tuple(...places.map(() => fc.constantFrom('3', '6', '10', '12')))
              .map((texts) =>
                texts.map((text, i) => ({ tick: places[i] as number, text, tone: 'cantus' as const })),
              ),
          )
      : fc.constant(undefined),
    motion: fc.option(
      fc.constantFrom('contrary' as const, 'oblique' as const, 'similar' as const, 'parallel' as const),
    ),
    label: fc.option(label),
  })

const spanOf = (bars: number) =>
  fc
    .tuple(fc.integer({ min: 1, max: bars }), fc.integer({ min: 1, max: bars }))
    .map(([a, b]) => ({ fromBar: Math.min(a, b), toBar: Math.max(a, b) }))

const scoresOf = (isMeasured: boolean): fc.Arbitrary<ScoreInput> =>
  fc
    .record({
      cantus: fc.constantFrom(...CLEFS),
      line: fc.oneof(
        { weight: 5, arbitrary: fc.constantFrom<Clef | null>(...CLEFS) },
        { weight: 1, arbitrary: fc.constant(null) },
      ),
      count: fc.oneof(fc.integer({ min: 1, max: 14 }), fc.integer({ min: 15, max: 40 })),
    })
    .chain(({ cantus, line, count }) =>
      fc.record({
        position: fc.constantFrom<ScoreInput['position']>('above', 'below'),
        clefs: fc.constant({ cantus, line }),
        signature: fc.integer({ min: -7, max: 7 }),
        isMeasured: fc.constant(isMeasured || undefined),
        bars: fc
          .array(barIn(cantus, line, isMeasured), { minLength: count, maxLength: count })
          .map((bars) => bars.map((bar, i): ScoreBar => ({ ...bar, number: i + 1 }))),
        arcs: fc
          .array(fc.tuple(spanOf(count), fc.constantFrom<ScoreArc['tone']>('breach', 'remark')), {
            maxLength: 8,
          })
          .map((arcs) => arcs.map(([span, tone], i): ScoreArc => ({ ...span, tone, id: String(i) }))),
        brackets: fc
          .array(fc.tuple(spanOf(count), label), { maxLength: 4 })
          .map((brackets) => brackets.map(([span, text]): ScoreBracket => ({ ...span, label: text }))),
      }),
    )

/** Staff lines and the hatching of a folded bar lie under everything. */
const isUnderlay = ({ role }: Mark): boolean => role === 'staff-line' || role === 'hatch'

const told = ({ role, group, box }: Mark): string =>
  `${role} (${group}) ${[box.left, box.top, box.right, box.bottom].map((n) => n.toFixed(1)).join(' ')}`

/** Every pair of marks that stand in each other's way. */
export function collisions(layout: ScoreLayout): readonly string[] {
  const marks = allMarks(layout)
    .filter((mark) => !isUnderlay(mark))
    .sort((a, b) => a.box.left - b.box.left)
  const found: string[] = []
  marks.forEach((mark, i) => {
    for (let j = i + 1; j < marks.length; j++) {
      const other = marks[j] as Mark
      if (other.box.left >= mark.box.right) break
      if (isColliding(mark, other)) found.push(`${told(mark)} × ${told(other)}`)
    }
  })
  return found
}

const outside = (layout: ScoreLayout): readonly string[] =>
  allMarks(layout)
    .filter(
      ({ box }) =>
        box.left < -0.51 ||
        box.top < -0.51 ||
        box.right > layout.widthPx + 0.51 ||
        box.bottom > layout.heightPx + 0.51,
    )
    .map(told)

describe.each([
  ['of whole notes', false],
  ['of every value, with rests and ties', true],
] as const)('an engraved score %s', (_, isMeasured) => {
  const scores = scoresOf(isMeasured)

  test.each(SIZES)('on a %s, at any width, has nothing on top of anything, and nothing cut off', (size) => {
    fc.assert(
      fc.property(scores, (input) => {
        for (const widthPx of WIDTHS_PX) {
          const layout = layoutScore(input, { size, widthPx, handBar: 1 })
          expect({ widthPx, found: collisions(layout).slice(0, 5) }).toEqual({ widthPx, found: [] })
          expect({ widthPx, found: outside(layout).slice(0, 5) }).toEqual({ widthPx, found: [] })
          if (size !== 'strip' && !isMeasured) expect(layout.widthPx).toBe(widthPx)
        }
      }),
      // A rhythmic score takes minutes to shrink.
      { seed: SEED, numRuns: isMeasured ? 30 : 60, endOnFailure: isMeasured },
    )
  })

  test('small, in a row of proposals, has nothing on top of anything, and nothing cut off', () => {
    fc.assert(
      fc.property(scores, (input) => {
        const few = { ...input, bars: input.bars.slice(0, isMeasured ? 2 : 4) }
        const layout = layoutScore(few, { size: 'mini', widthPx: 420 })
        expect(collisions(layout)).toEqual([])
        expect(outside(layout)).toEqual([])
      }),
      { seed: SEED, numRuns: 100 },
    )
  })
})

describe('the search for overlaps', () => {
  test('sees two notes put on one place', () => {
    const layout = layoutScore(
      {
        position: 'above',
        clefs: { cantus: 'alto', line: 'treble' },
        signature: 0,
        bars: [],
        arcs: [],
        brackets: [],
      },
      { size: 'page', widthPx: 400 },
    )
    const clef = layout.systems[0]?.prefix.find(({ role }) => role === 'clef') as Mark
    const broken = {
      ...layout,
      systems: layout.systems.map((system) => ({ ...system, spans: [{ ...clef, group: 'other' }] })),
    }
    expect(collisions(broken)).toHaveLength(1)
  })
})
