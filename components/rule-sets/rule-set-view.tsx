import { View } from 'react-native'
import { BookAsked } from '@/components/rules/book-asked'
import { paramsInWords } from '@/components/rules/param-words'
import { bySection } from '@/components/rules/sections'
import { Frame } from '@/components/session'
import { space } from '@/components/theme'
import { Button, Heading, LinkButton, LinkText, Lozenge, Name, Row, Rows, Txt } from '@/components/ui'
import { useWords } from '@/components/words'
import type { Me } from '@/shared/api/people'
import { standingOf } from '@/shared/rule-sets/compare-rule-sets'
import { findPreset, findRule, type RuleSet } from '@/shared/rules'
import { downloadRuleSet } from './download-rule-set'

/** A rule set that is not one's own: what it has on, and the way to one's own from it. */
export function RuleSetView({
  me,
  ruleSet,
  basedOn,
}: Readonly<{ me: Me; ruleSet: RuleSet; basedOn: string | null }>) {
  const words = useWords()
  const say = words.ruleSets
  return (
    <Frame
      me={me}
      title={ruleSet.name}
      heading={<Name>{ruleSet.name}</Name>}
      up={{ href: '/rule-sets', label: say.up }}
      lede={findPreset(ruleSet.id) ? say.presetLede : say.othersLede}
      actions={
        <>
          <Button
            kind="quiet"
            label={say.export}
            onPress={() => downloadRuleSet(ruleSet, findPreset(basedOn ?? '') ? basedOn : null)}
          />
          <LinkButton href={`/rule-sets/compare?a=${ruleSet.id}`} label={say.compareThis} />
          <LinkButton kind="go" href={`/rule-sets/new?from=${ruleSet.id}`} label={say.makeOwn} />
        </>
      }
    >
      <BookAsked lines={8}>
        {(book) => (
          <View style={{ gap: space.double, maxWidth: 980 }}>
            {bySection(
              Object.values(book).filter(({ id }) => (ruleSet.rules[id]?.level ?? 'off') !== 'off'),
            ).map(({ section, pages }) => (
              <View key={section} style={{ gap: space.half }}>
                <Heading level={2}>{words.rules.section[section]}</Heading>
                <Rows label={words.rules.section[section]}>
                  {pages.map(({ id, title }) => (
                    <RuleLine key={id} ruleId={id} title={title} ruleSet={ruleSet} />
                  ))}
                </Rows>
              </View>
            ))}
          </View>
        )}
      </BookAsked>
    </Frame>
  )
}

function RuleLine({ ruleId, title, ruleSet }: Readonly<{ ruleId: string; title: string; ruleSet: RuleSet }>) {
  const words = useWords()
  const rule = findRule(ruleId)
  if (!rule) return null
  const { level, params } = standingOf(rule, ruleSet)
  const set = paramsInWords(params, Object.keys(params), rule, words)
  return (
    <Row
      side={
        <View style={{ flexDirection: 'row', alignItems: 'center', gap: space.small, width: 120 }}>
          <Lozenge
            kind={level === 'law' ? 'filled' : 'hollow'}
            tone={level === 'law' ? 'minium' : 'orpiment'}
          />
          <Txt>{words.rules.level[level]}</Txt>
        </View>
      }
    >
      <LinkText href={`/rules/${ruleId}`} label={title} tone="lampblack" />
      {set ? (
        <Txt kind="note" tone="lead">
          {set}
        </Txt>
      ) : null}
    </Row>
  )
}
