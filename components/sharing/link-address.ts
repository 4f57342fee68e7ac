import { addressOf } from '@/lib/contracts/call'

/** The token of a link and, in a frame where no cookies are sent, the proof that its password was given. */
export interface LinkHeld {
  token: string
  pass: string | null
}

export const linkAddress = ({ token, pass }: LinkHeld, path: string) =>
  addressOf(`/api/v1/shared/{token}${path}`, { token }, { pass: pass ?? undefined })
