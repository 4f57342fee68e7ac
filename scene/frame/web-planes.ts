import type { Plane } from '@/lib/mechanics/balance/solve-counterweights'
import type { Train } from '@/lib/mechanics/train'
import type { CrankTrain } from '@/scene/model/crank-train'
import { crankLayout } from './crank-layout'
import { readShape, STEEL } from './shape'

/** A counterweight's centre of gravity lies at about this share of its outer radius (common practice). */
const CENTRE = 0.6

/** The webs of a crank as places for counterweights. */
export function webPlanes(document: CrankTrain, train: Train): Plane[] {
  const shape = readShape(document, train)
  const { webs } = crankLayout(train, shape)
  return webs
    .map(({ from, to, throw: own, other, side }) => ({
      id: `${train.throws[own].id}${other >= 0 ? `-${train.throws[other].id}` : side === 'free' ? 'F' : 'D'}`,
      axial: (from + to) / 2,
      radius: CENTRE * shape.counterweightRadius,
    }))
    .sort((a, b) => a.axial - b.axial)
}

/** Where the document's own counterweights sit; without any, its webs. */
export const presentPlanes = (document: CrankTrain, train: Train): Plane[] => {
  const present = train.counterweights.filter(({ radius }) => radius > 0)
  return present.length === 0
    ? webPlanes(document, train)
    : present.map(({ id, axial, radius }) => ({ id, axial, radius }))
}

/** The half disc that a web can be at most: m, m, kg/m³; `stated` where the document gives its sizes. */
export function webRoom(document: CrankTrain, train: Train) {
  const { counterweightRadius, webThickness } = readShape(document, train)
  const { shape } = document
  return {
    radius: counterweightRadius,
    thickness: webThickness,
    density: STEEL,
    stated: Boolean(shape?.counterweightRadiusMm && shape.webThicknessMm),
  }
}
