import { Frame, useSession } from '@/components/session'
import { Refused, Txt, usePageMeasure } from '@/components/ui'
import { useWords } from '@/components/words'
import { findRule } from '@/shared/rules'
import { BookAsked } from './book-asked'
import { RuleArticle } from './rule-article'
import { sectionOf } from './sections'

/** The page of one rule, for anybody. */
export function RulePageScreen({ ruleId }: Readonly<{ ruleId: string }>) {
  const say = useWords().rules
  const { me } = useSession()
  const { contentPx } = usePageMeasure()
  const rule = findRule(ruleId)
  return (
    <Frame
      me={me && !me.isGuest ? me : null}
      title={rule?.explain.title ?? say.title}
      up={{ href: '/rules', label: say.up }}
      lede={
        rule ? (
          <Txt tone="lead">{say.section[sectionOf({ scope: rule.scope, species: [...rule.species] })]}</Txt>
        ) : undefined
      }
    >
      {rule ? (
        <BookAsked lines={8}>
          {(book) => {
            const page = book[ruleId]
            return page ? <RuleArticle page={page} widthPx={Math.min(contentPx, 1240)} /> : null
          }}
        </BookAsked>
      ) : (
        <Refused title={say.unknown} href="/rules" linkLabel={say.title}>
          {say.unknownMore}
        </Refused>
      )}
    </Frame>
  )
}
