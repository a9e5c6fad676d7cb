import { createSearch, type Search, type Ways } from '@/shared/search'
import { readExercise } from '@/shared/rules/exercise'
import type { WaysAnswer, WaysQuestion, WaysReply, WaysRequest } from './ways-messages'

/** Tries of a note between two looks at whether anything newer was asked: a few milliseconds. */
const TRIES_A_SLICE = 20_000

/** Nodes of one question on a phone; past that the answer is "at least". */
const MOST_NODES = 600_000

export type WaysService = Readonly<{ ask: (request: WaysRequest) => void }>

/**
 * Answers requests a slice at a time. A newer request puts the one at work aside; the search is kept as long as the
 * exercise, its rules and the bars set aside are the same, so that a changed note costs only what comes after it.
 * `later` runs the next slice once whatever has arrived in between was heard.
 */
export function createWaysService(
  reply: (reply: WaysReply) => void,
  later: (slice: () => void) => void,
): WaysService {
  let latest = -1
  let known: Readonly<{ identity: string; search: Search }> | null = null

  const searchFor = (request: WaysRequest): Search => {
    const { exercise, ruleSet, setAside } = request
    const identity = JSON.stringify([exercise, ruleSet.rules, setAside])
    if (known?.identity !== identity) {
      const search = createSearch(readExercise(exercise), ruleSet, {
        setAside: new Set(setAside),
        limits: { nodes: MOST_NODES },
      })
      known = { identity, search }
    }
    return known.search
  }

  const work = (request: WaysRequest, index: number): void => {
    const question = request.questions[index]
    if (!question || request.number !== latest) return
    const inquiry = searchFor(request).ask({ line: question.line })
    const goOn = (): void => {
      if (request.number !== latest) return
      if (!inquiry.advance(TRIES_A_SLICE)) return later(goOn)
      reply({ number: request.number, key: question.key, answer: answerOf(inquiry.ways(), question) })
      later(() => work(request, index + 1))
    }
    goOn()
  }

  return {
    ask: (request) => {
      latest = request.number
      later(() => work(request, 0))
    },
  }
}

function answerOf(ways: Ways, { aliveInBar }: WaysQuestion): WaysAnswer {
  const { count, isExact, deadEnd } = ways
  let alive: Record<string, string> | null = null
  if (aliveInBar !== undefined) {
    alive = {}
    const first = ways.alive().find(({ bar }) => bar === aliveInBar)
    const counts = new Map<string, bigint>()
    for (const note of first?.notes ?? []) {
      if (note.pitch !== null) counts.set(note.pitch, (counts.get(note.pitch) ?? 0n) + note.count)
    }
    for (const [pitch, ofPitch] of counts) alive[pitch] = String(ofPitch)
  }
  return { count: String(count), isExact, deadEnd, alive }
}
