import { randomBytes } from 'node:crypto'
import { customType, timestamp, uuid } from 'drizzle-orm/pg-core'

/** A UUID of version 7 (RFC 9562): begins with the time, so that keys grow and pages of an index fill in order. */
export function newId(): string {
  const bytes = randomBytes(16)
  bytes.writeUIntBE(Date.now(), 0, 6)
  bytes[6] = (bytes[6] & 0x0f) | 0x70
  bytes[8] = (bytes[8] & 0x3f) | 0x80
  const hex = bytes.toString('hex')
  return [hex.slice(0, 8), hex.slice(8, 12), hex.slice(12, 16), hex.slice(16, 20), hex.slice(20)].join('-')
}

export const idColumn = () => uuid('id').primaryKey().$defaultFn(newId)

/** Milliseconds, as in JavaScript, so that a time read, sent and handed back as a cursor is the same time. */
export const instant = (name: string) => timestamp(name, { withTimezone: true, precision: 3 })
export const createdAt = () => instant('created_at').notNull().defaultNow()

/** A file kept in the database, where every server sees it. */
export const bytes = customType<{ data: Uint8Array<ArrayBuffer>; driverData: Buffer }>({
  dataType: () => 'bytea',
  toDriver: (value) => Buffer.from(value),
  fromDriver: (value) => Uint8Array.from(value),
})
