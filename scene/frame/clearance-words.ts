import type { Digits, System } from '@/lib/units/quantities'
import { quantityText } from '@/lib/units/format'
import type { ListedClearance } from './clearance-list'

export const statusWords = { clear: 'clear', close: 'close', touches: 'touches' } as const

const length = (metres: number, system: System) => quantityText(metres, 'length', system, fine[system])
const fine: Record<System, Digits> = { si: { decimals: 1 }, us: { decimals: 3 } }

/** Within a sentence: only its first letter, ids keep theirs. */
export const inSentence = (text: string) => text.charAt(0).toLowerCase() + text.slice(1)

/** How a clearance stands, in a sentence: "Piston 3 touches counterweight 2F: gap −2.5 mm at 181.5°." */
export function clearanceSentence(clearance: ListedClearance, system: System): string {
  const { pair, gap, limit, status, labels } = clearance
  const [one, other] = labels
  const at = clearance.angle === null ? '' : ` at ${quantityText(clearance.angle, 'angle', system)}`
  if (pair.kind === 'piston-deck')
    return status === 'touches'
      ? `${one} stands ${length(-gap, system)} above the deck at top dead centre${at}.`
      : `${one} stays ${length(gap, system)} below the deck${at}.`
  if (status !== 'touches') {
    const left = `${one} to ${inSentence(other)}: ${length(gap, system)}${at}`
    return status === 'clear' ? `${left}.` : `${left}, less than the usual ${length(limit, system)}.`
  }
  if (pair.kind === 'bank-bank')
    return `${one} and ${inSentence(other)} overlap by ${length(-gap, system)} near the crank${at}.`
  if (pair.kind === 'bore-wall') return `${one} and ${inSentence(other)} overlap by ${length(-gap, system)}.`
  return `${one} touches ${inSentence(other)}: gap ${length(gap, system)}${at}.`
}

/** What a clearance was worked out with that the document does not state, or that the method leaves out. */
export const clearanceAssumption: Record<ListedClearance['pair']['kind'], string> = {
  'skirt-counterweight': 'The counterweight counts as the whole circle that its radius sweeps.',
  'skirt-web': 'The web counts as reaching no further than its crank pins.',
  'bank-bank':
    'Pistons as rectangles of bore by skirt to crown, by the separating-axis test: the true distance is never less.',
  'rod-bore':
    'Width of the rod’s shank and the bore’s lower edge as they are drawn, in proportion: the document gives neither.',
  'rod-rod': 'Shanks and eyes of the rods as they are drawn, in proportion: the document does not give them.',
  'piston-deck': 'Crown from the compression height; gasket and what stands on the crown left out.',
  'bore-wall': 'Bores without liners.',
}
