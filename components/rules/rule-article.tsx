import { useMemo, type ReactNode } from 'react'
import { View } from 'react-native'
import { paramFields } from '@/components/rule-sets/params-fields'
import { useStopOnLeave, VolumeControl } from '@/components/sound'
import { MEASURE_PX, space } from '@/components/theme'
import { Heading, LinkText, Lozenge, Txt } from '@/components/ui'
import { useWords } from '@/components/words'
import { standingOf } from '@/shared/rule-sets/compare-rule-sets'
import { findRule, PRESETS, type AnyRule } from '@/shared/rules'
import type { RulePage } from '@/shared/rules/rule-book'
import { findSource } from '@/shared/rules/sources'
import { ExampleFigure } from './example-figure'
import { paramsInWords, valueInWords } from './param-words'

/** From this width the two examples stand side by side. */
const PAIR_PX = 760

/** All there is to say of a rule: its statement and reason, two examples, what can be set, and who says so. */
export function RuleArticle({ page, widthPx }: Readonly<{ page: RulePage; widthPx: number }>) {
  const say = useWords().rules
  useStopOnLeave()
  const rule = findRule(page.id)
  const isPaired = widthPx >= PAIR_PX
  const examplePx = isPaired ? (widthPx - space.double) / 2 : widthPx
  return (
    <View style={{ gap: space.wide }}>
      <Txt kind="title" face="serif" style={{ maxWidth: MEASURE_PX }}>
        {page.statement}
      </Txt>
      <View style={{ flexDirection: isPaired ? 'row' : 'column', gap: isPaired ? space.double : space.wide }}>
        {(['right', 'wrong'] as const).map((which) => (
          <View key={which} style={{ width: examplePx }}>
            <ExampleFigure page={page} which={which} widthPx={examplePx} />
          </View>
        ))}
      </View>
      <VolumeControl />
      <View style={{ flexDirection: isPaired ? 'row' : 'column', gap: isPaired ? space.double : space.wide }}>
        <View style={{ width: examplePx, gap: space.wide }}>
          <Part title={say.reason}>
            <Txt>{page.why}</Txt>
          </Part>
          <Part title={say.mends}>
            <Txt>{page.mends}</Txt>
          </Part>
          {page.disagreement ? (
            <Part title={say.disagreement}>
              <Txt>{page.disagreement}</Txt>
            </Part>
          ) : null}
          <Sources page={page} />
        </View>
        <View style={{ width: examplePx, gap: space.wide }}>
          {rule ? <Params rule={rule} /> : null}
          {rule ? <InPresets rule={rule} /> : null}
        </View>
      </View>
    </View>
  )
}

function Part({ title, children }: Readonly<{ title: string; children: ReactNode }>) {
  return (
    <View style={{ gap: space.tiny, maxWidth: MEASURE_PX }}>
      <Heading level={2}>{title}</Heading>
      {children}
    </View>
  )
}

function Params({ rule }: Readonly<{ rule: AnyRule }>) {
  const words = useWords()
  const fields = useMemo(() => paramFields(rule.params), [rule])
  return (
    <Part title={words.rules.params}>
      {fields.length === 0 ? <Txt tone="lead">{words.rules.noParams}</Txt> : null}
      <View role="list" aria-label={words.rules.params} style={{ gap: space.small }}>
        {fields.map(({ name, label, description, fallback }) => (
          <View role="listitem" key={name}>
            <Txt>
              <Txt isStrong>{label}</Txt>
              <Txt tone="lead">{`  ${words.rules.byDefault(valueInWords(fallback, words))}`}</Txt>
            </Txt>
            {description ? <Txt>{description}</Txt> : null}
          </View>
        ))}
      </View>
    </Part>
  )
}

function InPresets({ rule }: Readonly<{ rule: AnyRule }>) {
  const words = useWords()
  const defaults = rule.params.safeParse({}).data as Readonly<Record<string, unknown>>
  return (
    <Part title={words.rules.inPresets}>
      <View role="list" aria-label={words.rules.inPresets} style={{ gap: space.tiny }}>
        {PRESETS.map((preset) => {
          const { level, params } = standingOf(rule, preset)
          const differing = Object.keys(params).filter(
            (name) => JSON.stringify(params[name]) !== JSON.stringify(defaults[name]),
          )
          const settings = level === 'off' ? '' : paramsInWords(params, differing, rule, words)
          return (
            <View
              role="listitem"
              key={preset.id}
              style={{ flexDirection: 'row', gap: space.small, alignItems: 'flex-start' }}
            >
              <View style={{ width: 12, paddingTop: 6 }}>
                {level === 'off' ? null : (
                  <Lozenge
                    kind={level === 'law' ? 'filled' : 'hollow'}
                    tone={level === 'law' ? 'minium' : 'orpiment'}
                  />
                )}
              </View>
              <Txt style={{ flex: 1, minWidth: 0 }}>
                <LinkText href={`/rule-sets/${preset.id}`} label={preset.name} />
                {`: ${words.rules.level[level]}${settings ? words.rules.with(settings) : ''}`}
              </Txt>
            </View>
          )
        })}
      </View>
    </Part>
  )
}

function Sources({ page }: Readonly<{ page: RulePage }>) {
  const say = useWords().rules
  return (
    <Part title={say.sources}>
      <View role="list" aria-label={say.sources} style={{ gap: space.small }}>
        {page.sources.map(({ source: key, place, fromMemory }, index) => {
          const source = findSource(key)
          const note = fromMemory ? say.fromMemory : source ? say.sourceRead[source.read] : ''
          const name = source?.work ?? key
          return (
            <View role="listitem" key={`${key}-${index}`}>
              <Txt>
                {source?.url ? (
                  <a href={source.url} target="_blank" rel="noreferrer" style={{ color: 'inherit' }}>
                    {name}
                  </a>
                ) : (
                  name
                )}
                {place ? `, ${place}` : ''}
                {note ? <Txt tone="lead">{` (${note})`}</Txt> : null}
              </Txt>
            </View>
          )
        })}
      </View>
    </Part>
  )
}
