import type { ReactNode } from 'react'
import { View } from 'react-native'
import { Asked, useQuery } from '@/components/api'
import { Frame } from '@/components/session'
import { space } from '@/components/theme'
import { Empty, Heading, LinkButton, LinkText, Name, Row, Rows, Txt } from '@/components/ui'
import { formatDate, useWords } from '@/components/words'
import { api } from '@/shared/api'
import type { Me } from '@/shared/api/people'
import type { RuleSetSummary } from '@/shared/api/rule-sets'
import { findPreset, PRESETS, type RuleSet } from '@/shared/rules'
import { ImportRuleSet } from './import-rule-set'

const countsOf = ({ rules }: RuleSet): readonly [laws: number, preferences: number] => {
  const levels = Object.values(rules).map(({ level }) => level)
  const count = (wanted: string) => levels.filter((level) => level === wanted).length
  return [count('law'), count('preference')]
}

/** Every rule set one may use: those offered here, one's own, and those shared with one's courses. */
export function RuleSetList({ me }: Readonly<{ me: Me }>) {
  const say = useWords().ruleSets
  const query = useQuery(api.ruleSets.list, {})
  return (
    <Frame
      me={me}
      title={say.title}
      lede={say.lede}
      actions={
        <>
          <LinkButton href="/rules" label={say.book} />
          <LinkButton href="/rule-sets/compare" label={say.compare} />
        </>
      }
    >
      <View style={{ gap: space.double, maxWidth: 980 }}>
        <Asked query={query} lines={3}>
          {({ ruleSets }) => {
            const shared = ruleSets.filter(({ isMine }) => !isMine)
            return (
              <View style={{ gap: space.double }}>
                <Group title={say.own} isEmpty={!ruleSets.some(({ isMine }) => isMine)}>
                  {ruleSets
                    .filter(({ isMine }) => isMine)
                    .map((one) => (
                      <KeptRow key={one.id} ruleSet={one} />
                    ))}
                </Group>
                {shared.length > 0 ? (
                  <Group title={say.shared}>
                    {shared.map((one) => (
                      <KeptRow key={one.id} ruleSet={one} />
                    ))}
                  </Group>
                ) : null}
              </View>
            )
          }}
        </Asked>
        <Group title={say.offered}>
          {PRESETS.map((preset) => (
            <Row
              key={preset.id}
              side={<LinkButton href={`/rule-sets/new?from=${preset.id}`} label={say.makeOwn} />}
            >
              <LinkText href={`/rule-sets/${preset.id}`} label={preset.name} isStrong />
              <Txt kind="note" tone="lead">
                {say.counts(...countsOf(preset))}
              </Txt>
            </Row>
          ))}
        </Group>
        <View style={{ gap: space.small, maxWidth: 620 }}>
          <ImportRuleSet />
          <Txt kind="note" tone="lead">
            {say.importHint}
          </Txt>
        </View>
      </View>
    </Frame>
  )
}

function Group({
  title,
  isEmpty = false,
  children,
}: Readonly<{ title: string; isEmpty?: boolean; children: ReactNode }>) {
  const say = useWords().ruleSets
  return (
    <View style={{ gap: space.half }}>
      <Heading level={2}>{title}</Heading>
      {isEmpty ? <Empty title={say.none}>{say.noneMore}</Empty> : <Rows label={title}>{children}</Rows>}
    </View>
  )
}

function KeptRow({ ruleSet }: Readonly<{ ruleSet: RuleSetSummary }>) {
  const say = useWords().ruleSets
  const from = ruleSet.basedOn === null ? null : findPreset(ruleSet.basedOn)
  const facts = [
    say.counts(ruleSet.laws, ruleSet.preferences),
    ...(from ? [say.basedOn(from.name)] : []),
    ...(ruleSet.courseId ? [say.sharedSome] : []),
    formatDate(ruleSet.updatedAt),
  ]
  return (
    <Row side={<LinkButton href={`/rule-sets/new?from=${ruleSet.id}`} label={say.makeOwn} />}>
      <LinkText href={`/rule-sets/${ruleSet.id}`} isStrong>
        <Name>{ruleSet.name}</Name>
      </LinkText>
      <Txt kind="note" tone="lead">
        {facts.join('; ')}
      </Txt>
    </Row>
  )
}
