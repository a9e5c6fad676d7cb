import {
  changedInForm,
  exerciseOf,
  setupProblems,
  startForm,
  withCantus,
  withFinal,
  withLevel,
  withParam,
  withPosition,
  withPreset,
} from '@/components/lesson/setup/setup-form'
import { doubtsOf } from '@/components/lesson/setup/soundness'
import { paramFields, parseParam, formatParam } from '@/components/rule-sets/params-fields'
import type { Cantus } from '@/shared/api/cantus'
import { lessons } from '@/shared/api/lessons'
import { findPreset, PRESETS, RULES, type RuleSet } from '@/shared/rules'
import { exerciseSchema } from '@/shared/wire/documents'

const DORIAN: Cantus = {
  id: 'cantus-d',
  title: 'Dorian',
  notes: 'D4 F4 E4 D4 G4 F4 A4 G4 F4 E4 D4'.split(' '),
  mode: 'dorian',
  final: 'D',
  clef: 'alto',
  source: 'J. J. Fux, Gradus ad Parnassum, 1725',
  origin: 'published',
  courseId: null,
  isMine: false,
}
const preset = findPreset('fux-mann') as RuleSet
const titleOf = (position: string, final: string) => `A voice ${position} the cantus in ${final}`
const filled = () => withCantus(startForm(preset, 'Look at the melody.'), DORIAN, titleOf)

describe('setting up a lesson', () => {
  test('a melody brings mode, final, clefs and title with it', () => {
    const form = filled()
    expect(form).toMatchObject({ mode: 'dorian', final: 'D', title: 'A voice above the cantus in D' })
    expect(setupProblems(form)).toEqual([])
    expect(exerciseOf(form)).toMatchObject({ signature: 0, species: 1, position: 'above' })
  })

  test('what it makes is what the server takes, for every preset', () => {
    for (const set of PRESETS) {
      const exercise = exerciseOf(withPreset(filled(), set))
      expect(exerciseSchema.safeParse(exercise).success).toBe(true)
    }
    expect(
      lessons.create.body?.safeParse({
        title: filled().title,
        exercise: exerciseOf(filled()),
        stage: {
          prompt: '',
          showsFindings: true,
          showsSpread: true,
          showsNames: false,
          showsWays: 'nobody',
        },
      }).success,
    ).toBe(true)
  })

  test('title and clefs follow until they are written by hand', () => {
    const below = withPosition(filled(), 'below', titleOf)
    expect(below.title).toBe('A voice below the cantus in D')
    expect(below.clefs.line).not.toBe(filled().clefs.line)
    const own = { ...filled(), title: 'My own', isTitleTouched: true, isClefsTouched: true }
    expect(withPosition(own, 'below', titleOf)).toMatchObject({ title: 'My own', clefs: own.clefs })
  })

  test('each thing that is missing is named', () => {
    expect(setupProblems(startForm(preset, ''))).toEqual(['noCantus', 'titleEmpty'])
    expect(setupProblems({ ...filled(), title: 'x'.repeat(200) })).toEqual(['titleTooLong'])
    expect(setupProblems({ ...filled(), title: 'a\u202Eb' })).toEqual(['titleHidden'])
    expect(setupProblems({ ...filled(), prompt: 'x'.repeat(400) })).toEqual(['promptTooLong'])
    expect(setupProblems(withFinal({ ...filled(), mode: 'phrygian' }, 'Eb', titleOf))).toEqual([])
    expect(setupProblems(withFinal({ ...filled(), mode: 'phrygian' }, 'Db', titleOf))).toEqual(['noSpelling'])
  })

  test('a rule that was changed is counted, and the set is named apart from its preset', () => {
    const [id] = Object.entries(preset.rules).find(([, { level }]) => level === 'law') ?? ['']
    const changed = withLevel(filled(), id, 'preference')
    expect(changedInForm(changed)).toEqual([id])
    expect(exerciseOf(changed)?.ruleSet).toMatchObject({ id: 'fux-mann-changed' })
    expect(changedInForm(withLevel(changed, id, 'law'))).toEqual([])
    expect(changedInForm(withPreset(changed, changed.preset))).toEqual([])
  })

  test('a parameter the rule cannot take stands in the way', () => {
    const rule = RULES.find(({ params }) =>
      paramFields(params).some(({ control }) => control.kind === 'whole-number'),
    )
    const field = rule && paramFields(rule.params).find(({ control }) => control.kind === 'whole-number')
    if (!rule || !field) throw new Error('no rule has a whole number to set')
    const form = withParam(filled(), rule.id, field.name, 'many')
    expect(setupProblems(form)).toEqual(['params'])
    expect(setupProblems(withParam(form, rule.id, field.name, field.fallback))).toEqual([])
  })

  test('every parameter of every rule has a control that reads back what it shows', () => {
    for (const { id, params } of RULES)
      for (const field of paramFields(params)) {
        if (field.control.kind === 'switch' || field.control.kind === 'choice') continue
        const shown = formatParam(field.control, field.fallback)
        expect([id, field.name, parseParam(field.control, shown)]).toEqual([id, field.name, field.fallback])
      }
  })
})

describe('the live check of an exercise', () => {
  const exercise = exerciseOf(filled())
  if (!exercise) throw new Error('the form is whole')

  test('Fux’s own cantus is sound by the rules drawn from him', () => {
    expect(doubtsOf(exercise)).toEqual([])
  })

  test('an ending off the final, a clef that does not carry the notes, and the rules’ own findings are told', () => {
    const kinds = (over: Partial<typeof exercise>) =>
      doubtsOf({ ...exercise, ...over }).map(({ kind }) => kind)
    expect(kinds({ cantus: [...exercise.cantus.slice(0, -1), 'E4'] })).toContain('last-not-final')
    expect(kinds({ clefs: { cantus: 'bass', line: 'treble' } })).toContain('clef')
    expect(kinds({ cantus: ['D4', 'D5', 'D4'] })).toContain('finding')
  })
})
