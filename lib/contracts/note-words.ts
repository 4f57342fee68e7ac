import type { NoteStanding, Settlement } from './notes'

/** "fixed in version 4": why a note was settled. */
export function settlementInWords(settlement: Settlement): string {
  switch (settlement.reason) {
    case 'fixed':
      return `fixed in version ${settlement.version}`
    case 'will-not-change':
      return 'will not change'
    case 'duplicate':
      return `duplicate of note ${settlement.number}`
    case 'answered':
      return 'question answered'
  }
}

/** How the pinned part stands in the version that is looked at; empty where it is as it was. */
export function standingInWords({ standing, changes }: NoteStanding): string {
  if (standing === 'same') return ''
  if (standing === 'gone') return 'part gone'
  const listed = changes.map(({ name, from, to, unit }) => `${name} ${from} to ${to}${unit && ` ${unit}`}`)
  return `part changed: ${listed.join('; ')}`
}
