import type { Cantus } from '@/shared/api/cantus'

/** A cantus of the library that everyone has. Its final is its last note. */
export type LibraryCantus = Readonly<{
  id: string
  title: string
  /** Pitch names, one a bar. */
  notes: string
  mode: Cantus['mode']
  clef: Cantus['clef']
  source: string
  origin: 'published' | 'invented'
}>
