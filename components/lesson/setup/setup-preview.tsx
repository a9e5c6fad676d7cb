import { useMemo } from 'react'
import { View } from 'react-native'
import { RubricLine } from '@/components/lesson/rubric-line'
import { rubricOf } from '@/components/lesson/rubrics'
import { Score } from '@/components/score'
import { space } from '@/components/theme'
import { Notice, Txt } from '@/components/ui'
import { useWords, type Words } from '@/components/words'
import { exerciseScoreOf } from './cantus-score'
import { MelodySummary } from './melody-summary'
import { readPitchClass, type exerciseOf, type SetupForm } from './setup-form'
import type { Doubt } from './soundness'

/** The exercise as it will stand before the class, what its melody is like, and whether it is sound. */
export function SetupPreview({
  exercise,
  form,
  doubts,
  widthPx,
}: Readonly<{
  exercise: ReturnType<typeof exerciseOf>
  form: SetupForm
  doubts: readonly Doubt[]
  widthPx: number
}>) {
  const words = useWords()
  const { setup } = words
  const final = readPitchClass(form.final)
  const score = useMemo(() => exercise && exerciseScoreOf(exercise), [exercise])
  if (!score || !form.cantus || !final || !exercise)
    return <Txt tone="lead">{form.cantus ? setup.problems.noSpelling : setup.previewNone}</Txt>
  return (
    <View style={{ gap: space.half }}>
      <Score input={score} size="page" width={widthPx} accessibilityLabel={setup.preview} />
      <MelodySummary cantus={form.cantus} mode={form.mode} final={final} />
      {doubts.length === 0 ? (
        <Notice kind="good" title={setup.sound}>
          {setup.soundLead}
        </Notice>
      ) : (
        <Notice kind="note" title={setup.unsound}>
          <View style={{ gap: space.small }}>
            <Txt kind="note" tone="lead">
              {setup.unsoundLead}
            </Txt>
            {doubts.map((doubt, index) => (
              <DoubtLine key={index} doubt={doubt} words={words} />
            ))}
          </View>
        </Notice>
      )}
    </View>
  )
}

function DoubtLine({ doubt, words }: Readonly<{ doubt: Doubt; words: Words }>) {
  if (doubt.kind === 'finding')
    return <RubricLine rubric={rubricOf(doubt.finding, words)} kind="note" isMendTold={false} hasWhy />
  const print = words.lesson.pitchPrinted
  return (
    <Txt kind="note">
      {doubt.kind === 'clef'
        ? words.setup.problems.clefCantus(print(doubt.pitch))
        : words.setup.problems.lastNotFinal(print(doubt.pitch), doubt.final)}
    </Txt>
  )
}
