import { TempoControl, VolumeControl } from '@/components/sound'
import { Button, Choice, Dialog } from '@/components/ui'
import { useWords } from '@/components/words'
import type { PlaybackVoices } from '@/shared/playback'

/** How the score is heard, and from where. */
export type HearingSettings = Readonly<{ voices: PlaybackVoices; tempo: number; from: 'here' | 'wall' }>

export function HearingDialog({
  isOpen,
  settings,
  onChange,
  onClose,
}: Readonly<{
  isOpen: boolean
  settings: HearingSettings
  onChange: (settings: HearingSettings) => void
  onClose: () => void
}>) {
  const words = useWords()
  const { hearing } = words.lectern
  return (
    <Dialog
      title={hearing.title}
      isOpen={isOpen}
      onClose={onClose}
      actions={<Button label={words.common.close} onPress={onClose} />}
    >
      <Choice
        label={hearing.voices.label}
        value={settings.voices}
        options={[
          { value: 'both', label: hearing.voices.both },
          { value: 'cantus', label: hearing.voices.cantus },
          { value: 'line', label: hearing.voices.line },
        ]}
        onChange={(voices) => onChange({ ...settings, voices })}
      />
      <TempoControl tempo={settings.tempo} onChange={(tempo) => onChange({ ...settings, tempo })} />
      <Choice
        label={hearing.from.label}
        value={settings.from}
        options={[
          { value: 'here', label: hearing.from.here },
          { value: 'wall', label: hearing.from.wall },
        ]}
        onChange={(from) => onChange({ ...settings, from })}
      />
      {settings.from === 'here' ? <VolumeControl /> : null}
    </Dialog>
  )
}
