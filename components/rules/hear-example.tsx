import { useId } from 'react'
import { View } from 'react-native'
import { usePlayer } from '@/components/sound'
import { space } from '@/components/theme'
import { Button, Txt } from '@/components/ui'
import { useWords } from '@/components/words'
import { DEFAULT_TEMPO, type PlaybackScore } from '@/shared/playback'

/** Plays an example when asked, and stops it. Several may stand on one page: the last that was asked for is heard. */
export function HearExample({
  score,
  barCount,
  name,
}: Readonly<{
  score: PlaybackScore
  barCount: number
  /** Which example, for those who do not see where the button stands. */
  name: string
}>) {
  const words = useWords().rules
  const player = usePlayer()
  const id = useId()
  const isOn = player.playingId === id
  return (
    <View style={{ flexDirection: 'row', flexWrap: 'wrap', alignItems: 'center', gap: space.small }}>
      <Button
        label={isOn ? words.stop : words.hear}
        hint={isOn ? words.stop : words.hearSpoken(name)}
        isBusy={isOn && player.isLoading}
        onPress={() =>
          isOn
            ? player.stop()
            : player.play({ id, score, voices: 'both', fromBar: 1, toBar: barCount, tempo: DEFAULT_TEMPO })
        }
      />
      {isOn && player.problem ? (
        <Txt kind="note" tone="orpiment" role="status">
          {player.problem}
        </Txt>
      ) : null}
    </View>
  )
}
