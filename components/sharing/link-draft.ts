import type { Operation } from '@/lib/auth/access'
import type { LinkKind } from '@/lib/auth/access'
import type { ShareLink } from '@/lib/contracts/share-links'

const dayMs = 86_400_000

export const ends = ['1', '7', '30', '90', 'day', 'none', 'kept'] as const
export type Ends = (typeof ends)[number]

/** What stands in the fields of a link, as it is typed. */
export interface LinkDraft {
  label: string
  kind: LinkKind
  pinned: 'latest' | 'pinned'
  ends: Ends
  /** With `ends` a day: the last one, in the zone of whoever types. */
  day: string
  lock: 'open' | 'new' | 'kept'
  password: string
  /** One a line. */
  origins: string
}

export const newDraft = (): LinkDraft => ({
  ...{
    label: '',
    kind: 'look',
    pinned: 'latest',
    ends: '30',
    day: '',
    lock: 'open',
    password: '',
    origins: '',
  },
})

export const draftOf = (link: ShareLink): LinkDraft => ({
  ...{ label: link.label, kind: link.kind, pinned: link.version === null ? 'latest' : 'pinned' },
  ...{ ends: 'kept', day: '', lock: link.locked ? 'kept' : 'open', password: '' },
  origins: link.frameOrigins.join('\n'),
})

export const kindWords: Record<LinkKind, string> = {
  look: 'look',
  note: 'look and note',
  decide: 'decide',
}

export const endWords: Record<Ends, string> = {
  '1': '24 hours',
  '7': '7 days',
  '30': '30 days',
  '90': '90 days',
  day: 'a day…',
  none: 'not until withdrawn',
  kept: 'as it is',
}

/** Ends that this person may choose; one without an end is for owners. */
export const endsFor = (may: readonly Operation[], changing: boolean) =>
  ends.filter((end) => (end === 'none' ? may.includes('link.endless') : end === 'kept' ? changing : true))

function endOf({ ends: end, day }: LinkDraft, now: number): string | null | undefined {
  if (end === 'kept') return undefined
  if (end === 'none') return null
  // the whole of the day, as its typist has it; without one nothing is said and the usual end holds
  if (end === 'day') return day === '' ? undefined : new Date(`${day}T23:59:59`).toISOString()
  return new Date(now + Number(end) * dayMs).toISOString()
}

/** The draft as the interface takes it. `version` is the one that a pinned link opens. */
export const bodyOf = (draft: LinkDraft, version: number, now: number) => ({
  label: draft.label,
  kind: draft.kind,
  version: draft.pinned === 'pinned' ? version : null,
  endsAt: endOf(draft, now),
  password: draft.lock === 'kept' ? undefined : draft.lock === 'open' ? null : draft.password,
  frameOrigins: draft.origins
    .split(/[\s,]+/)
    .map((one) => one.trim())
    .filter((one) => one !== ''),
})

/** "ends in 3 days", by the clock of whoever reads. */
export function endInWords({ state, endsAt }: Pick<ShareLink, 'state' | 'endsAt'>, now: number): string {
  if (state !== 'live') return state
  if (endsAt === null) return 'open until withdrawn'
  const hours = Math.max(1, Math.round((Date.parse(endsAt) - now) / 3_600_000))
  if (hours < 48) return `ends in ${hours} ${hours === 1 ? 'hour' : 'hours'}`
  return `ends in ${Math.round(hours / 24)} days`
}
