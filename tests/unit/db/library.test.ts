import { finalOf, LIBRARY } from '@/db/library/upsert-library'
import { DEMO_PEOPLE } from '@/db/demo/people'
import { nameSchema } from '@/shared/api/fields'
import { checkCantus, readExercise } from '@/shared/rules'
import { PRESETS } from '@/shared/rules/presets'
import { isComfortable } from '@/shared/theory/clef'
import { pitchOf } from '@/shared/theory/pitch'

const INVENTED = LIBRARY.filter(({ origin }) => origin === 'invented')
const PUBLISHED = LIBRARY.filter(({ origin }) => origin === 'published')

const lawsBroken = (cantus: (typeof LIBRARY)[number], ruleSetId: string) => {
  const ruleSet = PRESETS.find(({ id }) => id === ruleSetId)
  if (!ruleSet) throw new Error(`No rule set ${ruleSetId}`)
  const exercise = readExercise({
    cantus: cantus.notes.split(' '),
    mode: cantus.mode,
    final: finalOf(cantus.notes),
    species: 1,
    position: 'above',
  })
  return checkCantus(exercise, ruleSet).filter(({ level }) => level === 'law')
}

describe('the library', () => {
  it('has Fux’s six, one on each final, and six invented ones or more', () => {
    expect(PUBLISHED.map(({ notes }) => finalOf(notes)).sort()).toEqual(['A', 'C', 'D', 'E', 'F', 'G'])
    expect(INVENTED.length).toBeGreaterThanOrEqual(6)
    expect(new Set(LIBRARY.map(({ id }) => id)).size).toBe(LIBRARY.length)
  })

  it.each(LIBRARY.map((cantus) => [cantus.title, cantus] as const))(
    '%s stays within its clef',
    (_title, cantus) => {
      expect(cantus.notes.split(' ').filter((note) => !isComfortable(pitchOf(note), cantus.clef))).toEqual([])
    },
  )

  it.each(LIBRARY.map((cantus) => [cantus.title, cantus] as const))(
    '%s breaks no law of fux-mann for a cantus',
    (_title, cantus) => {
      expect(lawsBroken(cantus, 'fux-mann')).toEqual([])
    },
  )

  it.each(INVENTED.flatMap((cantus) => PRESETS.map(({ id }) => [cantus.title, id, cantus] as const)))(
    '%s breaks no law of %s',
    (_title, ruleSetId, cantus) => {
      expect(lawsBroken(cantus, ruleSetId)).toEqual([])
    },
  )
})

describe('the demo’s people', () => {
  it('are a teacher, an assistant, an administrator and eighteen students with names a form would take', () => {
    const count = (role: string) => DEMO_PEOPLE.filter((person) => person.role === role).length
    expect([count('teacher'), count('assistant'), count('administrator'), count('student')]).toEqual([
      1, 1, 1, 18,
    ])
    for (const { name, email } of DEMO_PEOPLE) {
      expect(nameSchema.safeParse(name).success).toBe(true)
      expect(email).toMatch(/\.example$/)
    }
    expect(new Set(DEMO_PEOPLE.map(({ email }) => email)).size).toBe(DEMO_PEOPLE.length)
  })
})
