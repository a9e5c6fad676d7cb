import { useMemo } from 'react'
import { View } from 'react-native'
import { space } from '@/components/theme'
import { Txt } from '@/components/ui'
import { useWords } from '@/components/words'
import type { Cantus } from '@/shared/api/cantus'
import { analyseCantus } from '@/shared/theory/analyse-cantus'
import { nameInterval } from '@/shared/theory/interval-name'
import type { Mode } from '@/shared/theory/mode'
import { parsePitch, type PitchClass } from '@/shared/theory/pitch'

/** What a melody is like, in a few lines: range, apex, leaps, close, and where it comes from. */
export function MelodySummary({
  cantus,
  mode,
  final,
}: Readonly<{ cantus: Cantus; mode: Mode; final: PitchClass }>) {
  const words = useWords()
  const { analysis: sayings } = words.setup
  const facts = useMemo(() => {
    const pitches = cantus.notes.flatMap((name) => {
      const parsed = parsePitch(name)
      return parsed.ok ? [parsed.value] : []
    })
    return analyseCantus(pitches, { mode, final })
  }, [cantus, mode, final])
  if (!facts) return null
  const print = words.lesson.pitchPrinted
  const rows: readonly (readonly [string, string])[] = [
    [sayings.range, sayings.rangeText(print(facts.lowest), print(facts.highest), nameInterval(facts.range))],
    [sayings.apex, sayings.apexText(print(facts.highest), words.lesson.barsInSentence(facts.apexBars))],
    [
      sayings.leaps,
      facts.leaps.length === 0
        ? sayings.noLeaps
        : words.lesson.barsInSentence(facts.leaps.map(({ bar }) => bar)),
    ],
    ...(facts.cadence
      ? [[sayings.cadence, sayings.cadenceText(facts.cadence[0], facts.cadence[1])] as const]
      : []),
    [sayings.source, cantus.origin === 'invented' ? sayings.invented : cantus.source || sayings.own],
  ]
  return (
    <View role="group" aria-label={sayings.title} style={{ gap: 2 }}>
      {rows.map(([name, text]) => (
        <View key={name} style={{ flexDirection: 'row', gap: space.half }}>
          <Txt kind="note" tone="lead" style={{ width: 64 }}>
            {name}
          </Txt>
          <Txt kind="note" style={{ flex: 1, minWidth: 0 }}>
            {text}
          </Txt>
        </View>
      ))}
    </View>
  )
}
