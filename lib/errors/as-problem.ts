import { Problem } from './problem'

/** What the driver and the server say when it is the database, not the request, that is at fault. */
const passing = new Set([
  'ECONNREFUSED',
  'ECONNRESET',
  'CONNECT_TIMEOUT',
  'CONNECTION_CLOSED',
  'CONNECTION_ENDED',
  'CONNECTION_DESTROYED',
  'DEADLINE',
  '40P01', // deadlock
  '53300', // too many connections
  '55P03', // lock not available
  '57014', // statement timeout
  '57P01', // shut down by its administrator
  '57P02',
  '57P03', // starting up
])

/** The code of an error or of what caused it, such as "23505" for a unique violation. */
export function errorCode(error: unknown): string | undefined {
  for (let it = error; it instanceof Error; it = it.cause) {
    if ('code' in it && typeof it.code === 'string') return it.code
  }
  return undefined
}

/** Whatever went wrong, as a problem that says nothing of our insides. */
export function asProblem(error: unknown): Problem {
  if (error instanceof Problem) return error
  return passing.has(errorCode(error) ?? '')
    ? new Problem(
        'unavailable',
        'The database did not answer.',
        'Nothing was changed. Try again in a moment.',
        {
          retryAfterSeconds: 5,
          cause: error,
        },
      )
    : new Problem(
        'fault',
        'Something here went wrong.',
        'Nothing was changed. Try again; if it stays, tell us when it was.',
        {
          cause: error,
        },
      )
}
