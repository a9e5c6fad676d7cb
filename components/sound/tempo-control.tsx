import { useWords } from '@/components/words'
import { MAX_TEMPO, MIN_TEMPO } from '@/shared/playback'
import { Range } from './range'

/** The tempo of the next hearing, in quarter notes a minute. */
export function TempoControl({
  tempo,
  onChange,
}: Readonly<{ tempo: number; onChange: (tempo: number) => void }>) {
  const words = useWords().sound
  return (
    <Range
      label={words.tempo}
      hint={words.tempoHint}
      text={String(tempo)}
      value={tempo}
      min={MIN_TEMPO}
      max={MAX_TEMPO}
      step={4}
      onChange={onChange}
    />
  )
}
