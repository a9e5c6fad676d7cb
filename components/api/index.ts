export {
  callApi,
  createApiClient,
  readRefusal,
  refusalOf,
  type AnyEndpoint,
  type Call,
  type InputOf,
  type Refusal,
  type ReplyOf,
} from './call'
export { useQuery, type Query } from './use-query'
export { useAct, useMutation, type Mutation } from './use-mutation'
export { RefusalNotice, RefusedPage } from './refusal-notice'
export { Asked } from './asked'
export { firstProblems } from './first-problems'
