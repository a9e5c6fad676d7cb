import type { DocumentChange, LiveDocument } from '@/realtime/document/live-document'
import { carryProposals } from '@/realtime/scribe/carry-proposals'
import { writeSpread } from '@/realtime/scribe/write-spread'
import {
  deriveBoardEvents,
  formatProposalKey,
  readChorus,
  updateChorus,
  type BoardEvent,
  type BoardState,
  type ChorusState,
} from '@/shared/board'
import { parseBar, parseValue } from '@/shared/board/parse-value'
import { sheetBarSchema } from '@/shared/wire/documents'
import type { Batch } from './batch'

/** The spread goes to every phone, so it is not sent at every beat. */
const SPREAD_MS = 400

/** Carries the sheets into the chorus, and the chorus without its names onto the board, once a beat. */
export class Scribe {
  readonly #board: LiveDocument
  readonly #chorus: LiveDocument
  readonly #sheets: ReadonlyMap<string, LiveDocument>
  readonly #removed: Set<string>
  #chorusState: ChorusState
  /** Bars written on since the last beat, by member. */
  #changed = new Map<string, Set<number>>()
  #toErase = new Set<string>()
  #spreadBars = new Set<number>()
  #nextSpreadMs = 0

  constructor(
    board: LiveDocument,
    chorus: LiveDocument,
    sheets: ReadonlyMap<string, LiveDocument>,
    removed: Iterable<string>,
  ) {
    this.#board = board
    this.#chorus = chorus
    this.#sheets = sheets
    this.#removed = new Set(removed)
    this.#chorusState = readChorus(chorus.doc)
  }

  /** A sheet was written on. */
  note(memberId: string, keys: DocumentChange['keys']): void {
    const bars = this.#changed.get(memberId) ?? new Set()
    for (const key of keys.get('notes') ?? []) {
      const bar = parseBar(key)
      if (bar !== null) bars.add(bar)
    }
    if (bars.size > 0) this.#changed.set(memberId, bars)
  }

  remove(memberId: string): void {
    this.#removed.add(memberId)
    this.#toErase.add(memberId)
  }

  /** After documents were set back: nothing that was noted is true any more. */
  startAgain(): void {
    this.#chorusState = readChorus(this.#chorus.doc)
    this.#changed.clear()
    for (const memberId of this.#removed) this.#toErase.add(memberId)
  }

  boardEvents(before: BoardState | null, after: BoardState | null): readonly BoardEvent[] {
    return after ? deriveBoardEvents(before, after) : []
  }

  /** Writes chorus and spread into the batch. Gives the time after which it wants another beat, if any. */
  write(batch: Batch, before: BoardState | null, board: BoardState | null, nowMs: number): number | null {
    const changed = this.#changed
    this.#changed = new Map()
    if (!board) return null
    if (changed.size > 0 || before !== board || this.#toErase.size > 0) {
      this.#carry(batch, before, board, changed)
    }
    return this.#spread(batch, before, board, nowMs)
  }

  #carry(
    batch: Batch,
    before: BoardState | null,
    board: BoardState,
    changed: ReadonlyMap<string, ReadonlySet<number>>,
  ): void {
    const isHere = (memberId: string) => !this.#removed.has(memberId)
    const { place, erase } = carryProposals({
      before,
      board,
      chorus: this.#chorusState,
      changed: new Map([...changed].filter(([memberId]) => isHere(memberId))),
      members: [...this.#sheets.keys()].filter(isHere),
      readBar: (memberId, bar) => {
        const doc = this.#sheets.get(memberId)?.doc
        if (!doc || !isHere(memberId)) return null
        return parseValue(sheetBarSchema, doc.getMap<unknown>('notes').get(String(bar)))
      },
    })
    const gone = this.#eraseRemoved()
    const erased = [...erase, ...gone.filter((one) => !erase.some((other) => isSamePlace(one, other)))]
    if (place.length === 0 && erased.length === 0) return
    const change = this.#chorus.write((doc) => {
      const proposals = doc.getMap<unknown>('proposals')
      for (const { bar, memberId } of erased) proposals.delete(formatProposalKey(bar, memberId))
      for (const { bar, memberId, proposal } of place) {
        proposals.set(formatProposalKey(bar, memberId), { ...proposal })
      }
    })
    if (!change) return
    const keys = change.keys.get('proposals') ?? []
    this.#chorusState = updateChorus(this.#chorusState, this.#chorus.doc, keys)
    batch.addChange(this.#chorus, change.bytes, null, null)
    for (const { bar, memberId, isOver } of erased) {
      this.#spreadBars.add(bar)
      if (!isOver) batch.addEvents(memberId, [{ kind: 'proposal-erased', bar, memberId }])
    }
    for (const { bar, memberId, proposal } of place) {
      this.#spreadBars.add(bar)
      batch.addEvents(memberId, [{ kind: 'proposal-placed', bar, memberId, ...proposal }])
    }
  }

  /** Standing proposals of members who were sent out. */
  #eraseRemoved(): readonly Readonly<{ bar: number; memberId: string; isOver: boolean }>[] {
    const members = this.#toErase
    this.#toErase = new Set()
    if (members.size === 0) return []
    return Object.entries(this.#chorusState).flatMap(([bar, proposals]) =>
      Object.keys(proposals)
        .filter((memberId) => members.has(memberId))
        .map((memberId) => ({ bar: Number(bar), memberId, isOver: false })),
    )
  }

  #spread(batch: Batch, before: BoardState | null, board: BoardState, nowMs: number): number | null {
    const isShown = board.stage.showsSpread
    const isTurned = isShown !== (before?.stage.showsSpread ?? false)
    if (!isShown) {
      this.#spreadBars.clear()
      if (!isTurned) return null
    }
    if (isTurned) this.#spreadBars = new Set(Object.keys(board.bars).map(Number))
    if (this.#spreadBars.size === 0) return null
    if (!isTurned && nowMs < this.#nextSpreadMs) return this.#nextSpreadMs - nowMs
    const bars = this.#spreadBars
    this.#spreadBars = new Set()
    this.#nextSpreadMs = nowMs + SPREAD_MS
    const change = this.#board.write((doc) => writeSpread(doc, board, this.#chorusState, bars))
    if (change) batch.addChange(this.#board, change.bytes, null, null)
    return null
  }
}

const isSamePlace = (
  a: Readonly<{ bar: number; memberId: string }>,
  b: Readonly<{ bar: number; memberId: string }>,
): boolean => a.bar === b.bar && a.memberId === b.memberId
