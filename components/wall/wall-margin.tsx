import { View } from 'react-native'
import { firstPitch } from '@/components/lesson/spoken'
import type { RoomGroup } from '@/components/lesson/room'
import type { Rubric } from '@/components/lesson/rubrics'
import { useTheme } from '@/components/theme'
import { EasedStack, Lozenge, Name, Txt } from '@/components/ui'
import { useWords } from '@/components/words'
import type { Lesson } from '@/shared/api/lessons'
import { QrCode } from './qr-code'
import { MARGIN_TYPE, type WallMeasure } from './wall-measure'

const MOST_GROUPS = 4
const MOST_NAMES = 3
const TONE = { breach: 'minium', remark: 'orpiment', quiet: 'lead' } as const

/** Beside the score: what is said of it, who offered what where names may be shown, and the square that opens the lesson. */
export function WallMargin({
  lesson,
  rubrics,
  untold,
  hasSquare,
  groups,
  names,
  measure,
}: Readonly<{
  lesson: Lesson
  rubrics: readonly Rubric[]
  /** How many more there would be to say. */
  untold: number
  /** Whether the square that opens the lesson is shown. */
  hasSquare: boolean
  groups: readonly RoomGroup[] | null
  names: ReadonlyMap<string, string> | null
  measure: WallMeasure
}>) {
  const words = useWords()
  const { colors } = useTheme()
  const { px, isStacked } = measure
  const size = {
    fontSize: Math.max(17, px(MARGIN_TYPE.sizePx)),
    lineHeight: Math.max(23, px(MARGIN_TYPE.linePx)),
  }
  return (
    <View
      style={
        isStacked
          ? { gap: measure.gapPx }
          : {
              width: measure.asidePx,
              minHeight: 0,
              paddingTop: px(MARGIN_TYPE.paddingPx),
              paddingBottom: px(MARGIN_TYPE.paddingPx / 2),
              gap: px(MARGIN_TYPE.gapPx),
            }
      }
    >
      <View role="status" style={{ flexShrink: 1, minHeight: 0, overflow: 'hidden' }}>
        <EasedStack gapPx={isStacked ? 14 : px(26)}>
          {rubrics.map((rubric) => (
            <View key={rubric.id}>
              <View style={{ flexDirection: 'row', alignItems: 'center', gap: px(14) }}>
                <Lozenge
                  kind={rubric.tone === 'breach' ? 'filled' : 'hollow'}
                  tone={TONE[rubric.tone]}
                  sizePx={Math.max(12, px(19))}
                />
                <Txt face="serif" tone={TONE[rubric.tone]} style={size}>
                  {rubric.heading}
                </Txt>
              </View>
              <Txt tone={rubric.tone === 'quiet' ? 'lead' : 'lampblack'} style={size}>
                {rubric.sentence}
                {rubric.mend ? ` ${rubric.mend}` : ''}
              </Txt>
            </View>
          ))}
          {untold > 0 ? (
            <Txt key="untold" tone="lead" style={size}>
              {words.wall.moreFindings(untold)}
            </Txt>
          ) : null}
          {groups && names && groups.length > 0 ? (
            <View key="who" style={{ gap: px(10) }}>
              <Txt face="serif" tone="lead" style={size}>
                {words.wall.whoOffered}
              </Txt>
              {groups.slice(0, MOST_GROUPS).map((group) => (
                <GroupNames key={group.key} group={group} names={names} sizePx={size.fontSize} />
              ))}
            </View>
          ) : null}
        </EasedStack>
      </View>
      {hasSquare && lesson.code ? (
        <View
          style={{
            marginTop: 'auto',
            flexDirection: 'row',
            alignItems: 'center',
            gap: px(24),
            borderColor: colors.hairline,
          }}
        >
          <QrCode
            text={`${window.location.origin}/join/${lesson.code}`}
            sizePx={isStacked ? 150 : px(MARGIN_TYPE.squarePx)}
            label={words.wall.qrLabel(lesson.code.replaceAll('-', ' '))}
          />
          <Txt
            tone="lead"
            style={{ fontSize: Math.max(15, px(22)), lineHeight: Math.max(20, px(29)), flexShrink: 1 }}
          >
            {words.wall.joinAt(window.location.host)}
          </Txt>
        </View>
      ) : null}
    </View>
  )
}

function GroupNames({
  group,
  names,
  sizePx,
}: Readonly<{ group: RoomGroup; names: ReadonlyMap<string, string>; sizePx: number }>) {
  const words = useWords()
  const pitches = Object.values(group.notes)
    .map((notes) => firstPitch(notes))
    .flatMap((pitch) => (pitch ? [words.lesson.pitchPrinted(pitch)] : []))
  const known = group.memberIds.flatMap((id) => {
    const name = names.get(id)
    return name ? [name] : []
  })
  const told = known.slice(0, MOST_NAMES)
  return (
    <Txt lines={2} style={{ fontSize: sizePx * 0.9, lineHeight: sizePx * 1.2 }}>
      <Txt face="serif" isStrong tone="azurite" style={{ fontSize: sizePx * 0.9 }}>
        {pitches.join(' ')}
      </Txt>
      {'  '}
      {told.map((name, index) => (
        <Txt key={index} style={{ fontSize: sizePx * 0.9 }}>
          {index > 0 ? ', ' : ''}
          <Name>{name}</Name>
        </Txt>
      ))}
      {group.count > told.length ? ` ${words.wall.andMore(group.count - told.length)}` : ''}
    </Txt>
  )
}
