import { found } from '@/server/errors/refused'
import { createRouter } from '@/server/http/create-router'
import { demo } from '@/shared/api/demo'
import type { Context } from './context'

export function createDemoRoutes(context: Context) {
  const { router, on } = createRouter()

  on(demo.mail, async () => ({ messages: [...found(context.demo).mail.messages()] }))

  on(demo.people, async () => {
    const { password, people } = found(context.demo).people
    return { password, people: [...people] }
  })

  return router
}
