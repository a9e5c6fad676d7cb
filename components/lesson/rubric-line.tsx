import { View } from 'react-native'
import { Why } from '@/components/rules/why'
import { space } from '@/components/theme'
import { Lozenge, Txt, type TxtKind } from '@/components/ui'
import type { Rubric } from './rubrics'

const TONE = { breach: 'minium', remark: 'orpiment', quiet: 'lead' } as const

/** A finding in the margin: its lozenge, its bars in red or ochre, and the sentence. */
export function RubricLine({
  rubric,
  kind = 'text',
  isMendTold = true,
  hasWhy = false,
}: Readonly<{ rubric: Rubric; kind?: TxtKind; isMendTold?: boolean; hasWhy?: boolean }>) {
  const tone = TONE[rubric.tone]
  const isLarge = kind === 'large' || kind === 'head'
  return (
    <View style={{ flexDirection: 'row', gap: isLarge ? space.half : space.small }}>
      <View style={{ paddingTop: isLarge ? 11 : 6 }}>
        <Lozenge
          kind={rubric.tone === 'breach' ? 'filled' : 'hollow'}
          tone={tone}
          sizePx={isLarge ? 17 : 12}
        />
      </View>
      <Txt
        kind={kind}
        face="sans"
        tone={rubric.tone === 'quiet' ? 'lead' : 'lampblack'}
        style={{ flex: 1, minWidth: 0 }}
      >
        <Txt kind={kind} face="serif" isStrong tone={tone}>
          {rubric.heading}
        </Txt>
        {isLarge ? '\n' : ' '}
        {rubric.sentence}
        {isMendTold && rubric.mend ? ` ${rubric.mend}` : ''}
        {hasWhy && rubric.ruleId ? ' ' : ''}
        {hasWhy && rubric.ruleId ? <Why ruleId={rubric.ruleId} /> : null}
      </Txt>
    </View>
  )
}
