import type { Cylinder, Train } from '@/lib/mechanics/train'
import type { Drive } from './pose'

/** The train's lengths and angles in the flat arrays that `fillPose` reads; the parts come when they are known. */
export function buildDrive(train: Train, mirror: -1 | 1): Drive {
  const { cylinders, throws, banks } = train
  const of = (value: (i: number) => number) => Float64Array.from(cylinders, (_, i) => value(i))
  const links = cylinders.flatMap((cylinder, i) => (cylinder.link ? [i] : []))
  const masters = cylinders.flatMap((cylinder, i) => (cylinder.link ? [] : [i]))
  return {
    cylinders: cylinders.length,
    mirror,
    kind: new Uint8Array(0),
    index: new Int16Array(0),
    cosPhase: new Float64Array(0),
    sinPhase: new Float64Array(0),
    atX: new Float64Array(0),
    atY: new Float64Array(0),
    ratio: new Float64Array(0),
    order: Uint16Array.from([...masters, ...links]),
    master: Int16Array.from(cylinders, (cylinder) => cylinder.link?.master ?? -1),
    cosThrow: of((i) => Math.cos(throws[cylinders[i].throw].angle)),
    sinThrow: of((i) => Math.sin(throws[cylinders[i].throw].angle)),
    radius: of((i) => throws[cylinders[i].throw].radius),
    knuckleAlong: of((i) => knuckle(cylinders[i], Math.cos)),
    knuckleAhead: of((i) => knuckle(cylinders[i], Math.sin)),
    cosBank: of((i) => Math.cos(banks[cylinders[i].bank].angle)),
    sinBank: of((i) => Math.sin(banks[cylinders[i].bank].angle)),
    length: of((i) => cylinders[i].rodLength),
    offset: of((i) => cylinders[i].offset),
    points: new Float64Array(6 * cylinders.length),
  }
}

const knuckle = ({ link }: Cylinder, along: (angle: number) => number) =>
  link ? link.knuckleRadius * along(link.knuckleAngle) : 0
