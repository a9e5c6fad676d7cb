import { useState } from 'react'
import { View } from 'react-native'
import { RubricLine } from '@/components/lesson/rubric-line'
import { rubricsOf } from '@/components/lesson/rubrics'
import { space } from '@/components/theme'
import { Heading, Select, Txt } from '@/components/ui'
import { useWords } from '@/components/words'
import { PRESETS, type Finding } from '@/shared/rules'
import type { Highlight } from '@/components/score'

/** What the rules of a chosen set say of a cantus: the rubrics in its margin. */
export function MelodyFindings({
  findings,
  presetId,
  onPreset,
  isWaiting,
  onPoint,
}: Readonly<{
  findings: readonly Finding[]
  presetId: string
  onPreset: (presetId: string) => void
  isWaiting: boolean
  /** Told which bars a rubric speaks of while it is pointed at. */
  onPoint: (highlight: Highlight | null) => void
}>) {
  const words = useWords()
  const [pointed, setPointed] = useState<string | null>(null)
  const rubrics = rubricsOf(findings, words)
  const point = (id: string | null) => {
    setPointed(id)
    const rubric = rubrics.find((one) => one.id === id)
    const from = rubric?.bars[0]
    onPoint(
      rubric && from !== undefined
        ? { fromBar: from, toBar: rubric.bars.at(-1) ?? from, tone: rubric.tone }
        : null,
    )
  }
  return (
    <View style={{ gap: space.half }}>
      <Heading level={2}>{words.cantus.findings.title}</Heading>
      <Select
        label={words.cantus.edit.preset}
        value={presetId}
        onChange={onPreset}
        options={PRESETS.map(({ id, name }) => ({ value: id, label: name }))}
      />
      <View
        role="list"
        aria-label={words.cantus.findings.title}
        aria-live="polite"
        style={{ gap: space.half }}
      >
        {rubrics.length === 0 ? (
          <View role="listitem">
            <Txt tone="lead">{isWaiting ? words.cantus.findings.waiting : words.cantus.findings.none}</Txt>
          </View>
        ) : (
          rubrics.map((rubric) => (
            <div
              role="listitem"
              key={rubric.id}
              tabIndex={0}
              style={{ opacity: pointed === null || pointed === rubric.id ? 1 : 0.75 }}
              onPointerEnter={() => point(rubric.id)}
              onPointerLeave={() => point(null)}
              onFocus={() => point(rubric.id)}
              onBlur={() => point(null)}
            >
              <RubricLine rubric={rubric} hasWhy />
            </div>
          ))
        )}
      </View>
    </View>
  )
}
