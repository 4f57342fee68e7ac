import { holds, roleIn, type Operation, type Person } from '@/lib/auth/access'
import { editMinutes } from '@/lib/contracts/notes'

/** Whoever reads or writes notes: who they are, what their role lets, and when. */
export interface Reader {
  person: Person
  may(operation: Operation): boolean
  now: Date
}

export function readerOf(person: Person, workshopId: string): Reader {
  const role = roleIn(person, workshopId)
  return { person, now: new Date(), may: (operation) => role !== undefined && holds(role, operation) }
}

interface Written {
  authorId: string | null
}

export const isOwn = ({ person }: Reader, { authorId }: Written) => authorId === person.id

/** Its author, and whoever judges. */
export const maySettle = (reader: Reader, note: Written) =>
  reader.may('note.settle-any') || (isOwn(reader, note) && reader.may('note.settle'))

export const mayDelete = (reader: Reader, post: Written) =>
  reader.may('note.delete-any') || (isOwn(reader, post) && reader.may('note.write'))

/** Until when somebody may change what they wrote; null for what is not theirs, or is too old. */
export function editableUntil(
  reader: Reader,
  { createdAt, ...post }: Written & { createdAt: Date },
): Date | null {
  const until = new Date(createdAt.getTime() + editMinutes * 60_000)
  return isOwn(reader, post) && reader.may('note.write') && until > reader.now ? until : null
}
