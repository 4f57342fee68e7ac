import { clearances, type Clearance } from '@/lib/mechanics/clearance/clearances'
import type { Pair } from '@/lib/mechanics/clearance/pairs'
import type { ClearanceSizes } from '@/lib/mechanics/clearance/sizes'
import type { Train } from '@/lib/mechanics/train'
import type { CrankTrain } from '@/scene/model/crank-train'
import { clearanceBodies } from './clearance-bodies'
import type { Part, Rig } from './types'

/** A clearance with the two parts of the drawing it is between. */
export interface ListedClearance extends Clearance {
  /** The same for the same pair of any version of an engine. */
  id: string
  /** What is looked at: "Skirt to counterweight". */
  name: string
  /** Ids of the drawn parts, and what they are called. */
  parts: [string, string]
  labels: [string, string]
}

export interface ClearanceList {
  sizes: ClearanceSizes
  clearances: ListedClearance[]
  /** What cannot be told, and for want of which figure. */
  notKnown: { name: string; why: string }[]
}

export const clearanceNames: Record<Pair['kind'], string> = {
  'skirt-counterweight': 'Skirt to counterweight',
  'skirt-web': 'Skirt to web',
  'bank-bank': 'Bank to bank',
  'rod-bore': 'Rod to bore edge',
  'rod-rod': 'Rod to rod on one master',
  'piston-deck': 'Piston to deck',
  'bore-wall': 'Wall between bores',
}

/** Every clearance of an engine, the tightest against its limit first. */
export function clearanceList(document: CrankTrain, train: Train, rig: Rig): ClearanceList {
  const { sizes, webParts } = clearanceBodies(document, train, rig)
  const labels = new Map(rig.parts.map(({ id, label }) => [id, label]))
  const list = clearances(train, sizes).map((clearance): ListedClearance => {
    const parts = partsOf(clearance.pair, train, webParts)
    const [one, other] = parts.map((id) => labels.get(id) ?? id)
    return {
      ...clearance,
      id: `${clearance.pair.kind} ${parts.join(' ')}`,
      name: clearanceNames[clearance.pair.kind],
      parts,
      labels: [one, other],
    }
  })
  return { sizes, clearances: list, notKnown: notKnown(sizes) }
}

function partsOf(pair: Pair, { cylinders, counterweights }: Train, webs: Part[]): [string, string] {
  const of = (kind: string, index: number) => `${kind}:${cylinders[index].id}`
  switch (pair.kind) {
    case 'skirt-counterweight':
      return [of('piston', pair.cylinder), `counterweight:${counterweights[pair.counterweight].id}`]
    case 'skirt-web':
      return [of('piston', pair.cylinder), webs[pair.web].id]
    case 'bank-bank':
      return [of('piston', pair.cylinder), of('piston', pair.other)]
    case 'rod-bore':
      return [of('rod', pair.cylinder), of('liner', pair.cylinder)]
    case 'rod-rod':
      return [of('rod', pair.cylinder), of('rod', pair.other)]
    case 'piston-deck':
      return [of('piston', pair.cylinder), of('liner', pair.cylinder)]
    case 'bore-wall':
      return [of('liner', pair.cylinder), of('liner', pair.other)]
  }
}

function notKnown({ deck, pistons }: ClearanceSizes): ClearanceList['notKnown'] {
  const trunk = pistons.some((piston) => piston !== null)
  return [
    ...(deck === null && trunk
      ? [{ name: clearanceNames['piston-deck'], why: 'The deck height is not given.' }]
      : []),
    ...(pistons.includes(null)
      ? [
          {
            name: 'Skirts and banks',
            why: 'A crosshead’s piston stays above its bore’s lower edge: only walls between bores are looked at.',
          },
        ]
      : []),
  ]
}
