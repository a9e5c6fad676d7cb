import type { Words } from '@/components/words'
import type { ScoreBar } from '@/shared/notation/score-input'
import { WHOLE_TICKS } from '@/shared/theory/duration'
import { intervalBetween } from '@/shared/theory/interval'
import { nameSize } from '@/shared/theory/interval-name'
import type { BarNotes } from '@/shared/theory/note'
import { pitchOf, type PitchName } from '@/shared/theory/pitch'

/** One whole note needs no telling of its length. */
const isWhole = (notes: BarNotes): boolean => notes.length === 1 && notes[0]?.ticks === WHOLE_TICKS

/** A bar as a screen reader tells it: "bar 4, cantus F, line A, tenth, released". */
export function describeBar(bar: ScoreBar, words: Pick<Words, 'lesson' | 'score'>): string {
  if (bar.isSetAside) return words.score.setAside(bar.number)
  const spoken = (name: PitchName): string => words.lesson.pitchSpoken(pitchOf(name))
  const notesSpoken = (notes: BarNotes): string =>
    isWhole(notes)
      ? notes.flatMap(({ pitch }) => (pitch === null ? [] : [spoken(pitch)])).join(' ')
      : notes
          .map(({ pitch, ticks, tied }) =>
            words.score.note(pitch === null ? null : spoken(pitch), ticks, tied === true),
          )
          .join(' ')
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
