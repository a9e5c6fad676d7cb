import { View } from 'react-native'
import { space, useTheme, useWidth } from '@/components/theme'
import { Button } from '@/components/ui'
import { useWords } from '@/components/words'

/** What a thumb reaches: hearing, the bars on either side, the hand. */
export function DeskFooter({
  before,
  after,
  isPlaying,
  isLoading,
  canHear,
  isHandUp,
  canRaiseHand,
  onHear,
  onStop,
  onStep,
  onHand,
}: Readonly<{
  before: number | null
  after: number | null
  isPlaying: boolean
  isLoading: boolean
  canHear: boolean
  isHandUp: boolean
  canRaiseHand: boolean
  onHear: () => void
  onStop: () => void
  onStep: (by: 1 | -1) => void
  onHand: () => void
}>) {
  const words = useWords().desk
  const { colors } = useTheme()
  const isNarrow = useWidth().widthPx < 360
  return (
    <View
      role="toolbar"
      style={{
        borderTopWidth: 1,
        borderColor: colors.hairline,
        backgroundColor: colors.vellum,
        flexDirection: 'row',
        gap: space.small,
        paddingHorizontal: isNarrow ? space.small : space.one,
        paddingTop: space.half,
        paddingBottom: `max(${space.half}px, env(safe-area-inset-bottom))` as never,
        alignItems: 'center',
        position: 'sticky' as never,
        bottom: 0,
        zIndex: 2,
      }}
    >
      <Grow by={1}>
        <Button
          isWide
          label={isPlaying || isLoading ? words.stop : words.hear}
          isDisabled={!canHear && !isPlaying}
          isBusy={false}
          onPress={isPlaying || isLoading ? onStop : onHear}
        />
      </Grow>
      <Button
        label={words.pass.noPrevious}
        hint={before === null ? words.pass.noneBefore : words.pass.previousSpoken(before)}
        isDisabled={before === null}
        onPress={() => onStep(-1)}
      />
      <Grow by={1.35}>
        <Button
          isWide
          kind={after === null ? 'plain' : 'go'}
          label={after === null ? words.pass.noNext : words.pass.next(after)}
          hint={after === null ? words.pass.noneAfter : words.pass.nextSpoken(after)}
          isDisabled={after === null}
          onPress={() => onStep(1)}
        />
      </Grow>
      <Grow by={1}>
        <Button
          isWide
          label={words.hand}
          hint={isHandUp ? words.handDown : words.handUp}
          isOn={isHandUp}
          isDisabled={!canRaiseHand}
          onPress={onHand}
        />
      </Grow>
    </View>
  )
}

function Grow({ by, children }: Readonly<{ by: number; children: React.ReactNode }>) {
  return <View style={{ flexGrow: by, flexBasis: 0, minWidth: 0 }}>{children}</View>
}
