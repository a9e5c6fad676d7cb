import * as Y from 'yjs'
import {
  adoptBars,
  clearRoom,
  drawGesture,
  eraseGesture,
  eraseSheetBar,
  foldEvents,
  freezeBars,
  readBoard,
  readChorus,
  readSheet,
  releaseBars,
  setBarsAside,
  takeBackBars,
  takeBarsUp,
  updateStage,
  writeSheetBar,
  type ChorusState,
} from '@/shared/board'
import type { LessonIdentity } from '@/realtime/contract'
import { Random } from './support/random'
import { LESSON_ID, SimulatedHouse, SimulatedPhone } from './support/simulated-house'

const FIRST_SEED = 1_725
const SEEDS = Array.from({ length: 24 }, (_, index) => FIRST_SEED + index)
const STEPS = 400
const PITCHES = ['A4', 'B4', 'C5', 'C#5', 'D5'] as const
const BARS = 11

const identityOf = (role: LessonIdentity['role'], memberId: string | null): LessonIdentity => ({
  lessonId: LESSON_ID,
  memberId,
  role,
  name: '',
  sessionId: `session-of-${memberId}`,
})

/** Two lecterns, a wall, and three members of whom one has two tabs. */
function createHouse(random: Random) {
  const house = new SimulatedHouse(random)
  const join = (role: LessonIdentity['role'], memberId: string | null, kind: SimulatedPhone['kind']) => {
    const phone = new SimulatedPhone(house, identityOf(role, memberId), kind)
    house.phones.push(phone)
    return phone
  }
  const lecterns = [join('teacher', 'teacher', 'board'), join('assistant', 'helper', 'board')]
  const sheets = ['ada', 'ben', 'cleo', 'ada'].map((memberId) => join('student', memberId, 'sheet'))
  const wall = join('wall', null, 'chorus')
  const desk = join('student', 'ben', 'board')
  return { house, lecterns, sheets, wall, desk }
}

function actOnBoard(doc: Y.Doc, random: Random): void {
  const bars = [1 + random.below(BARS), 1 + random.below(BARS)]
  const from = 1 + random.below(BARS - 2)
  const notes = [{ pitch: random.pick(PITCHES), ticks: 1920 }]
  random.pick([
    () => releaseBars(doc, bars),
    () => releaseBars(doc, bars),
    () => freezeBars(doc, bars),
    () => setBarsAside(doc, bars),
    () => takeBarsUp(doc, bars),
    () => clearRoom(doc, bars),
    () => adoptBars(doc, { [bars[0] as number]: notes }),
    () => takeBackBars(doc, bars),
    () => updateStage(doc, { showsSpread: random.chance(0.5), prompt: `prompt ${random.below(9)}` }),
    () => void drawGesture(doc, `g${random.below(3)}`, { from, to: from + 2, label: `l${random.below(3)}` }),
    () => eraseGesture(doc, `g${random.below(3)}`),
  ])()
}

function actOnSheet(doc: Y.Doc, random: Random): void {
  const bar = 1 + random.below(BARS)
  if (random.chance(0.15)) return eraseSheetBar(doc, bar)
  if (random.chance(0.05)) return void doc.getMap('notes').set(String(bar), { notes: 'no notes' })
  writeSheetBar(doc, bar, [{ pitch: random.pick(PITCHES), ticks: 1920 }], 1 + random.below(3))
}

/** Keys of a chorus in one order, for comparing. */
const sorted = (chorus: ChorusState) =>
  Object.entries(chorus).flatMap(([bar, members]) =>
    Object.entries(members)
      .map(([memberId, proposal]) => ({ bar, memberId, ...proposal }))
      .sort((a, b) => (a.memberId < b.memberId ? -1 : 1)),
  )

describe(`a lesson over a network with mishaps, seeds from ${FIRST_SEED}`, () => {
  it.each(SEEDS)(
    'seed %i: comes to one state, loses nothing acknowledged, and its events tell it all',
    (seed) => {
      const random = new Random(seed)
      const { house, lecterns, sheets, wall, desk } = createHouse(random)
      for (let step = 0; step < STEPS; step += 1) {
        const draw = random.next()
        if (draw < 0.05) actOnBoard(random.pick(lecterns).doc, random)
        else if (draw < 0.2) actOnSheet(random.pick(sheets).doc, random)
        else if (draw < 0.3) house.beat(random.chance(0.1) ? random.pick(['lost', 'answer lost']) : 'kept')
        else if (draw < 0.33) random.pick(house.phones).disconnect()
        else if (draw < 0.38) random.pick(house.phones).connect()
        else if (draw < 0.383) house.kill()
        else house.wire.step()
        // Whatever a phone was ever told is kept is in the journal at that very moment.
        for (const { kept, kind, identity } of house.phones) {
          if (kept.size === 0) continue
          const doc = house.journal.docOf(kind === 'sheet' ? `sheet/${identity.memberId}` : kind)
          for (const [client, clock] of kept) {
            expect(Y.getState(doc.store, client)).toBeGreaterThanOrEqual(clock)
          }
        }
      }
      house.settle()

      const board = readBoard(house.room.board.doc)
      const chorus = readChorus(house.room.chorus.doc)
      for (const { doc } of [...lecterns, desk]) expect(readBoard(doc)).toEqual(board)
      expect(sorted(readChorus(wall.doc))).toEqual(sorted(chorus))
      for (const phone of sheets) {
        const memberId = phone.identity.memberId as string
        expect(readSheet(phone.doc)).toEqual(readSheet(house.room.sheets.get(memberId)?.doc as Y.Doc))
        expect(phone.isKept).toBe(true)
        // What stands in released bars is before the class, and nothing else is.
        for (const [bar, state] of Object.entries(board?.bars ?? {})) {
          if (state.state !== 'released') continue
          const written = readSheet(phone.doc).notes[Number(bar)]
          const standing = chorus[Number(bar)]?.[memberId]
          expect(standing).toEqual(written?.round === state.round ? written : undefined)
        }
      }
      // Another process would open exactly this.
      for (const live of house.room.documents) {
        const there = house.journal.docOf(live.name)
        expect(Y.encodeStateVector(there)).toEqual(Y.encodeStateVector(live.doc))
        for (const name of live.doc.share.keys()) {
          expect(there.getMap(name).toJSON()).toEqual(live.doc.getMap(name).toJSON())
        }
      }
      const told = foldEvents(house.journal.entries.map(({ event }) => event))
      expect(told?.board).toEqual(board)
      expect(sorted(told?.chorus ?? {})).toEqual(sorted(chorus))
    },
  )
})
