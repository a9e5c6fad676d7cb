import { z } from 'zod'
import { cite } from '@/shared/rules/cite'
import { breachAt, isDissonance, nameOf, type Sonority } from '@/shared/rules/first-species/sonority'
import type { Rule } from '@/shared/rules/rule'
import { exampleIn } from '@/shared/rules/example-in'
import { figureAt, notesOf } from '@/shared/rules/third-species/figures'
import { quarterOf, THIRD_SPECIES } from '@/shared/rules/third-species/folds'
import { owing, type OwingState, type Verdict } from '@/shared/rules/third-species/owing'
import type { Direction } from '@/shared/theory/interval'

const PARAMS = z.strictObject({
  allowed: z.boolean().default(true).describe('Whether the figure is allowed at all.'),
  inverted: z
    .boolean()
    .default(false)
    .describe('Turned upside down as well: up a step, up a third, back down.'),
  begins: z
    .enum(['first', 'first-or-third', 'anywhere'])
    .default('first')
    .describe('The quarter with which the figure begins.'),
  consonant: z
    .enum(['third', 'odd', 'all-but-second'])
    .default('odd')
    .describe(
      'Which of its notes must be consonant: the third; the first, third and fifth; all but the second.',
    ),
  goesOn: z.boolean().default(true).describe('After its fourth note the line goes on by step the same way.'),
})
type Params = z.infer<typeof PARAMS>

/** The quarters on which the second note may stand. */
const SECOND_NOTE: Readonly<Record<Params['begins'], readonly number[]>> = {
  first: [2],
  'first-or-third': [2, 4],
  anywhere: [2, 3, 4],
}

export const s3Cambiata: Rule<OwingState, Params> = {
  id: 's3-cambiata',
  level: 'law',
  scope: 'pair',
  species: THIRD_SPECIES,
  params: PARAMS,
  ...owing<Params>(
    (moves, now, { params }): Verdict => {
      if (figureAt(moves, now) !== 'cambiata') return null
      const at = moves.before as Sonority
      const notes = notesOf(moves, now)
      const args = { interval: nameOf(at) }
      const tell = (code: string): Verdict => ({ breach: breachAt(code, notes, args) })
      if (!params.allowed) return tell('not-allowed')
      if (moves.entry > 0 && !params.inverted) return tell('inverted')
      if (!SECOND_NOTE[params.begins].includes(quarterOf(at))) return tell('misplaced')
      if (isDissonance(now)) return tell('third-dissonant')
      const isFirstBad = params.consonant !== 'third' && moves.from !== null && isDissonance(moves.from)
      if (isFirstBad) return tell('first-dissonant')
      return { debt: { way: -moves.entry as Direction, steps: params.goesOn ? 2 : 1, notes } }
    },
    (debt, isStep, now, { params }) => {
      const isFourth = debt.notes.length === 3
      const notes = [...debt.notes, now]
      if (!isStep) return breachAt(isFourth ? 'not-turned' : 'not-continued', notes)
      if (!isDissonance(now) || params.consonant === 'third') return null
      if (isFourth && params.consonant === 'odd') return null
      return breachAt(isFourth ? 'fourth-dissonant' : 'fifth-dissonant', notes, { interval: nameOf(now) })
    },
  ),
  explain: {
    title: 'The cambiata',
    statement:
      'A dissonance may leave by a third only in the cambiata: a step down to it, a third down to a consonance, and then steps up.',
    why: 'The third down is made good by turning back at once to the note that was passed over. Singers of the sixteenth century loved the figure, and it is the only leap from a dissonance that they allowed.',
    mends: 'After the third down step up twice, and begin the figure on the first quarter; or go on by step.',
    sources: cite(
      'OMT1',
      'RUSH III',
      'MT21C',
      'DAVID',
      'WIKI',
      'FUX°',
      'JEPP°',
      'EX Figs 55 b3, 56 b3, 87b b2',
    ),
    disagreement:
      'Two sources allow it upside down, one lets it begin on the third quarter too, and they differ on which of its notes must be consonant.',
    right: exampleIn(
      3,
      'D4 C4 D4 E4 D4',
    )('A4:1,F4:1,A4:1,B4:1 C5:1,B4:1,G4:1,A4:1 B4:1,D5:1,B4:1,A4:1 G4:1,A4:1,B4:1,C#5:1 D5'),
    wrong: exampleIn(3, 'D4 F4 E4 D4')(
      'D4:1,E4:1,F4:1,G4:1 C5:1,B4:1,G4:1,F4:1 G4:1,A4:1,B4:1,C#5:1 D5',
      [2],
    ),
    messages: {
      'not-allowed': 'The line leaves a {interval}, a dissonance, by a third; this rule set has no cambiata.',
      inverted: 'The line leaves a {interval}, a dissonance, by a rising third; the cambiata goes down.',
      misplaced: 'The cambiata over the {interval} begins on another quarter than it may.',
      'third-dissonant': 'The third that leaves the {interval} goes to another dissonance.',
      'first-dissonant': 'The cambiata over the {interval} begins on a dissonance.',
      'not-turned': 'After its third the cambiata does not turn back by step.',
      'not-continued': 'After it has turned back the cambiata does not go on by step.',
      'fourth-dissonant': 'The fourth note of the cambiata makes a {interval}, a dissonance.',
      'fifth-dissonant': 'The note after the cambiata makes a {interval}, a dissonance.',
    },
  },
}
