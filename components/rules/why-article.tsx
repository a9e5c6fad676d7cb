import type { RuleId } from '@/shared/rules'
import { BookAsked } from './book-asked'
import { RuleArticle } from './rule-article'

/** A rule's page without its frame, to be laid over a lesson. */
export function WhyArticle({ ruleId, widthPx }: Readonly<{ ruleId: RuleId; widthPx: number }>) {
  return (
    <BookAsked lines={6}>
      {(book) => {
        const page = book[ruleId]
        return page ? <RuleArticle page={page} widthPx={widthPx} /> : null
      }}
    </BookAsked>
  )
}
