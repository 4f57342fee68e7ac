import type { ClearanceSizes } from '@/lib/mechanics/clearance/sizes'
import type { Train } from '@/lib/mechanics/train'
import type { ListedClearance } from '@/scene/frame/clearance-list'
import type { Behind } from './behind'

/** What stands behind a clearance that has a formula; the others are searched over the turn. */
export function behindClearance(
  { pair }: ListedClearance,
  { cylinders }: Train,
  sizes: ClearanceSizes,
): Behind | undefined {
  const cylinder = cylinders[pair.cylinder].id
  const piston = sizes.pistons[pair.cylinder]
  switch (pair.kind) {
    case 'skirt-counterweight':
      return {
        figure: 'skirt-to-counterweight',
        cylinder,
        sizes: {
          skirtBelowPin: piston?.skirt,
          counterweightRadius: sizes.counterweights[pair.counterweight]?.radius,
        },
      }
    case 'piston-deck':
      return {
        figure: 'piston-to-deck',
        cylinder,
        sizes: { crownAbovePin: piston?.crown, deckHeight: sizes.deck ?? undefined },
      }
    case 'bore-wall':
      return { figure: 'bore-wall', cylinder, other: cylinders[pair.other].id }
    default:
      return undefined
  }
}
