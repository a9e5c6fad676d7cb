import { useMemo, useState } from 'react'
import { View } from 'react-native'
import { Score } from '@/components/score'
import { space, useTheme } from '@/components/theme'
import { Empty, Field, LinkText, Txt } from '@/components/ui'
import { useWords } from '@/components/words'
import type { Cantus } from '@/shared/api/cantus'
import { cantusScoreOf } from './cantus-score'

const LIST_PX = 320

/** The melodies of the library, each as a name and a small staff; one is chosen like a radio button. */
export function CantusPicker({
  library,
  chosen,
  problem,
  onChoose,
}: Readonly<{
  library: readonly Cantus[]
  chosen: Cantus | null
  problem: string | null
  onChoose: (cantus: Cantus) => void
}>) {
  const words = useWords()
  const { setup, lesson } = words
  const { colors } = useTheme()
  const [search, setSearch] = useState('')
  const shown = useMemo(() => {
    const wanted = search.toLowerCase().split(/\s+/).filter(Boolean)
    return library.filter(({ title, source, mode, final }) => {
      const text = `${title} ${source} ${lesson.mode[mode]} ${final}`.toLowerCase()
      return wanted.every((word) => text.includes(word))
    })
  }, [library, search, lesson])

  if (library.length === 0)
    return <Empty title={setup.noCantus} action={<LinkText href="/cantus/new" label={setup.cantusWrite} />} />
  return (
    <View style={{ gap: space.small }}>
      <Field
        label={setup.cantusSearch}
        kind="search"
        value={search}
        onChangeText={setSearch}
        isOptional={false}
      />
      <div
        role="radiogroup"
        aria-label={setup.cantus}
        style={{
          maxHeight: LIST_PX,
          overflowY: 'auto',
          borderTop: `1.5px solid ${colors.lampblack}`,
          borderBottom: `1px solid ${colors.hairline}`,
        }}
      >
        {shown.map((cantus) => {
          const isOn = cantus.id === chosen?.id
          return (
            <label
              key={cantus.id}
              style={{
                display: 'flex',
                alignItems: 'center',
                gap: space.one,
                minHeight: 64,
                padding: `${space.tiny}px ${space.half}px`,
                position: 'relative',
                cursor: 'pointer',
                borderBottom: `1px solid ${colors.hairline}`,
                background: isOn ? colors.leaf : 'transparent',
                boxShadow: isOn ? `inset 3px 0 0 ${colors.azurite}` : 'none',
              }}
            >
              <input
                type="radio"
                name="cantus"
                className="covers"
                checked={isOn}
                onChange={() => onChoose(cantus)}
                style={{ cursor: 'inherit' }}
              />
              <View style={{ flex: 1, minWidth: 0 }}>
                <Txt isStrong={isOn} lines={2}>
                  {cantus.title}
                </Txt>
                <Txt kind="small" tone="lead" lines={1}>
                  {`${lesson.mode[cantus.mode]}, ${cantus.final.replace('#', '♯').replace('b', '♭')} · ${setup.bars(cantus.notes.length)}`}
                </Txt>
              </View>
              <View aria-hidden style={{ width: 150, flexShrink: 0, pointerEvents: 'none' }}>
                <Score input={cantusScoreOf(cantus)} size="mini" width={150} />
              </View>
            </label>
          )
        })}
        {shown.length === 0 ? (
          <Txt tone="lead" style={{ padding: space.one }}>
            {setup.cantusNone}
          </Txt>
        ) : null}
      </div>
      {problem ? (
        <Txt kind="note" tone="minium" role="alert">
          {problem}
        </Txt>
      ) : null}
    </View>
  )
}
