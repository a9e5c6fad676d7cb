export { useRuleBook, type RuleBookState } from './use-rule-book'
