import { Router } from 'express'
import { RULE_SET_SCHEMA_PATH } from '@/shared/rule-sets/rule-set-file'
import { createRuleSetJsonSchema } from '@/shared/rule-sets/rule-set-json-schema'

/** The published schemas of files that leave the house. Made from what reads those files, so that the two cannot part. */
export function serveSchemas(): Router {
  const router = Router()
  const body = JSON.stringify(createRuleSetJsonSchema(RULE_SET_SCHEMA_PATH), null, 2)
  router.get(RULE_SET_SCHEMA_PATH, (_request, response) => {
    response.setHeader('Cache-Control', 'no-cache')
    // Editors on other machines fetch it; it says nothing that is not published.
    response.setHeader('Access-Control-Allow-Origin', '*')
    response.type('application/schema+json').send(body)
  })
  return router
}
