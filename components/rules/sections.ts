import type { RulePage } from '@/shared/rules/rule-book'
import type { Species } from '@/shared/rules'

/** A chapter of the rule book: what a rule judges, and in which species. */
export type Section = 'cantus' | 'melody' | 'every-species' | 'several-species' | 'three-voices' | Species

export const SECTIONS: readonly Section[] = [
  'cantus',
  'melody',
  'every-species',
  1,
  2,
  3,
  4,
  5,
  'several-species',
  'three-voices',
]

const ALL_SPECIES_COUNT = 5

/** Where a rule stands in the book. */
export function sectionOf({ scope, species }: Pick<RulePage, 'scope' | 'species'>): Section {
  if (scope === 'cantus') return 'cantus'
  if (scope === 'trio') return 'three-voices'
  if (species.length === ALL_SPECIES_COUNT) return scope === 'pair' ? 'every-species' : 'melody'
  const [only] = species
  return species.length === 1 && only !== undefined ? only : 'several-species'
}

/** Rules by what they say; every word typed must be in the title, the statement or the id. */
export function searchPages(search: string, pages: readonly RulePage[]): readonly RulePage[] {
  const wanted = search.toLowerCase().split(/\s+/).filter(Boolean)
  return pages.filter(({ id, title, statement }) => {
    const text = `${id} ${title} ${statement}`.toLowerCase()
    return wanted.every((word) => text.includes(word))
  })
}

/** Rules by section, sections in the order of the book, those without any left out. */
export const bySection = (
  pages: readonly RulePage[],
): readonly Readonly<{ section: Section; pages: readonly RulePage[] }>[] =>
  SECTIONS.flatMap((section) => {
    const own = pages.filter((page) => sectionOf(page) === section)
    return own.length > 0 ? [{ section, pages: own }] : []
  })
