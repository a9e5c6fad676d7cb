/** What stays the same while questions are asked about one exercise: its places, and its laws as automata. */
import { resolveRuleSet, rulesInForce, type ActiveRule } from '@/shared/rules/rule-set'
import type { Exercise, RuleId, RuleSet } from '@/shared/rules/rule'
import type { Automaton } from '@/shared/search/automaton'
import { createGroup } from '@/shared/search/group'
import type { Choice, Places } from '@/shared/search/place'
import { createRuleAutomaton, type RuleAutomaton } from '@/shared/search/rule-automaton'

export type World = Readonly<{
  exercise: Exercise
  places: Places
  /** All active rules of a line, preferences too. */
  active: readonly ActiveRule[]
  /** The choices at each place that no law refuses by itself. */
  tried: readonly Uint16Array[]
  /** The laws that refuse a choice by itself. */
  refusedAlways: (place: number, choice: number) => readonly RuleId[]
  /** The laws with a memory, grouped. */
  members: readonly Automaton[]
  /** Laws that have made a remark so far. */
  remarking: () => ReadonlySet<RuleId>
}>

/** The rules of a set that speak of an added line in the exercise's species. */
export const rulesOfLine = ({ species }: Exercise, ruleSet: RuleSet): readonly ActiveRule[] =>
  rulesInForce(resolveRuleSet(ruleSet).active, species).filter(({ rule }) => rule.scope !== 'cantus')

export function createWorld(exercise: Exercise, active: readonly ActiveRule[], places: Places): World {
  const laws = active.filter(({ level }) => level === 'law')
  const automata = laws.map((law) => createRuleAutomaton(law, exercise, places))
  const single = automata.filter(({ reach }) => reach === 0)
  const { tried, refusedAlways } = tryEach(single, places)
  const stateless = single.filter((automaton) => automaton.isStateless())
  const others = automata.filter((automaton) => !stateless.includes(automaton))
  return {
    exercise,
    places,
    active,
    tried,
    refusedAlways,
    members: groupByReach(others, places),
    remarking: () =>
      new Set(automata.filter((automaton) => automaton.hasRemarked()).map(({ ruleId }) => ruleId)),
  }
}

/** Laws that look at each choice by itself are asked once about each, before any walk. */
function tryEach(
  single: readonly RuleAutomaton[],
  places: Places,
): Readonly<{ tried: readonly Uint16Array[]; refusedAlways: World['refusedAlways'] }> {
  for (const automaton of single) automaton.start()
  const tried = places.map(({ choices }, place) => {
    const known = new Uint16Array(choices.length)
    let count = 0
    for (let choice = 0; choice < choices.length; choice += 1) {
      if (single.every((automaton) => automaton.permits(choices[choice] as Choice))) {
        known[count] = choice
        count += 1
      }
    }
    return place === places.length - 1 ? known : known.slice(0, count)
  })
  return {
    tried,
    refusedAlways: (place, choice) => {
      const taken = places[place]?.choices[choice] as Choice
      return single.filter((automaton) => !automaton.permits(taken)).map(({ ruleId }) => ruleId)
    },
  }
}

/** Laws of one note back make one group; with those of two notes back, a second. */
function groupByReach(automata: readonly RuleAutomaton[], places: Places): readonly Automaton[] {
  const near = automata.filter(({ reach }) => reach <= 1)
  const nearer = automata.filter(({ reach }) => reach === 2)
  const far = automata.filter(({ reach }) => reach > 2)
  const first: readonly Automaton[] = near.length > 1 ? [createGroup(near, places)] : near
  const second = [...first, ...nearer]
  return [...(second.length > 1 ? [createGroup(second, places)] : second), ...far]
}
