import { useWords } from '@/components/words'
import { Range } from './range'
import { useVolume } from './use-player'

/** The page's volume: begins low, is remembered in this browser. */
export function VolumeControl() {
  const words = useWords().sound
  const [volume, setVolume] = useVolume()
  return (
    <Range
      label={words.volume}
      hint={words.quietStart}
      text={words.percent(volume)}
      value={volume}
      min={0}
      max={1}
      step={0.05}
      onChange={setVolume}
    />
  )
}
