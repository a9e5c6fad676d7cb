import { VolumeControl } from '@/components/sound'
import { useTheme, type Ground } from '@/components/theme'
import { Button, Choice, Dialog, Toggle } from '@/components/ui'
import { useWords } from '@/components/words'
import type { Naming } from './ladder-model'

/** What a student may set for this device. */
export function DeskSettings({
  isOpen,
  onClose,
  naming,
  onNaming,
  isChromatic,
  onChromatic,
}: Readonly<{
  isOpen: boolean
  onClose: () => void
  naming: Naming
  onNaming: (naming: Naming) => void
  isChromatic: boolean
  onChromatic: (isChromatic: boolean) => void
}>) {
  const words = useWords()
  const { ground, setGround } = useTheme()
  const { ladder, settings } = words.desk
  return (
    <Dialog
      title={settings.title}
      isOpen={isOpen}
      onClose={onClose}
      actions={<Button label={words.common.close} onPress={onClose} />}
    >
      <Choice
        label={ladder.naming}
        value={naming}
        options={[
          { value: 'letters', label: ladder.letters },
          { value: 'degrees', label: ladder.degrees },
        ]}
        onChange={onNaming}
      />
      <Toggle
        label={ladder.accidentals}
        hint={ladder.accidentalsHint}
        value={isChromatic}
        onChange={onChromatic}
      />
      <VolumeControl />
      <Choice<Ground>
        label={settings.ground}
        value={ground}
        options={[
          { value: 'system', label: settings.grounds.system },
          { value: 'light', label: settings.grounds.light },
          { value: 'dark', label: settings.grounds.dark },
        ]}
        onChange={setGround}
      />
    </Dialog>
  )
}
