import type { Train } from '@/lib/mechanics/train'
import { polarMoment } from '@/lib/mechanics/torsion/shaft-stiffness'
import type { CrankLayout, Stretch } from './crank-layout'
import { polarArea } from './mesh/polar-area'
import { outlineOf } from './parts/webs'
import { STEEL, type Shape } from './shape'

/**
 * Inertia of the crank's own metal about its axis, kg m²: of each throw (pin, its webs, the counterweights nearest to
 * it) and of each journal. Plain bodies of steel without the bores' way through the webs; a counterweight is a point mass
 * on top of its web (common practice).
 */
export function crankBodies(train: Train, shape: Shape, { pins, webs, journals }: CrankLayout) {
  const throws = train.throws.map(() => 0)
  const length = ({ from, to }: Stretch) => to - from
  for (const pin of pins) {
    const { pinRadius, pinBore } = shape
    const area = Math.PI * (pinRadius ** 2 - pinBore ** 2)
    const { radius } = train.throws[pin.throw]
    throws[pin.throw] += STEEL * length(pin) * (area * radius ** 2 + polarMoment(2 * pinRadius, 2 * pinBore))
  }
  for (const web of webs) {
    const inertia = STEEL * length(web) * polarArea(outlineOf({ train, shape, mirror: 1 }, web))
    const owners = web.other < 0 ? [web.throw] : [web.throw, web.other]
    for (const owner of owners) throws[owner] += inertia / owners.length
  }
  for (const { axial, mass, radius } of train.counterweights) {
    const distances = train.throws.map((pin) => Math.abs(pin.axial - axial))
    throws[distances.indexOf(Math.min(...distances))] += mass * radius ** 2
  }
  return {
    throws,
    journals: journals.map(
      (one) => STEEL * length(one) * polarMoment(2 * shape.mainRadius, 2 * shape.mainBore),
    ),
  }
}
