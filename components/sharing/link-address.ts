/** The token of a link and, in a frame where no cookies are sent, the proof that its password was given. */
export interface LinkHeld {
  token: string
  pass: string | null
}

/** Written out here: a page that counts its scripts needs no more of the client. */
export const linkAddress = ({ token, pass }: LinkHeld, path: string) =>
  `/api/v1/shared/${encodeURIComponent(token)}${path}${pass ? `?pass=${encodeURIComponent(pass)}` : ''}`
