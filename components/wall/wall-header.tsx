import { Fragment } from 'react'
import { View } from 'react-native'
import type { LessonView } from '@/components/lesson/lesson-view'
import { useTheme } from '@/components/theme'
import { Heading, Lozenge, Txt } from '@/components/ui'
import { useWords } from '@/components/words'
import type { Lesson } from '@/shared/api/lessons'
import type { WallMeasure } from './wall-measure'

/** A long title is set smaller, so that it and the syllables share the line. */
const titleSizePx = (title: string): number => (title.length <= 48 ? 35 : 25)

/** What the lesson is, and how to come in. */
export function WallHeader({
  lesson,
  view,
  measure,
}: Readonly<{ lesson: Lesson; view: LessonView; measure: WallMeasure }>) {
  const words = useWords()
  const { colors } = useTheme()
  const { px, isStacked } = measure
  const { species, position } = view.exercise
  return (
    <View
      style={{
        minHeight: measure.headerPx,
        borderBottomWidth: 1,
        borderColor: colors.hairline,
        flexDirection: 'row',
        flexWrap: isStacked ? 'wrap' : 'nowrap',
        alignItems: 'center',
        columnGap: px(28),
        rowGap: 4,
        paddingVertical: isStacked ? 12 : 0,
      }}
    >
      <Lozenge tone="azurite" sizePx={Math.max(12, px(26))} />
      <Heading
        level={1}
        style={{
          fontSize: Math.max(21, px(titleSizePx(lesson.title))),
          lineHeight: Math.max(28, px(titleSizePx(lesson.title) * 1.25)),
          flexShrink: 1,
          minWidth: 0,
        }}
      >
        {lesson.title}
      </Heading>
      <Txt
        tone="lead"
        lines={1}
        style={{ fontSize: Math.max(15, px(24)), lineHeight: Math.max(20, px(32)), flexShrink: 0 }}
      >
        {`${words.lesson.species[species]}, ${words.wall.position[position]}`}
      </Txt>
      <View
        style={{
          marginLeft: isStacked ? 0 : 'auto',
          flexDirection: 'row',
          alignItems: 'center',
          columnGap: px(22),
          flexWrap: isStacked ? 'wrap' : 'nowrap',
          flexShrink: isStacked ? 1 : 0,
          maxWidth: '100%',
        }}
      >
        {lesson.code && lesson.isDoorOpen ? (
          <>
            <Txt tone="lead" style={{ fontSize: Math.max(15, px(24)), lineHeight: Math.max(20, px(32)) }}>
              {words.wall.joinBySyllables}
            </Txt>
            <Syllables code={lesson.code} measure={measure} />
          </>
        ) : (
          <Txt tone="lead" style={{ fontSize: Math.max(15, px(24)), lineHeight: Math.max(20, px(32)) }}>
            {lesson.status === 'ended' ? words.wall.ended : words.wall.doorClosed}
          </Txt>
        )}
      </View>
    </View>
  )
}

function Syllables({ code, measure }: Readonly<{ code: string; measure: WallMeasure }>) {
  const { px } = measure
  return (
    <View style={{ flexDirection: 'row', alignItems: 'center', columnGap: Math.max(5, px(10)) }}>
      {code.split('-').map((syllable, index) => (
        <Fragment key={index}>
          {index > 0 ? <Lozenge tone="verdigris" sizePx={Math.max(8, px(13))} /> : null}
          <Txt
            kind="head"
            isStrong
            style={{ fontSize: Math.max(22, px(40)), lineHeight: Math.max(30, px(50)) }}
          >
            {syllable}
          </Txt>
        </Fragment>
      ))}
    </View>
  )
}
