import type { Exercise } from '@/shared/rules/rule'
import { wholeBar, type Written } from '@/shared/search/narrow'
import type { Tried } from '@/shared/search/places'
import { rhythmsOf, writtenRhythms, type BarRhythm } from '@/shared/search/rhythm'
import type { BarNotes } from '@/shared/theory/note'
import { comparePitches, parsePitch, type Pitch } from '@/shared/theory/pitch'

/**
 * What is tried in each bar: the pool and the rhythms of the species, and whatever else has been written there so far.
 * A written stranger is judged by the laws like any other note.
 */
export type Strangers = Readonly<{
  /** Takes in what is written; true when there was something that was not tried before. */
  admit: (written: Written) => boolean
  rhythmsAt: (barIndex: number) => readonly BarRhythm[]
  triedIn: (bar: number) => readonly Tried[]
}>

export function createStrangers(
  { species }: Exercise,
  bars: readonly number[],
  pool: readonly Pitch[],
): Strangers {
  const last = bars.length - 1
  const own = bars.map((_, index) =>
    rhythmsOf(species, { isFirst: index === 0, isPenultimate: index === last - 1, isLast: index === last }),
  )
  const ownPitches = pool.map((pitch): Tried => ({ pitch, isForeign: false }))
  const rhythms = bars.map(() => new Map<string, BarNotes>())
  const pitches = new Map<number, readonly Pitch[]>()

  const admitPitches = (bar: number, notes: Iterable<{ pitch: string | null }>): boolean => {
    let isNew = false
    for (const { pitch } of notes) {
      const parsed = pitch === null ? null : parsePitch(pitch)
      if (!parsed?.ok) continue
      const { value } = parsed
      const known = pitches.get(bar) ?? []
      if ([...pool, ...known].some((other) => comparePitches(other, value) === 0)) continue
      pitches.set(bar, [...known, value])
      isNew = true
    }
    return isNew
  }

  /** The rhythm of the last bar decides which onset is the last but one, so that there must be one only. */
  const admitRhythm = (index: number, notes: BarNotes | null): boolean => {
    const known = rhythms[index] as Map<string, BarNotes>
    const isOwn = notes === null || (own[index] ?? []).some((rhythm) => isLike(rhythm, notes))
    if (index === last) {
      const name = isOwn ? '' : nameOf(notes)
      if (known.size === (isOwn ? 0 : 1) && (isOwn || known.has(name))) return false
      known.clear()
      if (!isOwn) known.set(name, notes)
      return true
    }
    if (isOwn || known.has(nameOf(notes))) return false
    known.set(nameOf(notes), notes)
    return true
  }

  return {
    admit: (written) => {
      let isNew = false
      for (const [index, bar] of bars.entries()) {
        const here = written.get(bar)
        const notes = here === undefined ? null : wholeBar(here)
        if (admitRhythm(index, notes)) isNew = true
        if (here !== undefined && admitPitches(bar, here.notes.values())) isNew = true
      }
      return isNew
    },
    rhythmsAt: (index) => {
      const foreign = [...(rhythms[index]?.values() ?? [])].flatMap(writtenRhythms)
      return index === last && foreign.length > 0 ? foreign : [...(own[index] ?? []), ...foreign]
    },
    triedIn: (bar) => {
      const more = pitches.get(bar)?.map((pitch): Tried => ({ pitch, isForeign: true })) ?? []
      return [...ownPitches, ...more]
    },
  }
}

const isLike = ({ values, tieOut }: BarRhythm, notes: BarNotes): boolean =>
  values.length === notes.length &&
  tieOut === (notes.at(-1)?.tied === true) &&
  values.every(({ ticks, isRest }, index) => {
    return notes[index]?.ticks === ticks && isRest === (notes[index]?.pitch === null)
  })

const nameOf = (notes: BarNotes): string =>
  notes.map(({ pitch, ticks, tied }) => `${pitch === null ? 'r' : ''}${ticks}${tied ? '~' : ''}`).join()
