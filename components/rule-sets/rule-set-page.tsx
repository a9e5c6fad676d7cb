import { RefusedPage } from '@/components/api'
import { Frame } from '@/components/session'
import { Loading } from '@/components/ui'
import { useWords } from '@/components/words'
import type { Me } from '@/shared/api/people'
import { findPreset } from '@/shared/rules'
import { RuleSetEditor } from './rule-set-editor'
import { RuleSetView } from './rule-set-view'
import { useRuleSet } from './use-rule-set'

/** One rule set: one's own to change, another's or a preset to look at. */
export function RuleSetPage({ me, ruleSetId }: Readonly<{ me: Me; ruleSetId: string }>) {
  return (
    <Found me={me} id={ruleSetId}>
      {({ ruleSet, kept }) =>
        kept?.isMine ? (
          <RuleSetEditor me={me} start={ruleSet} keptAs={kept} basedOn={kept.basedOn} />
        ) : (
          <RuleSetView me={me} ruleSet={ruleSet} basedOn={kept ? kept.basedOn : ruleSet.id} />
        )
      }
    </Found>
  )
}

/** A new rule set, started from another. */
export function NewRuleSetPage({ me, fromId }: Readonly<{ me: Me; fromId: string }>) {
  return (
    <Found me={me} id={fromId}>
      {({ ruleSet, kept }) => (
        <RuleSetEditor
          key={fromId}
          me={me}
          start={ruleSet}
          keptAs={null}
          basedOn={kept ? kept.basedOn : (findPreset(ruleSet.id)?.id ?? null)}
        />
      )}
    </Found>
  )
}

function Found({
  me,
  id,
  children,
}: Readonly<{
  me: Me
  id: string
  children: (found: NonNullable<ReturnType<typeof useRuleSet>['data']>) => React.ReactNode
}>) {
  const words = useWords().ruleSets
  const query = useRuleSet(id)
  if (query.data) return <>{children(query.data)}</>
  return (
    <Frame me={me} title={words.title} up={{ href: '/rule-sets', label: words.up }}>
      {query.refusal ? <RefusedPage refusal={query.refusal} onRetry={query.reload} /> : <Loading />}
    </Frame>
  )
}
