import { Frame, useSession } from '@/components/session'
import { Refused, Txt, usePageMeasure } from '@/components/ui'
import { useWords } from '@/components/words'
import { findRule } from '@/shared/rules'
import { BookAsked } from './book-asked'
import { RuleArticle } from './rule-article'
import { sectionOf } from './sections'

/** The page of one rule, for anybody. */
export function RulePageScreen({ ruleId }: Readonly<{ ruleId: string }>) {
  const words = useWords()
  const say = words.rules
  const { me } = useSession()
  const { contentPx } = usePageMeasure()
  const rule = findRule(ruleId)
  const section = rule && sectionOf({ scope: rule.scope, species: [...rule.species] })
  const place =
    rule && section === 'several-species'
      ? say.inSpecies([...rule.species].map((species) => words.lesson.species[species]))
      : section && say.section[section]
  return (
    <Frame
      me={me && !me.isGuest ? me : null}
      title={rule?.explain.title ?? say.title}
      up={{ href: '/rules', label: say.up }}
      lede={place ? <Txt tone="lead">{place}</Txt> : undefined}
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
