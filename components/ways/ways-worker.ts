/** The search, off the main thread: what a message asks is answered by messages, question by question. */
import type { WaysReply, WaysRequest } from './ways-messages'
import { createWaysService } from './ways-service'

type Scope = Readonly<{
  postMessage: (reply: WaysReply) => void
  addEventListener: (kind: 'message', hear: (event: MessageEvent<WaysRequest>) => void) => void
}>
const scope = globalThis as unknown as Scope

// A task of its own between slices, so that a newer request is heard; a timer would be held back to milliseconds.
const channel = new MessageChannel()
let slices: (() => void)[] = []
channel.port1.onmessage = () => {
  const due = slices
  slices = []
  for (const slice of due) slice()
}

const service = createWaysService(
  (reply) => scope.postMessage(reply),
  (slice) => {
    slices.push(slice)
    channel.port2.postMessage(null)
  },
)
scope.addEventListener('message', ({ data }) => service.ask(data))
