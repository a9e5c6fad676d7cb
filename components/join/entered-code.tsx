import { Fragment } from 'react'
import { View } from 'react-native'
import { leading, RULE_PX, space, useTheme } from '@/components/theme'
import { Lozenge, Txt } from '@/components/ui'
import { useWords } from '@/components/words'
import type { CodeEntry } from './code-entry'
import { isComplete } from './code-entry'

const HEIGHT_PX = 60

/** What has been tapped so far, with a caret where the next syllable goes, and the way to take the last one back. */
export function EnteredCode({
  entry,
  hasProblem,
  onTakeBack,
}: Readonly<{ entry: CodeEntry; hasProblem: boolean; onTakeBack: () => void }>) {
  const words = useWords().join
  const { colors } = useTheme()
  return (
    <View
      style={{
        height: HEIGHT_PX,
        flexDirection: 'row',
        alignItems: 'center',
        borderBottomWidth: RULE_PX,
        borderColor: hasProblem ? colors.minium : colors.lampblack,
      }}
    >
      <View role="status" aria-label={words.enteredLabel(entry)} style={{ flex: 1, minWidth: 0 }}>
        <View aria-hidden style={{ flexDirection: 'row', alignItems: 'center', gap: space.small - 1 }}>
          {entry.map((syllable, index) => (
            <Fragment key={index}>
              {index > 0 ? <Lozenge tone="verdigris" sizePx={9} /> : null}
              <Txt kind="large">{syllable}</Txt>
            </Fragment>
          ))}
          {isComplete(entry) ? null : (
            <View
              style={{ width: 2, height: leading.large - 4, backgroundColor: colors.azurite, marginLeft: 2 }}
            />
          )}
        </View>
      </View>
      <button
        type="button"
        aria-label={words.takeBack}
        disabled={entry.length === 0}
        onClick={onTakeBack}
        style={{
          width: 44,
          height: 44,
          padding: 0,
          border: 0,
          background: 'none',
          color: colors.lampblack,
          visibility: entry.length === 0 ? 'hidden' : 'visible',
          cursor: 'pointer',
        }}
      >
        <svg
          width={26}
          height={20}
          viewBox="0 0 26 20"
          aria-hidden
          fill="none"
          stroke="currentColor"
          strokeWidth={1.8}
        >
          <path d="M9 2H24V18H9L2 10Z" />
          <path d="M12.5 6.5L19.5 13.5M19.5 6.5L12.5 13.5" />
        </svg>
      </button>
    </View>
  )
}
