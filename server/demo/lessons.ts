import { FUX_CANTUS } from '@/db/library/fux'
import { INVENTED_CANTUS } from '@/db/library/invented'
import { finalOf } from '@/db/library/upsert-library'
import type { LibraryCantus } from '@/db/library/library-cantus'
import { PRESETS } from '@/shared/rules/presets'
import type { BoardExercise, StageSettings } from '@/shared/wire/documents'

export type DemoLesson = Readonly<{
  id: string
  title: string
  isOpen: boolean
  exercise: BoardExercise
  stage: StageSettings
}>

function exerciseOn(
  library: readonly LibraryCantus[],
  id: string,
  more: Pick<BoardExercise, 'position' | 'clefs' | 'signature'> & Readonly<{ ruleSetId: string }>,
): BoardExercise {
  const cantus = library.find((candidate) => candidate.id === id)
  const ruleSet = PRESETS.find((preset) => preset.id === more.ruleSetId)
  if (!cantus || !ruleSet) throw new Error(`The demo needs cantus ${id} and rule set ${more.ruleSetId}`)
  return {
    title: cantus.title,
    cantus: cantus.notes.split(' '),
    mode: cantus.mode,
    final: finalOf(cantus.notes),
    species: 1,
    position: more.position,
    clefs: more.clefs,
    signature: more.signature,
    ruleSet: structuredClone(ruleSet) as BoardExercise['ruleSet'],
  }
}

/** One lesson that is going on and one that waits, in the demo's course. */
export const createDemoLessons = (): readonly DemoLesson[] => [
  {
    id: 'demo-lesson-open',
    title: 'A voice above Fux on D',
    isOpen: true,
    exercise: exerciseOn(FUX_CANTUS, 'library-fux-d', {
      position: 'above',
      clefs: { cantus: 'treble', line: 'treble' },
      signature: 0,
      ruleSetId: 'open-undergrad',
    }),
    stage: {
      prompt: 'From the end backwards: which two notes close above E and D?',
      showsFindings: true,
      showsSpread: false,
      showsNames: false,
      showsWays: 'wall',
    },
  },
  {
    id: 'demo-lesson-prepared',
    title: 'A voice below The stair',
    isOpen: false,
    exercise: exerciseOn(INVENTED_CANTUS, 'library-invented-stair', {
      position: 'below',
      clefs: { cantus: 'treble', line: 'bass' },
      signature: 0,
      ruleSetId: 'fux-mann',
    }),
    stage: {
      prompt: 'Where can the lower voice begin?',
      showsFindings: true,
      showsSpread: true,
      showsNames: false,
      showsWays: 'nobody',
    },
  },
]
