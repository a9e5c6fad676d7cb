import type { z } from 'zod'
import { Refusal } from '@/server/theory/refusal'
import { createCore1, createCore2, findPreset, PRESETS, ruleSetProblems, type RuleSet } from '@/shared/rules'
import type { Compass } from '@/shared/search'
import { ruleSetFileSchema } from '@/shared/rule-sets/rule-set-file'
import { ruleSetSchema } from '@/shared/wire/documents'

/** Exact rule sets for checking engines against each other; each is made for one compass. */
const CORES: Readonly<Record<string, (pool: Compass) => RuleSet>> = {
  'core-1': createCore1,
  'core-2': createCore2,
}

export const USUAL_RULES = 'open-undergrad'

/** The rule set of a name, or of a file of the published schema. */
export function readRuleSet(
  name: string,
  compass: Compass | undefined,
  readFile: (path: string) => string,
): RuleSet {
  const ruleSet = findPreset(name) ?? coreOf(name, compass) ?? ruleSetOfFile(name, readFile)
  const [problem] = ruleSetProblems(ruleSet)
  if (problem) {
    const where = problem.path === '' ? problem.ruleId : `${problem.ruleId}, ${problem.path}`
    throw new Refusal(`The rule set cannot be used. ${where}: ${problem.message}`)
  }
  return ruleSet
}

function coreOf(name: string, compass: Compass | undefined): RuleSet | null {
  const create = CORES[name]
  if (!create) return null
  if (!compass) throw new Refusal(`The rules ${name} want a compass: give --low and --high.`)
  return create(compass)
}

function ruleSetOfFile(name: string, readFile: (path: string) => string): RuleSet {
  if (!name.endsWith('.json')) {
    const names = [...PRESETS.map(({ id }) => id), ...Object.keys(CORES)].join(', ')
    throw new Refusal(`There is no rule set ${name}; there are ${names}, or give a file that ends in .json.`)
  }
  let json: unknown
  try {
    json = JSON.parse(readFile(name))
  } catch (error) {
    if (error instanceof Refusal) throw error
    throw new Refusal(`${name} is not JSON.`)
  }
  const file = ruleSetFileSchema.safeParse(json)
  if (file.success) return { id: 'file', name: file.data.name, rules: file.data.rules }
  const plain = ruleSetSchema.safeParse(json)
  if (plain.success) return plain.data
  const [issue] = (file.error satisfies z.ZodError).issues
  throw new Refusal(`${name} is no rule set. ${issue?.path.join('.') || 'The file'}: ${issue?.message ?? ''}`)
}
