import { createHash, randomBytes } from 'node:crypto'

/** 192 bits that nobody can guess, safe in an address. */
export const newToken = () => randomBytes(24).toString('base64url')

/** What is kept of a token: enough to know it again, not enough to use it. */
export const hashToken = (token: string) => createHash('sha256').update(token).digest('hex')
