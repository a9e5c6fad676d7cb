import type { LessonIdentity } from '@/realtime/contract'
import { can, type Role } from '@/shared/board'
import type { PresentMember } from '@/shared/wire/rooms'

type Present = { name: string; role: PresentMember['role']; screens: number; hand: boolean }

/** Who is in one lesson. Members are counted, not their tabs and devices; a wall is nobody. */
export class Presence {
  readonly #members = new Map<string, Present>()

  arrive({ memberId, name, role }: LessonIdentity): void {
    if (memberId === null || role === 'wall') return
    const known = this.#members.get(memberId)
    if (known) Object.assign(known, { name, role, screens: known.screens + 1 })
    else this.#members.set(memberId, { name, role, screens: 1, hand: false })
  }

  depart({ memberId }: LessonIdentity): void {
    const known = memberId === null ? undefined : this.#members.get(memberId)
    if (known) known.screens = Math.max(0, known.screens - 1)
  }

  remove(memberId: string): void {
    this.#members.delete(memberId)
  }

  /** Raises or lowers a hand; false when that changed nothing. */
  setHand(memberId: string, isUp: boolean): boolean {
    const known = this.#members.get(memberId)
    if (!known || known.hand === isUp) return false
    known.hand = isUp
    return true
  }

  isHandUp(memberId: string): boolean {
    return this.#members.get(memberId)?.hand === true
  }

  has(memberId: string): boolean {
    return this.#members.has(memberId)
  }

  get isEmpty(): boolean {
    return [...this.#members.values()].every(({ screens }) => screens === 0)
  }

  /** How many are here now, and how many of them have a hand up. Teachers and assistants are not the class. */
  counts(): Readonly<{ here: number; hands: number }> {
    const pupils = [...this.#members.values()].filter(
      ({ role, screens }) => screens > 0 && can(role as Role, 'raise hand'),
    )
    return { here: pupils.length, hands: pupils.filter(({ hand }) => hand).length }
  }

  members(): readonly PresentMember[] {
    return [...this.#members]
      .map(([memberId, { name, role, screens, hand }]) => ({
        memberId,
        name,
        role,
        isOnline: screens > 0,
        hand,
      }))
      .sort((a, b) => a.name.localeCompare(b.name) || (a.memberId < b.memberId ? -1 : 1))
  }
}
