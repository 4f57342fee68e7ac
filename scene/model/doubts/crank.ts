import { formatNumber } from '@/lib/units/format'
import type { System } from '@/lib/units/quantities'
import { always, type Range } from '../class-ranges'
import type { CrankTrain } from '../crank-train'
import { cylinderValues } from '../cylinder-values'
import { engineClassOf } from '../engine-class'
import { roundedWithin, written, type Doubt } from './doubt'

const mm = (value: number, system: System) => written(value, 'mm', 'length', system)
/** Pitch closure is judged to this, mm. */
const CLOSES = 0.05

/** What the sizes of crank, rods and block say about each other, whatever the class. */
export const crankDoubts = (document: CrankTrain, system: System): Doubt[] => [
  ...ratios(document),
  ...bores(document, system),
  ...stackUp(document, system),
  ...overlap(document, system),
  ...deck(document, system),
  ...splitPins(document, system),
  ...balanceFactor(document),
]

/** Outside the limits that hold for every engine; a class has its own, narrower words. */
function ratios(document: CrankTrain): Doubt[] {
  const {
    rodLengthMm: rod,
    strokeMm: stroke,
    offsetMm: offset,
  } = cylinderValues(document, document.cylinders[0])
  const ratio = rod / stroke
  const [low, high] = always.rodToStroke
  const path = 'cylinderDefaults.rodLengthMm'
  const out: Doubt[] = []
  if (!engineClassOf(document) && (ratio < low || ratio > high)) {
    const bound = roundedWithin((ratio < low ? low : high) * stroke, ratio < low ? 'above' : 'below')
    out.push({
      code: 'G03',
      path,
      value: ratio,
      head: `Rod to stroke ${formatNumber(ratio, { decimals: 2 })}.`,
      message: `${ratio < low ? 'Below' : 'Above'} the usual ${low} to ${high}. Check the units.`,
      mend: { label: `Use ${mm(bound, 'si')}`, changes: [{ path: path.split('.'), value: bound }] },
    })
  }
  if (Math.abs(offset) > always.offset[1] * stroke)
    out.push({
      code: 'offset',
      path: 'cylinderDefaults.offsetMm',
      value: offset,
      head: `Offset ${formatNumber(offset, { decimals: 1 })} mm.`,
      message: 'More than 0.15 of the stroke: unusually far off.',
    })
  return out
}

/** Bores of one bank that run into each other. */
function bores(document: CrankTrain, system: System): Doubt[] {
  for (const bank of document.banks) {
    const on = document.cylinders
      .filter((cylinder) => cylinder.bank === bank.id)
      .toSorted((one, other) => one.axialMm - other.axialMm)
    for (let i = 1; i < on.length; i++) {
      const [one, other] = [on[i - 1], on[i]]
      const pitch = other.axialMm - one.axialMm
      const need = (cylinderValues(document, one).boreMm + cylinderValues(document, other).boreMm) / 2
      if (pitch >= need) continue
      const bound = roundedWithin(pitch * 0.93, 'below')
      return [
        {
          code: 'G07',
          path: 'throws.axialMm',
          value: pitch,
          head: 'Bores overlap.',
          message: `Pitch ${mm(pitch, system)} of cylinders ${one.id} and ${other.id} is less than bore ${mm(need, system)}: no wall is left between them.`,
          mend: {
            label: `Use bore ${mm(bound, system)}`,
            changes: [{ path: ['cylinderDefaults', 'boreMm'], value: bound }],
          },
        },
      ]
    }
  }
  return []
}

/** Main to main over one throw: pin, two webs and half of each main fill the pitch. */
function stackUp(document: CrankTrain, system: System): Doubt[] {
  const { pinLengthMm: pin, mainLengthMm: main, webThicknessMm: web } = document.shape ?? {}
  if (!pin || !main || !web || document.shape?.builtUp) return []
  const mains = document.mains.map(({ axialMm }) => axialMm).toSorted((one, other) => one - other)
  for (let i = 1; i < mains.length; i++) {
    const bay = mains[i] - mains[i - 1]
    const inside = document.throws.filter(({ axialMm }) => axialMm > mains[i - 1] && axialMm < mains[i])
    if (inside.length !== 1) continue
    const stack = pin + 2 * web + main
    const over = stack - bay
    if (Math.abs(over) <= CLOSES) continue
    const fit = Number((web - over / 2).toPrecision(6))
    return [
      {
        code: 'G08',
        path: 'shape.webThicknessMm',
        value: over,
        head:
          over > 0
            ? 'The throw does not fit between its mains.'
            : 'The throw leaves a gap between its mains.',
        message: `Pin ${mm(pin, system)} + webs ${mm(2 * web, system)} + main ${mm(main, system)} = ${mm(stack, system)}, but the mains stand ${mm(bay, system)} apart (${mm(Math.abs(over), system)} ${over > 0 ? 'short' : 'too much'}).`,
        ...(fit > 0 && {
          mend: {
            label: `Use webs of ${mm(fit, system)}`,
            changes: [{ path: ['shape', 'webThicknessMm'], value: fit }],
          },
        }),
      },
    ]
  }
  return []
}

