/** Something in what was asked for, with the path of the field, what is wrong and what would be right. */
export interface Issue {
  path: string
  code: string
  message: string
  fix: string
}

/** Every way a request can be answered otherwise than asked, and the one place where it gets its status. */
export const problemKinds = {
  unreadable: { status: 400, title: 'The request cannot be read' },
  'not-signed-in': { status: 401, title: 'Not signed in' },
  'password-wanted': { status: 401, title: 'A password is wanted' },
  'not-allowed': { status: 403, title: 'Not allowed' },
  'foreign-origin': { status: 403, title: 'Sent from another site' },
  'not-found': { status: 404, title: 'Not here' },
  conflict: { status: 409, title: 'Somebody was there first' },
  held: { status: 409, title: 'Held' },
  taken: { status: 409, title: 'Already in use' },
  'too-large': { status: 413, title: 'Too large' },
  'wrong-type': { status: 415, title: 'Not JSON' },
  refused: { status: 422, title: 'Refused' },
  'too-many': { status: 429, title: 'Too many requests' },
  fault: { status: 500, title: 'A fault of ours' },
  unavailable: { status: 503, title: 'Not ready' },
} as const

export type ProblemKind = keyof typeof problemKinds

interface ProblemExtras {
  issues?: Issue[]
  /** Members beside the standard ones (RFC 9457, section 3.2). */
  members?: Record<string, unknown>
  retryAfterSeconds?: number
  cause?: unknown
}

/** The one error that reaches whoever asked: what is the matter, and what to do about it. */
export class Problem extends Error {
  readonly status: number
  readonly issues?: Issue[]
  readonly members: Record<string, unknown>
  readonly retryAfterSeconds?: number

  constructor(
    readonly kind: ProblemKind,
    detail: string,
    readonly cure: string,
    extras: ProblemExtras = {},
  ) {
    super(detail, { cause: extras.cause })
    this.name = 'Problem'
    this.status = problemKinds[kind].status
    this.issues = extras.issues
    this.members = extras.members ?? {}
    this.retryAfterSeconds = extras.retryAfterSeconds
  }

  /** As RFC 9457 wants it said. */
  toJSON() {
    return {
      type: `/problems/${this.kind}`,
      title: problemKinds[this.kind].title,
      status: this.status,
      detail: this.message,
      cure: this.cure,
      ...(this.issues && { issues: this.issues }),
      ...this.members,
    }
  }
}

export const notSignedIn = () =>
  new Problem('not-signed-in', 'This needs an account.', 'Sign in, then try again.')

/** One text for a token that is unknown, ended, revoked or worth more than the present role of whoever made it. */
export const tokenUnknown = () =>
  new Problem('not-signed-in', 'This token opens nothing.', 'Make a new one under Account.')

export const notByToken = () =>
  new Problem('not-allowed', 'A program cannot do this with a token.', 'Sign in and do it on the page.')

export const notFound = (what: string) =>
  new Problem('not-found', `There is no such ${what} here.`, 'Check the address, or go back to the list.')

/** One text for a link that is unknown, ended or withdrawn. */
export const linkUnavailable = () =>
  new Problem('not-found', 'This link is not available.', 'Ask the person who sent it.')

/** All that is said of a link with a password to whoever has not given it. */
export const passwordWanted = () =>
  new Problem('password-wanted', 'This link wants a password.', 'Ask the person who sent it.')

/** One text for an invitation that is unknown, used, ended or withdrawn. */
export const invitationUnavailable = () =>
  new Problem('not-found', 'This invitation is not available.', 'Ask the person who sent it.')

export const refused = (issues: Issue[]) =>
  new Problem(
    'refused',
    issues.length === 1 ? issues[0].message : `${issues.length} things stand in the way.`,
    issues.length === 1 ? issues[0].fix : 'Each is listed with what would be right.',
    { issues },
  )
