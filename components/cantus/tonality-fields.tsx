import { View } from 'react-native'
import { space } from '@/components/theme'
import { Select } from '@/components/ui'
import { useWords } from '@/components/words'
import { CLEFS, type Clef } from '@/shared/theory/clef'
import { MODES } from '@/shared/theory/mode'
import { pitchOf } from '@/shared/theory/pitch'
import type { CantusDraft } from './draft'
import { finalsOf, type JudgedDraft } from './judge-draft'

/** Clef, mode and final; the latter two follow the notes until they are chosen. */
export function TonalityFields({
  draft,
  judged,
  problem,
  onChange,
}: Readonly<{
  draft: CantusDraft
  judged: JudgedDraft
  problem: string | null
  onChange: (some: Partial<CantusDraft>) => void
}>) {
  const words = useWords()
  const say = words.cantus.edit
  const printed = (name: string) => words.lesson.pitchPrinted(pitchOf(`${name}4`))
  const finals = finalsOf(draft.mode)
  return (
    <View style={{ flexDirection: 'row', flexWrap: 'wrap', gap: space.one }}>
      <View style={{ flexGrow: 1, flexBasis: 150 }}>
        <Select
          label={say.clef}
          value={draft.clef}
          options={CLEFS.map((value) => ({ value, label: words.lesson.clef[value] }))}
          onChange={(clef: Clef) => onChange({ clef })}
        />
      </View>
      <View style={{ flexGrow: 1, flexBasis: 190 }}>
        <Select
          label={say.mode}
          value={draft.mode}
          options={[
            { value: 'auto' as const, label: say.modeAuto(words.lesson.mode[judged.mode]) },
            ...MODES.map((value) => ({ value, label: words.lesson.mode[value] })),
          ]}
          onChange={(mode) => onChange({ mode })}
        />
      </View>
      <View style={{ flexGrow: 1, flexBasis: 190 }}>
        <Select
          label={say.final}
          value={draft.final}
          problem={problem}
          options={[
            { value: 'auto', label: say.finalAuto(words.lesson.pitchPrinted(judged.final)) },
            ...(finals.includes(draft.final) || draft.final === 'auto'
              ? finals
              : [draft.final, ...finals]
            ).map((value) => ({ value, label: printed(value) })),
          ]}
          onChange={(final) => onChange({ final })}
        />
      </View>
    </View>
  )
}