function overlap(document: CrankTrain, system: System): Doubt[] {
  const { pinDiaMm: pin, mainDiaMm: main, builtUp } = document.shape ?? {}
  if (!pin || !main || builtUp) return []
  const throwMm = cylinderValues(document, document.cylinders[0]).strokeMm / 2
  const value = (pin + main) / 2 - throwMm
  if (value >= 0) return []
  return [
    {
      code: 'G09',
      path: 'shape.pinDiaMm',
      value,
      head: `No journal overlap (${mm(value, system)}).`,
      message: `Pin ${mm(pin, system)} and main ${mm(main, system)} do not reach over the throw of ${mm(throwMm, system)}: fine for a built-up crank, weak for one piece.`,
      mend: { label: 'It is built up', changes: [{ path: ['shape', 'builtUp'], value: true }] },
    },
  ]
}

/** Piston crown over the deck at exact top dead centre. */
function deck(document: CrankTrain, system: System): Doubt[] {
  const { deckHeightMm: height, compressionHeightMm: crown } = document.shape ?? {}
  if (!height || !crown) return []
  const own = document.cylinders.find(({ link }) => !link) ?? document.cylinders[0]
  const { rodLengthMm: rod, strokeMm: stroke, offsetMm: offset } = cylinderValues(document, own)
  const top = Math.sqrt((rod + stroke / 2) ** 2 - offset ** 2) + crown
  const over = top - height
  if (over <= 1e-6) return []
  const fit = Number((crown - over).toPrecision(6))
  return [
    {
      code: 'G10',
      path: 'shape.compressionHeightMm',
      value: over,
      head: `The piston stands ${mm(over, system)} above the deck.`,
      message: `At top dead centre throw, rod and compression height reach ${mm(top, system)}, and the deck is at ${mm(height, system)}.`,
      ...(fit > 0 && {
        mend: {
          label: `Use compression height ${mm(fit, system)}`,
          changes: [{ path: ['shape', 'compressionHeightMm'], value: fit }],
        },
      }),
    },
  ]
}

/** Two throws side by side with no main between them. */
function splitPins(document: CrankTrain, system: System): Doubt[] {
  const { pinDiaMm: pin, pinLengthMm: width } = document.shape ?? {}
  if (!pin || !width) return []
  const sorted = document.throws.toSorted((one, other) => one.axialMm - other.axialMm)
  const stroke = cylinderValues(document, document.cylinders[0]).strokeMm
  for (let i = 1; i < sorted.length; i++) {
    const [one, other] = [sorted[i - 1], sorted[i]]
    const parted = document.mains.some(({ axialMm }) => axialMm > one.axialMm && axialMm < other.axialMm)
    if (parted || other.axialMm - one.axialMm > 1.35 * width) continue
    const turn = ((other.angleDeg - one.angleDeg + 540) % 360) - 180
    const split = Math.abs(turn)
    const [, most]: Range = always.splitPinDeg
    if (split <= most || split > 120) continue
    const joint = pin - stroke * Math.sin((split * Math.PI) / 360)
    const index = document.throws.indexOf(other)
    return [
      {
        code: 'A03',
        path: `throws.${index}.angleDeg`,
        value: split,
        head: `Split of ${formatNumber(split, { decimals: 0 })}° in throw ${one.id} and ${other.id}.`,
        message: `It leaves ${joint > 0 ? mm(joint, system) : 'nothing'} of joint between the pin halves; above ${most}° a flying web is needed.`,
        mend: {
          label: `Use a split of ${most}°`,
          changes: [{ path: ['throws', index, 'angleDeg'], value: one.angleDeg + Math.sign(turn) * most }],
        },
      },
    ]
  }
  return []
}

function balanceFactor(document: CrankTrain): Doubt[] {
  const { balanceFactor: factor } = document
  const [, most] = always.balanceFactor
  if (factor <= most) return []
  return [
    {
      code: 'M07',
      path: 'balanceFactor',
      value: factor,
      head: `Balance factor ${formatNumber(100 * factor, { decimals: 0 })} %.`,
      message: `Usual is up to ${100 * most} % of all the reciprocating mass on a pin. 100 % of one piston on a pin with two rods is 50 % of both.`,
      mend: { label: 'Use 50 %', changes: [{ path: ['balanceFactor'], value: 0.5 }] },
    },
  ]
}
