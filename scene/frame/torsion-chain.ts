import { carriedBy } from '@/lib/mechanics/lever-rule'
import { throwInertias } from '@/lib/mechanics/torsion/throw-inertia'
import {
  flyingWebTwist,
  kerWilsonStiffness,
  mainTwist,
  pinTwist,
  throwStiffness,
  webTwist,
  type CrankSizes,
} from '@/lib/mechanics/torsion/throw-stiffness'
import type { Train } from '@/lib/mechanics/train'
import type { CrankTrain } from '@/scene/model/crank-train'
import { crankBodies } from './crank-bodies'
import { crankLayout, type CrankLayout, type Stretch } from './crank-layout'
import { readShape, type Shape } from './shape'

/** A crank as lumped inertias from the free end to the flywheel, one a throw between them. */
export interface TorsionChain {
  stations: {
    name: string
    /** What the document gives of it; null where it must be given first. */ inertia: number | null
  }[]
  /** Length ÷ polar moment from each station to the next, 1/m³; null where sizes are missing. */
  twists: number[] | null
  /** Station of each cylinder of the train. */
  stationOf: number[]
  /** Paths of the document that are not entered, or 0 where nothing turns on without them. */
  missing: { inertias: string[]; sizes: string[] }
  /** How much stiffer Ker Wilson's formula makes the first throw than Carter's: 0.1 is 10 %. Null where it does not hold. */
  kerWilson: number | null
}

const sizeKeys = [
  'mainDiaMm',
  'mainLengthMm',
  'pinDiaMm',
  'pinLengthMm',
  'webThicknessMm',
  'webWidthMm',
] as const

/**
 * The chain of a document. Free end and flywheel sit at the outer faces of the outermost journals, a throw in the middle
 * of its pin; a journal's own inertia goes to its two neighbours by the lever rule.
 */
export function torsionChain(document: CrankTrain, train: Train): TorsionChain {
  const shape = readShape(document, train)
  const layout = crankLayout(train, shape)
  const { journals } = layout
  const pins = [...layout.pins].sort((a, b) => a.from - b.from)
  const places = [journals[0].from, ...pins.map(middle), journals[journals.length - 1].to]
  const missing = {
    inertias: (['freeEnd', 'flywheel'] as const)
      .filter((end) => train.inertia[end] <= 0)
      .map((end) => `inertia.${end}KgM2`),
    sizes: sizeKeys.filter((key) => document.shape?.[key] === undefined).map((key) => `shape.${key}`),
  }
  const sized = missing.sizes.length === 0
  const bodies = crankBodies(train, shape, layout)
  const of = throwInertias(train, sized ? bodies.throws : train.throws.map(() => 0))
  const inertias = [train.inertia.freeEnd, ...pins.map((pin) => of[pin.throw]), train.inertia.flywheel]
  const entered = inertias.map((inertia) => inertia > 0)
  if (sized)
    journals.forEach((journal, i) => {
      const { first, share } = carriedBy(
        places.map((axial) => ({ axial })),
        middle(journal),
      )
      inertias[first] += (1 - share) * bodies.journals[i]
      inertias[first + 1] += share * bodies.journals[i]
    })
  const names = ['free end', ...pins.map((pin) => `throw ${train.throws[pin.throw].id}`), 'flywheel']
  return {
    stations: names.map((name, i) => ({ name, inertia: entered[i] ? inertias[i] : null })),
    twists: sized ? twistsBetween(places, train, shape, layout) : null,
    stationOf: train.cylinders.map((cylinder) => 1 + pins.findIndex((pin) => pin.throw === cylinder.throw)),
    missing,
    kerWilson: sized ? againstKerWilson(train, shape) : null,
  }
}

const middle = ({ from, to }: Stretch) => (from + to) / 2

const crankSizes = ({ mainRadius, mainBore, pinRadius, pinBore, webWidth }: Shape): CrankSizes => ({
  mainDia: 2 * mainRadius,
  mainBore: 2 * mainBore,
  pinDia: 2 * pinRadius,
  pinBore: 2 * pinBore,
  webWidth,
})

function twistsBetween(places: number[], train: Train, shape: Shape, { journals, pins, webs }: CrankLayout) {
  const sizes = crankSizes(shape)
  return places.slice(1).map((to, i) => {
    const within = (one: Stretch) => Math.max(0, Math.min(to, one.to) - Math.max(places[i], one.from))
    let sum = 0
    for (const journal of journals) sum += mainTwist(within(journal), sizes)
    for (const pin of pins) sum += pinTwist(within(pin), sizes)
    for (const web of webs) {
      if (within(web) === 0) continue
      const { radius, angle } = train.throws[web.throw]
      if (web.other < 0) sum += webTwist(within(web), radius, sizes)
      else {
        const next = train.throws[web.other]
        const apart = Math.sqrt(
          radius ** 2 + next.radius ** 2 - 2 * radius * next.radius * Math.cos(next.angle - angle),
        )
        sum += flyingWebTwist(within(web), apart, sizes)
      }
    }
    return sum
  })
}

function againstKerWilson({ throws }: Train, shape: Shape): number | null {
  const { mainLength, pinLength, webThickness } = shape
  const sizes = { ...crankSizes(shape), mainLength, pinLength, webThickness, radius: throws[0].radius }
  const other = kerWilsonStiffness(sizes, 1)
  return other && other / throwStiffness(sizes, 1) - 1
}

/** Stiffnesses between the stations, N m/rad, by the sizes of the crank; G shear modulus, Pa. */
export const stiffnessesOf = (twists: readonly number[], shear: number): number[] =>
  twists.map((twist) => shear / twist)

/** The same by one given stiffness of a throw, main to main: half a throw lies between an end and its neighbour. */
export const stiffnessesByThrow = (throws: number, stiffness: number): number[] => [
  2 * stiffness,
  ...Array.from({ length: throws - 1 }, () => stiffness),
  2 * stiffness,
]
