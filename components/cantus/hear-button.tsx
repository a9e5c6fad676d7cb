import { View } from 'react-native'
import { useStopOnLeave, usePlayer, VolumeControl } from '@/components/sound'
import { space } from '@/components/theme'
import { Button, Txt } from '@/components/ui'
import { useWords } from '@/components/words'
import { DEFAULT_TEMPO } from '@/shared/playback'
import type { PitchName } from '@/shared/theory/pitch'

const HEARING = 'cantus'

/** Plays a melody, quietly and only when asked, and stops it. */
export function HearButton({ notes }: Readonly<{ notes: readonly PitchName[] }>) {
  const words = useWords()
  const player = usePlayer()
  useStopOnLeave()
  const isOn = player.playingId === HEARING
  return (
    <View
      style={{
        flexDirection: 'row',
        flexWrap: 'wrap',
        alignItems: 'center',
        columnGap: space.one,
        rowGap: space.small,
        maxWidth: '100%',
      }}
    >
      <Button
        label={isOn ? words.cantus.edit.stop : words.cantus.edit.hear}
        isBusy={isOn && player.isLoading}
        isDisabled={notes.length === 0}
        onPress={() =>
          isOn
            ? player.stop()
            : player.play({
                id: HEARING,
                score: { cantus: notes, line: {}, setAside: [] },
                voices: 'cantus',
                fromBar: 1,
                toBar: notes.length,
                tempo: DEFAULT_TEMPO,
              })
        }
      />
      <VolumeControl />
      {player.problem ? (
        <Txt kind="note" tone="orpiment" role="status">
          {player.problem}
        </Txt>
      ) : null}
    </View>
  )
}
