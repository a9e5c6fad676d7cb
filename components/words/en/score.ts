import { valueOf } from '@/shared/theory/note-value'
import { lesson } from './lesson'

type BarFacts = Readonly<{
  number: number
  state: 'released' | 'frozen' | 'plain'
  cantus: string | null
  /** Null where nothing is written. */
  line: string | null
  /** `tenth`; null without both notes, or with several notes in the line. */
  interval: string | null
  motion: keyof typeof lesson.motion | null
  /** Each proposed reading with its number; null on one's own. */
  proposals: readonly Readonly<{ notes: string; count: number | null }>[]
}>

const proposalSpoken = ({ notes, count }: BarFacts['proposals'][number]): string =>
  count === null ? `${notes} proposed` : `${notes} by ${count}`

/** What a screen reader says of an engraved score. */
export const score = {
  score: 'Score',
  /** `half A held over`, `quarter rest`: among notes of several values. */
  note: (pitch: string | null, ticks: number, isTied: boolean): string => {
    const { value, isDotted } = valueOf(ticks)
    const length = isDotted ? `dotted ${value}` : value
    return pitch === null ? `${length} rest` : `${length} ${pitch}${isTied ? ' held over' : ''}`
  },
  setAside: (bar: number) => `bar ${bar}, set aside`,
  /** `bar 4, cantus F, line A, tenth, contrary motion, released` */
  bar: ({ number, state, cantus, line, interval, motion, proposals }: BarFacts): string =>
    [
      `bar ${number}`,
      cantus === null ? null : `cantus ${cantus}`,
      line === null ? null : `line ${line}`,
      interval,
      motion === null ? null : lesson.motion[motion],
      proposals.length === 0 ? null : lesson.listed(proposals.map(proposalSpoken)),
      state === 'plain' ? null : state,
    ]
      .filter((part) => part !== null)
      .join(', '),
}
