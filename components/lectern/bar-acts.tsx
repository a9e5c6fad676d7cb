import { useState } from 'react'
import { View } from 'react-native'
import { space } from '@/components/theme'
import { Button, Dialog, Txt } from '@/components/ui'
import { useWords } from '@/components/words'
import type { BarActs } from './lectern-model'

export type BarAct = 'release' | 'freeze' | 'set-aside' | 'take-up' | 'take-back' | 'clear'

/** What may be done with the bars in question; an act that would change nothing is not offered. */
export function BarActButtons({
  bars,
  acts,
  isHearing,
  hasLine,
  onAct,
  onHear,
  onHearing,
}: Readonly<{
  /** The selection; without one the acts are for nothing. */
  bars: readonly number[]
  acts: BarActs
  isHearing: boolean
  hasLine: boolean
  onAct: (act: BarAct, bars: readonly number[]) => void
  onHear: () => void
  onHearing: () => void
}>) {
  const words = useWords()
  const { lectern, lesson, common } = words
  const [isClearing, setClearing] = useState(false)
  const short = lesson.barsShort(bars)
  const has = bars.length > 0
  return (
    <View
      role="toolbar"
      aria-label={lectern.actsLabel}
      style={{ flexDirection: 'row', flexWrap: 'wrap', gap: space.small }}
    >
      {has && acts.canRelease ? (
        <Button kind="go" label={lectern.release(short)} onPress={() => onAct('release', bars)} />
      ) : null}
      {has && acts.canFreeze ? (
        <Button label={lectern.freeze(short)} onPress={() => onAct('freeze', bars)} />
      ) : null}
      {has && (acts.canClear || acts.canFreeze) ? (
        // Its place is kept while bars are open: the first proposal must not push the others aside.
        <Button
          label={lectern.clear}
          hasPopup="dialog"
          isDisabled={!acts.canClear}
          onPress={() => setClearing(true)}
        />
      ) : null}
      {has && acts.canTakeBack ? (
        <Button label={lectern.takeBack} onPress={() => onAct('take-back', bars)} />
      ) : null}
      {has && acts.canSetAside ? (
        <Button label={lectern.setAside} onPress={() => onAct('set-aside', bars)} />
      ) : null}
      {has && acts.canTakeUp ? (
        <Button label={lectern.takeUp} onPress={() => onAct('take-up', bars)} />
      ) : null}
      <Button
        label={
          isHearing
            ? lectern.stop
            : has
              ? lectern.hearSpan(short)
              : hasLine
                ? lectern.hearLine
                : lectern.hearCantus
        }
        onPress={onHear}
      />
      <Button kind="quiet" label={lectern.hearing.open} hasPopup="dialog" onPress={onHearing} />
      <Dialog
        title={lectern.clearTitle(lesson.barsInSentence(bars))}
        isOpen={isClearing}
        onClose={() => setClearing(false)}
        actions={
          <>
            <Button label={common.cancel} onPress={() => setClearing(false)} />
            <Button
              kind="go"
              label={lectern.clearGo}
              onPress={() => {
                onAct('clear', bars)
                setClearing(false)
              }}
            />
          </>
        }
      >
        <Txt>{lectern.clearLead}</Txt>
      </Dialog>
    </View>
  )
}
