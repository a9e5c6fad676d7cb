import { changedRules, tidyRules, withRuleLevel, withRuleParam } from '@/components/rule-sets/change-rules'
import type { Cantus } from '@/shared/api/cantus'
import { MAX_TITLE_CHARACTERS, titleSchema } from '@/shared/api/fields'
import { findRule, type Level, type Position, type RuleId, type RuleSet, type Species } from '@/shared/rules'
import { settingsOf } from '@/shared/rule-sets/rule-set-file'
import type { Clef } from '@/shared/theory/clef'
import { signatureOf } from '@/shared/theory/key'
import type { Mode } from '@/shared/theory/mode'
import { formatPitchClass, parsePitch, type PitchClass } from '@/shared/theory/pitch'
import { MAX_PROMPT_CHARACTERS, type BoardExercise, type StageSettings } from '@/shared/wire/documents'
import { suggestClefs } from './suggest-clefs'

/** What a teacher has entered so far. Whatever was not touched follows the melody. */
export type SetupForm = Readonly<{
  cantus: Cantus | null
  position: Position
  species: Species
  mode: Mode
  final: string
  clefs: Readonly<{ cantus: Clef; line: Clef }>
  /** Clefs changed by hand stay when the position changes. */
  isClefsTouched: boolean
  ruleSet: RuleSet
  /** The rule set as it was chosen, to count and undo what was changed. */
  preset: RuleSet
  title: string
  isTitleTouched: boolean
  prompt: string
}>

export type SetupProblem =
  'noCantus' | 'titleEmpty' | 'titleTooLong' | 'titleHidden' | 'promptTooLong' | 'noSpelling' | 'params'

export const readPitchClass = (name: string): PitchClass | null => {
  const parsed = parsePitch(`${name}4`)
  return parsed.ok ? { letter: parsed.value.letter, alteration: parsed.value.alteration } : null
}

const pitchesOf = (cantus: Cantus) =>
  cantus.notes.flatMap((name) => {
    const parsed = parsePitch(name)
    return parsed.ok ? [parsed.value] : []
  })

export const startForm = (preset: RuleSet, prompt: string): SetupForm => ({
  cantus: null,
  position: 'above',
  species: 1,
  mode: 'dorian',
  final: 'D',
  clefs: { cantus: 'treble', line: 'treble' },
  isClefsTouched: false,
  ruleSet: preset,
  preset,
  title: '',
  isTitleTouched: false,
  prompt,
})

type TitleOf = (position: Position, final: string) => string

const follow = (form: SetupForm, titleOf: TitleOf): SetupForm => ({
  ...form,
  clefs:
    form.isClefsTouched || !form.cantus
      ? form.clefs
      : suggestClefs(pitchesOf(form.cantus), form.position, form.cantus.clef),
  title: form.isTitleTouched || !form.cantus ? form.title : titleOf(form.position, form.final),
})

/** Takes a melody: its mode, final and clef come with it, and the title unless one was written. */
export const withCantus = (form: SetupForm, cantus: Cantus, titleOf: TitleOf): SetupForm =>
  follow({ ...form, cantus, mode: cantus.mode, final: cantus.final, isClefsTouched: false }, titleOf)

export const withPosition = (form: SetupForm, position: Position, titleOf: TitleOf): SetupForm =>
  follow({ ...form, position }, titleOf)

export const withFinal = (form: SetupForm, final: string, titleOf: TitleOf): SetupForm =>
  follow({ ...form, final }, titleOf)

export const withPreset = (form: SetupForm, preset: RuleSet): SetupForm => ({
  ...form,
  preset,
  ruleSet: preset,
})

/** Rules whose level or parameters are not those of the chosen preset. */
export const changedInForm = ({ ruleSet, preset }: SetupForm): readonly RuleId[] =>
  changedRules(ruleSet.rules, preset.rules)

/** A changed rule set has a name of its own, so that nobody takes it for the preset. */
const named = (ruleSet: RuleSet, preset: RuleSet, rules: RuleSet['rules']): RuleSet => ({
  ...ruleSet,
  id: rules === preset.rules ? preset.id : `${preset.id}-changed`.slice(0, 60),
  rules,
})

export function withLevel(form: SetupForm, ruleId: RuleId, level: Level): SetupForm {
  const rules = withRuleLevel(form.ruleSet.rules, ruleId, level)
  return { ...form, ruleSet: named(form.ruleSet, form.preset, rules) }
}

export function withParam(form: SetupForm, ruleId: RuleId, name: string, value: unknown): SetupForm {
  const rules = withRuleParam(form.ruleSet.rules, ruleId, name, value)
  return { ...form, ruleSet: named(form.ruleSet, form.preset, rules) }
}

export const isParamsSound = ({ ruleSet }: SetupForm): boolean =>
  Object.entries(ruleSet.rules).every(([id, { params }]) => {
    const rule = findRule(id)
    return !rule || rule.params.safeParse(params ?? {}).success
  })

/** Everything that stands in the way of making the lesson. */
export function setupProblems(form: SetupForm): readonly SetupProblem[] {
  const problems: SetupProblem[] = []
  if (!form.cantus) problems.push('noCantus')
  const title = titleSchema.safeParse(form.title)
  if (!title.success) {
    const code = title.error.issues[0]?.message
    problems.push(code === 'too-long' ? 'titleTooLong' : code === 'empty' ? 'titleEmpty' : 'titleHidden')
  }
  if (form.prompt.trim().length > MAX_PROMPT_CHARACTERS) problems.push('promptTooLong')
  const final = readPitchClass(form.final)
  if (!final || signatureOf(form.mode, final) === null) problems.push('noSpelling')
  if (!isParamsSound(form)) problems.push('params')
  return problems
}

/** The exercise that the form describes; null while it is not whole. */
export function exerciseOf(form: SetupForm): BoardExercise | null {
  const final = readPitchClass(form.final)
  const signature = final && signatureOf(form.mode, final)
  if (!form.cantus || !final || signature === null) return null
  return {
    title: form.title.trim().slice(0, MAX_TITLE_CHARACTERS) || form.cantus.title,
    cantus: [...form.cantus.notes],
    mode: form.mode,
    final: formatPitchClass(final),
    species: form.species,
    position: form.position,
    clefs: form.clefs,
    signature,
    ruleSet: {
      ...form.ruleSet,
      rules: settingsOf(tidyRules(form.ruleSet.rules)),
    },
  }
}

export const firstStage = (form: SetupForm): StageSettings => ({
  prompt: form.prompt.trim(),
  showsFindings: true,
  showsSpread: true,
  showsNames: false,
  showsWays: 'nobody',
})
