/** A letter before it has a form: text and HTML are both written from this. */
export interface Letter {
  subject: string
  /** Whom it greets, if by name. */
  greeting: string | null
  blocks: Block[]
  /** Who sent it and why one gets it. */
  because: string
  /** Whom an answer goes to, where that is not the sender. */
  replyTo?: string
}

export type Block =
  | { is: 'words'; text: string }
  /** Somebody's own words. */
  | { is: 'quote'; text: string }
  | { is: 'link'; label: string; url: string }

export const words = (text: string): Block => ({ is: 'words', text })
export const link = (label: string, url: string): Block => ({ is: 'link', label, url })
/** Nothing said is nothing quoted. */
export const quote = (text: string): Block[] =>
  text.trim() === '' ? [] : [{ is: 'quote', text: text.trim() }]
