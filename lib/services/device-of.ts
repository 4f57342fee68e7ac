import type { LinkOpening } from '@/lib/contracts/share-links'

/** What programs that fetch pages call themselves, in general words; a browser's name has none of them. */
const robots = /bot\b|bots?[/ _-]|crawl|spider|slurp|scan|preview|fetch|monitor|check(er|ing)|https?:\/\/|^$/i

export const isRobot = (userAgent: string) => robots.test(userAgent.trim())

/** As coarse as it is of use: nothing that tells one visitor from another. */
export function deviceOf(userAgent: string): LinkOpening['device'] {
  if (/tablet|\bpad\b|ipad/i.test(userAgent)) return 'tablet'
  if (/mobi|phone/i.test(userAgent)) return 'phone'
  return /android/i.test(userAgent) ? 'tablet' : 'desktop'
}
