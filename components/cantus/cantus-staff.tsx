import { useCallback, useMemo, useState, type KeyboardEvent } from 'react'
import { View } from 'react-native'
import { PlayingScore } from '@/components/lesson/playing-score'
import type { Highlight } from '@/components/score'
import { usePlayer } from '@/components/sound'
import { usePageMeasure } from '@/components/ui'
import { useWords } from '@/components/words'
import { signatureAlteration } from '@/shared/theory/key'
import type { Letter, PitchName } from '@/shared/theory/pitch'
import { MAX_BARS } from '@/shared/wire/documents'
import { cantusScoreOf } from './cantus-score'
import { parseCantusText, withAlteredNote, withMovedNote, withNote, withoutBar } from './cantus-text'
import type { CantusDraft } from './draft'
import type { JudgedDraft } from './judge-draft'

/**
 * The cantus on a staff that can be written on: tap or drag for a pitch, letters, arrows and signs by keyboard. One empty
 * bar waits at the end.
 */
export function CantusStaff({
  draft,
  judged,
  highlight,
  onText,
}: Readonly<{
  draft: CantusDraft
  judged: JudgedDraft
  highlight: Highlight | null
  onText: (text: string) => void
}>) {
  const words = useWords()
  const { strike } = usePlayer()
  const { contentPx, besidePx } = usePageMeasure()
  const [hand, setHand] = useState(1)
  const { tokens } = judged
  const signature = judged.signature ?? 0
  const waiting = tokens.length < MAX_BARS ? 1 : 0
  const last = tokens.length + waiting
  const handBar = Math.min(hand, last)

  const input = useMemo(
    () =>
      cantusScoreOf({
        notes: [...tokens.map(({ pitch }) => pitch), ...(waiting ? [null] : [])],
        clef: draft.clef,
        signature,
        final: judged.final,
        findings: judged.findings,
      }),
    [tokens, waiting, draft.clef, signature, judged.final, judged.findings],
  )

  const write = useCallback(
    (bar: number, pitch: PitchName) => {
      const at = Math.min(bar, tokens.length + 1)
      onText(withNote(tokens, at, pitch))
      setHand(at + 1)
    },
    [tokens, onText],
  )

  const onKeyDown = (event: KeyboardEvent) => {
    if (event.ctrlKey || event.metaKey || event.altKey) return
    const change = changeOf(event.key)
    if (change === null) return
    event.preventDefault()
    if (change.kind === 'letter') {
      const context = tokens.slice(0, handBar - 1).map(({ text, pitch }) => pitch ?? text)
      const alteration = { [-1]: 'b', 0: '', 1: '#' }[
        signatureAlteration(signature, change.letter) as -1 | 0 | 1
      ]
      const read = parseCantusText([...context, change.letter + alteration].join(' '), draft.clef).at(
        -1,
      )?.pitch
      if (!read || handBar > MAX_BARS) return
      write(handBar, read)
      strike(read)
      return
    }
    if (change.kind === 'remove') {
      const bar = change.isBefore && handBar > tokens.length ? tokens.length : handBar
      if (bar < 1 || bar > tokens.length) return
      onText(withoutBar(tokens, bar))
      setHand(Math.max(1, bar))
      return
    }
    const bar = Math.min(handBar, tokens.length)
    const text =
      change.kind === 'move'
        ? withMovedNote(tokens, bar, change.places, (letter) => signatureAlteration(signature, letter))
        : withAlteredNote(tokens, bar, change.by)
    if (text === null) return
    onText(text)
    setHand(bar)
    const heard = parseCantusText(text, draft.clef)[bar - 1]?.pitch
    if (heard) strike(heard)
  }

  return (
    <div onKeyDown={onKeyDown} style={{ minWidth: 0 }}>
      <View style={{ minHeight: 120 }}>
        <PlayingScore
          input={input}
          size="page"
          width={contentPx - besidePx}
          handBar={handBar}
          onPressBar={setHand}
          onReachBar={setHand}
          onPressStaff={write}
          highlight={highlight}
          accessibilityLabel={words.cantus.edit.staffLabel}
        />
      </View>
    </div>
  )
}

type Change =
  | Readonly<{ kind: 'letter'; letter: Letter }>
  | Readonly<{ kind: 'move'; places: number }>
  | Readonly<{ kind: 'alter'; by: 1 | -1 }>
  | Readonly<{ kind: 'remove'; isBefore: boolean }>

const OCTAVE_PLACES = 7

function changeOf(key: string): Change | null {
  if (/^[a-g]$/i.test(key)) return { kind: 'letter', letter: key.toUpperCase() as Letter }
  switch (key) {
    case 'ArrowUp':
      return { kind: 'move', places: 1 }
    case 'ArrowDown':
      return { kind: 'move', places: -1 }
    case 'PageUp':
      return { kind: 'move', places: OCTAVE_PLACES }
    case 'PageDown':
      return { kind: 'move', places: -OCTAVE_PLACES }
    case '+':
    case '#':
      return { kind: 'alter', by: 1 }
    case '-':
      return { kind: 'alter', by: -1 }
    case 'Backspace':
    case 'Delete':
      return { kind: 'remove', isBefore: key === 'Backspace' }
    default:
      return null
  }
}
