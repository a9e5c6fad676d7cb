import type { Words } from '@/components/words'
import type { ScoreBar } from '@/shared/notation/score-input'
import { intervalBetween } from '@/shared/theory/interval'
import { nameSize } from '@/shared/theory/interval-name'
import type { BarNotes } from '@/shared/theory/note'
import { pitchOf, type PitchName } from '@/shared/theory/pitch'

/** A bar as a screen reader tells it: "bar 4, cantus F, line A, tenth, released". */
export function describeBar(bar: ScoreBar, words: Pick<Words, 'lesson' | 'score'>): string {
  if (bar.isSetAside) return words.score.setAside(bar.number)
  const spoken = (name: PitchName): string => words.lesson.pitchSpoken(pitchOf(name))
  const notesSpoken = (notes: BarNotes): string =>
    notes.flatMap(({ pitch }) => (pitch === null ? [] : [spoken(pitch)])).join(' ')
  const only = bar.line?.length === 1 ? bar.line[0]?.pitch : null
  return words.score.bar({
    number: bar.number,
    state: bar.state,
    cantus: bar.cantus === null ? null : spoken(bar.cantus),
    line: bar.line === null ? null : notesSpoken(bar.line),
    interval:
      only && bar.cantus !== null
        ? nameSize(intervalBetween(pitchOf(bar.cantus), pitchOf(only)).steps)
        : null,
    motion: bar.motion,
    proposals: bar.proposals.map(({ notes, count }) => ({ notes: notesSpoken(notes), count })),
  })
}
