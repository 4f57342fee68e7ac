import type { Sender } from '@/lib/config/mail-settings'

export interface Mail {
  /** The outbox's own: the same mail again has the same. */
  id: string
  messageId: string
  from: Sender
  to: { name: string; email: string }
  replyTo?: string
  subject: string
  text: string
  html: string
  headers: Record<string, string>
}

/** Where mail leaves the product. Never called inside a transaction. */
export interface Mailer {
  /** Whether handing over the same mail twice sends it once: then one that may have gone may be tried again. */
  repeatable: boolean
  /** Throws MailRefused or MailUnsure; whatever else it throws, the mail has not gone and may be tried again. */
  send(mail: Mail): Promise<void>
}

/** The other side will not take it, however often it is tried. */
export class MailRefused extends Error {}

/** It was handed over whole and no answer came: it may have gone or not, and nobody can be asked. */
export class MailUnsure extends Error {}
