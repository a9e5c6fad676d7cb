import { Score, type ScoreProps } from '@/components/score'
import { usePlayhead } from '@/components/sound'

/** A score on which the playhead moves. Apart from its parents, so that only it is asked anew at every frame. */
export function PlayingScore(props: Omit<ScoreProps, 'playhead'>) {
  const playhead = usePlayhead()
  return <Score {...props} playhead={playhead} />
}
