import { useEffect, useRef } from 'react'
import { View } from 'react-native'
import { space, useWidth } from '@/components/theme'
import { useStopOnLeave } from '@/components/sound'
import { Heading, Loading, Txt, useTitle } from '@/components/ui'
import { useWords } from '@/components/words'
import { CodeStep } from './code-step'
import { formatCode, isComplete, parseTypedCode } from './code-entry'
import { NameStep } from './name-step'
import { useJoining } from './use-joining'

/** The way into a lesson. `code` is what a scanned address carries. */
export function JoinScreen({ code }: Readonly<{ code: string | null }>) {
  const words = useWords()
  const { widthPx } = useWidth()
  const { joining, findLesson, giveName, startOver } = useJoining()
  const asked = useRef<string | null>(null)
  useStopOnLeave()

  useEffect(() => {
    if (code === null || asked.current === code) return
    asked.current = code
    const read = parseTypedCode(code)
    void findLesson(read.ok && isComplete(read.value) ? formatCode(read.value) : code)
  }, [code, findLesson])

  const isNaming = joining.step === 'name'
  const title = isNaming ? words.join.nameTitle : words.join.title
  useTitle(title)
  return (
    <View
      role="main"
      id="page"
      style={{
        flexGrow: 1,
        width: '100%',
        maxWidth: 440,
        alignSelf: 'center',
        paddingHorizontal: widthPx < 360 ? space.one : space.wide - 4,
        paddingTop: space.double,
        paddingBottom: space.wide,
        minHeight: '100dvh' as never,
        gap: space.small,
      }}
    >
      <Heading level={1}>{title}</Heading>
      {joining.step === 'name' ? (
        <NameStep
          title={joining.title}
          problem={joining.problem}
          isBusy={joining.isBusy}
          onName={(name) => void giveName(joining.code, joining.title, name)}
          onBack={startOver}
        />
      ) : joining.step === 'entering' ? (
        <View role="status">
          <Txt tone="lead">{words.join.entering}</Txt>
          <Loading lines={3} />
        </View>
      ) : (
        <>
          <Txt tone="lead">{words.join.lead}</Txt>
          <CodeStep
            problem={joining.step === 'code' ? joining.problem : null}
            isLooking={joining.step === 'looking'}
            onCode={(entered) => void findLesson(entered)}
          />
        </>
      )}
    </View>
  )
}
