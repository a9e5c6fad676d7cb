import { View } from 'react-native'
import { useTheme } from '@/components/theme'
import { Lozenge } from './lozenge'
import { usePageMeasure } from './use-page-measure'

const SPACE_PX = 26
const LINES = 5
const LOZENGE_PX = 18
/** Steps above the staff's lowest line: two voices over the same eleven bars, the first exercise of the old book. */
const CANTUS = [-1, 1, 0, -1, 2, 1, 3, 2, 1, 0, -1]
const LINE = [3, 3, 2, 3, 4, 5, 5, 4, 6, 5, 6]
const STEPS_ABOVE = 2
const HEIGHT_PX = (LINES - 1) * SPACE_PX + STEPS_ABOVE * SPACE_PX + LOZENGE_PX

/** Two voices in lozenges on one staff, at the foot of a page that says little. It is only looked at. */
export function StaffFoot() {
  const { colors } = useTheme()
  const { contentPx } = usePageMeasure()
  const lowestPx = HEIGHT_PX - SPACE_PX
  const yOf = (step: number): number => lowestPx - (step * SPACE_PX) / 2
  const voices = [
    { steps: CANTUS, kind: 'filled', tone: 'lead' },
    { steps: LINE, kind: 'hollow', tone: 'azurite' },
  ] as const
  return (
    <View
      aria-hidden
      style={{ height: HEIGHT_PX, width: contentPx, marginTop: 'auto', pointerEvents: 'none' }}
    >
      {Array.from({ length: LINES }, (_, line) => (
        <View
          key={line}
          style={{
            position: 'absolute',
            left: 0,
            right: 0,
            top: yOf(2 * line),
            height: 1,
            backgroundColor: colors.hairline,
          }}
        />
      ))}
      {voices.flatMap(({ steps, kind, tone }) =>
        steps.map((step, bar) => (
          <View
            key={`${kind}-${bar}`}
            style={{
              position: 'absolute',
              left: ((bar + 0.5) * contentPx) / steps.length - LOZENGE_PX / 2,
              top: yOf(step) - LOZENGE_PX / 2,
            }}
          >
            <Lozenge kind={kind} tone={tone} sizePx={LOZENGE_PX} />
          </View>
        )),
      )}
    </View>
  )
}
