export interface Mail {
  to: string
  subject: string
  text: string
}

/** Where mail leaves the product. Never called inside a transaction. */
export interface Mailer {
  send(mail: Mail): Promise<void>
}
