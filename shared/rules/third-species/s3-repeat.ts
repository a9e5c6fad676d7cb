import { cite } from '@/shared/rules/cite'
import { neighbours, NO_PARAMS, type NeighbourState, type NoParams } from '@/shared/rules/first-species/folds'
import { breachAt } from '@/shared/rules/first-species/sonority'
import type { Rule } from '@/shared/rules/rule'
import { shortExample, SHORT_LINE } from '@/shared/rules/third-species/examples'
import { THIRD_SPECIES } from '@/shared/rules/third-species/folds'
import { formatPitch, isSamePitch } from '@/shared/theory/pitch'

export const s3Repeat: Rule<NeighbourState, NoParams> = {
  id: 's3-repeat',
  level: 'law',
  scope: 'pair',
  species: THIRD_SPECIES,
  params: NO_PARAMS,
  ...neighbours<NoParams>((before, now) => {
    if (!isSamePitch(before.note, now.note)) return null
    const args = { note: formatPitch(now.note) }
    return breachAt(now.isStruck ? 'repeated' : 'tied', [before, now], args, 'line')
  }),
  explain: {
    title: 'No repeated or tied notes',
    statement: 'A note is neither repeated at once nor tied over.',
    why: 'The line lives by its motion; a note that stays, stops it.',
    mends: 'Move one of the two notes.',
    sources: cite('MT21C', 'DAVID', 'LEHM II'),
    right: shortExample(SHORT_LINE),
    wrong: shortExample('D4:1,E4:1,F4:1,G4:1 A4:1,A4:1,G4:1,F4:1 G4:1,A4:1,B4:1,C#5:1 D5', [2]),
    messages: {
      repeated: 'The line repeats its {note}.',
      tied: 'The line ties its {note} over.',
    },
  },
}
