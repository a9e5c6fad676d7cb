import { View } from 'react-native'
import { space, useTheme } from '@/components/theme'
import { Txt } from '@/components/ui'
import { useWords } from '@/components/words'
import type { CantusAnalysis } from '@/shared/theory/analyse-cantus'
import { nameInterval } from '@/shared/theory/interval-name'
import type { Mode } from '@/shared/theory/mode'
import type { Pitch, PitchClass } from '@/shared/theory/pitch'

const LABEL_PX = 96

/** The facts of a melody, a line each: what a class finds out when it gets to know a cantus. */
export function MelodyFacts({
  analysis,
  mode,
  final,
}: Readonly<{ analysis: CantusAnalysis; mode: Mode; final: PitchClass }>) {
  const words = useWords()
  const say = words.cantus.facts
  const printed = (pitch: Pitch) => `${words.lesson.pitchPrinted(pitch)}${pitch.octave}`
  const others = analysis.modes.filter((one) => one !== mode)
  const { apexBars, leaps, cadence, highest, lowest, range, steps } = analysis
  const facts: readonly (readonly [label: string, lines: readonly string[]])[] = [
    [say.final, [words.lesson.pitchPrinted(final)]],
    [
      say.mode,
      [
        words.lesson.mode[mode] +
          (others.length > 0 ? say.also(others.map((one) => words.lesson.mode[one])) : ''),
      ],
    ],
    [say.range, [say.rangeOf(printed(lowest), printed(highest), nameInterval(range))]],
    [
      say.apex,
      [
        apexBars.length === 1
          ? say.apexOnce(printed(highest), apexBars[0] as number)
          : say.apexMore(printed(highest), apexBars),
      ],
    ],
    [say.moves, [say.movesOf(steps, steps + leaps.length)]],
    [
      say.leaps,
      leaps.length === 0
        ? [say.noLeaps]
        : leaps.map(
            (leap) =>
              `${say.leap(nameInterval(leap.interval), leap.direction, leap.bar)}, ${say.recovery[leap.recovery]}`,
          ),
    ],
    ...(cadence ? [[say.cadence, [say.cadenceOf(cadence[0], cadence[1])]] as const] : []),
    [
      say.gestures,
      analysis.gestures.map(({ from, to, shape }) =>
        say.gesture[shape](Array.from({ length: to - from + 1 }, (_, place) => from + place)),
      ),
    ],
  ]
  return (
    <View role="list" aria-label={say.title}>
      {facts
        .filter(([, lines]) => lines.length > 0)
        .map(([label, lines]) => (
          <Fact key={label} label={label} lines={lines} />
        ))}
    </View>
  )
}

function Fact({ label, lines }: Readonly<{ label: string; lines: readonly string[] }>) {
  const { colors } = useTheme()
  return (
    <View
      role="listitem"
      style={{
        flexDirection: 'row',
        gap: space.half,
        paddingVertical: space.tiny + 2,
        borderBottomWidth: 1,
        borderColor: colors.hairline,
      }}
    >
      <Txt tone="lead" style={{ width: LABEL_PX, flexShrink: 0 }}>
        {label}
      </Txt>
      <View style={{ flex: 1, minWidth: 0 }}>
        {lines.map((line) => (
          <Txt key={line} isTabular>
            {line}
          </Txt>
        ))}
      </View>
    </View>
  )
}
