import { sql } from 'drizzle-orm'
import { check, index, integer, jsonb, pgEnum, pgTable, text, uuid } from 'drizzle-orm/pg-core'
import { createdAt, idColumn, instant } from './columns'
import { users } from './users'
import { workshops } from './workshops'

export const mailStateEnum = pgEnum('mail_state', ['waiting', 'sending', 'sent', 'failed', 'unsure', 'held'])

/**
 * The outbox: a row is written by the transaction that causes the mail, so that neither is there without the other.
 * What a letter is made of, `data` and the token with which it can be turned off, is gone as soon as nobody needs it.
 */
export const mails = pgTable(
  'mails',
  {
    id: idColumn(),
    /** Names what caused it: the same cause twice is one mail. */
    key: text('key').notNull().unique(),
    template: text('template').notNull(),
    toEmail: text('to_email').notNull(),
    toName: text('to_name').notNull(),
    userId: uuid('user_id').references(() => users.id, { onDelete: 'cascade' }),
    workshopId: uuid('workshop_id').references(() => workshops.id, { onDelete: 'cascade' }),
    messageId: text('message_id').notNull().unique(),
    data: jsonb('data').$type<unknown>(),
    unsubscribeToken: text('unsubscribe_token'),
    state: mailStateEnum('state').notNull().default('waiting'),
    attempts: integer('attempts').notNull().default(0),
    lastError: text('last_error'),
    /** Drawn anew by whoever takes the mail to send it: only they may say how it went. */
    claim: uuid('claim'),
    claimedAt: instant('claimed_at'),
    sentAt: instant('sent_at'),
    /** After this it would lead nowhere and is not sent any more. */
    endsAt: instant('ends_at'),
    createdAt: createdAt(),
  },
  (table) => [
    index('mails_of_workshop').on(table.workshopId, table.id),
    index('mails_of_reader').on(table.userId, table.template, table.createdAt),
    index('mails_open')
      .on(table.createdAt)
      .where(sql`${table.data} is not null`),
    check('mails_claimed', sql`(${table.state} <> 'sending') or (${table.claim} is not null)`),
    check('mails_sent_empty', sql`(${table.state} <> 'sent') or (${table.data} is null)`),
    check('mails_last_error', sql`length(${table.lastError}) <= 500`),
  ],
)
