import type { CrankTrainInput } from '@/scene/model/crank-train'
import { solved } from '../dense'
import { answer } from '../kernel'
import { layout, orderOf, type Ellipse, type Place } from '../layout'
import { entries, inputs, type Case, type Figures } from './entry'
import { DEG, FOOT, INCH, POUND, radPerSecond, single, textbook } from './rig'

type Inputs = Record<string, number>
interface TablePlace {
  pinAngle_deg: number
  bankAxisFromReference_deg: number
  axialPosition_pitches: number
}

/** Handbook coefficients of a layout, in units of one cylinder's own first and second harmonic. */
function coefficients(id: string): Figures {
  const places = inputs<{ cylinders: TablePlace[] }>(id).cylinders.map((c): Place => ({
    pin: c.pinAngle_deg,
    bank: c.bankAxisFromReference_deg,
    z: c.axialPosition_pitches,
  }))
  const [first, second] = [orderOf(places, 1), orderOf(places, 2)]
  const ends = (name: string, unit: string, { max, min }: Ellipse) => ({
    [`${name}Max_${unit}`]: max,
    [`${name}Min_${unit}`]: min,
  })
  const expected = entries.find((e) => e.id === id)!.expected
  // the table gives the long axis only where there is one
  const axis = (name: string, { axisDeg }: Ellipse) => {
    const key = `${name}MajorAxisFromReference_deg`
    if (!(key in expected)) return {}
    return { [key]: axisDeg > 179.95 ? axisDeg - 180 : axisDeg }
  }
  return {
    ...ends('firstOrderForce', 'F1', first.force),
    ...ends('firstOrderMoment', 'F1a', first.couple),
    ...ends('secondOrderForce', 'F2', second.force),
    ...ends('secondOrderMoment', 'F2a', second.couple),
    ...axis('firstOrderForce', first.force),
    ...axis('firstOrderMoment', first.couple),
    ...axis('secondOrderForce', second.force),
    ...axis('secondOrderMoment', second.couple),
  }
}

/** The textbook's ratio r/l in place of the exact second harmonic, both from the kernel. */
function textbookSecond(radius: number, rod: number) {
  const { orders } = answer(single({ radius, rod, mass: 1 }), 600)
  const amplitude = (n: number) => orders.find((o) => o.order === n)!.vertical.amplitudeN
  return (Math.sin(textbook({ radius, rod }, 1, 90).rodAngle) * amplitude(1)) / amplitude(2)
}

const oneOrder = (document: CrankTrainInput, rpm: number, n: number) =>
  answer(document, rpm).orders.find((o) => o.order === n)!

/** Counterweight against all rotating and a share of reciprocating mass; SI. */
function shareBalance(it: {
  rotating: number
  reciprocating: number
  radius: number
  share: number
  at: number
  rpm: number
}) {
  const bare = single({
    radius: it.radius,
    rod: it.radius * 4,
    mass: it.reciprocating,
    bearing: it.rotating,
    balanceFactor: it.share,
  })
  const mass = answer(bare, it.rpm).balance.residual.staticKgMm / (it.at * 1000)
  const document = {
    ...bare,
    counterweights: [{ id: 'w', axialMm: 0, angleDeg: 180, massKg: mass, radiusMm: it.at * 1000 }],
  }
  const first = oneOrder(document, it.rpm, 1)
  const at = (angleDeg: number) => ({
    along: first.vertical.amplitudeN * Math.cos((angleDeg - first.vertical.phaseDeg) * DEG),
    across: first.horizontal.amplitudeN * Math.cos((angleDeg - first.horizontal.phaseDeg) * DEG),
  })
  const residual = (angleDeg: number) => Math.hypot(at(angleDeg).along, at(angleDeg).across)
  return { mass, at, residual, left: answer(document, it.rpm).balance.residual.staticKgMm }
}

/** A pound's weight, N, by the printed gravity. */
const printedPound = (i: Inputs) => POUND * FOOT * i.gravity_ft_s2

const khurmiBalance = (i: Inputs): Figures => {
  const it = shareBalance({
    rotating: (i.rotatingMass_kg * i.rotatingRadius_mm * 2) / i.stroke_mm,
    reciprocating: i.reciprocatingMass_kg,
    radius: i.stroke_mm / 2000,
    share: i.balancedShareOfReciprocating,
    at: i.balanceRadius_mm / 1000,
    rpm: i.speed_rpm,
  })
  return { balanceMass_kg: it.mass, residualForce_N: it.residual(i.crankAngleFromTdc_deg) }
}

/** Discs on a shaft as throws that carry unbalance only. */
function discs(
  items: { moment: number; angleDeg: number; axialMm: number }[],
  referenceAxialMm: number,
): CrankTrainInput {
  const bare = single({ radius: 0.05, rod: 0.2 })
  return {
    ...bare,
    referenceAxialMm,
    throws: items.map(({ moment, angleDeg, axialMm }, i) => ({
      id: `${i + 1}`,
      angleDeg,
      axialMm,
      unbalanceKgMm: moment,
    })),
  }
}

const residualOf = (document: CrankTrainInput) => answer(document, 600).balance.residual

function staticBalance(moments: number[], anglesDeg: number[], radiusMm: number) {
  const { staticKgMm, staticAngleDeg } = residualOf(
    discs(
      moments.map((moment, k) => ({ moment, angleDeg: anglesDeg[k], axialMm: 0 })),
      0,
    ),
  )
  return { mass: staticKgMm / radiusMm, angleDeg: ((staticAngleDeg % 360) + 360) % 360 }
}

const radialThree = (radius: number, rod: number, mass: number) =>
  layout(
    [0, 120, 240].map((bank) => ({ pin: 0, bank, z: 0 })),
    { radius, rod, mass },
  )

export const balancing: Record<string, Case> = {
  ...Object.fromEntries(
    entries
      .filter((e) => e.id.startsWith('CFG-'))
      .map((e): [string, Case] => [e.id, { figures: () => coefficients(e.id) }]),
  ),
  'BAL-01': { figures: khurmiBalance },
  'BAL-03': {
    figures: (i) => {
      const it = shareBalance({
        rotating: i.rotatingWeight_lb * POUND,
        reciprocating: i.reciprocatingWeight_lb * POUND,
        radius: i.crankRadius_in * INCH,
        share: i.balancedShareOfReciprocating,
        at: i.balanceRadius_in * INCH,
        rpm: i.speed_rpm,
      })
      return { balanceWeight_lb: it.mass / POUND, residualForce_lbf: it.residual(37) / printedPound(i) }
    },
  },
  'BAL-04': {
    figures: (i) => {
      const it = shareBalance({
        rotating: 0,
        reciprocating: i.reciprocatingMass_kg,
        radius: i.stroke_m / 2,
        share: i.revolvingBalanceMass_kg / i.reciprocatingMass_kg,
        at: i.balanceRadius_m,
        rpm: (i.crankSpeed_rad_s * 30) / Math.PI,
      })
      const { along, across } = it.at(i.crankAngleFromTdc_deg)
      return { forceAcrossCylinder_N: Math.abs(across), forceAlongCylinderFirstOrder_N: along }
    },
  },
  'BAL-06': { figures: khurmiBalance },
  'BAL-07': {
    figures: (i) => {
      const pins = inputs<{ crankAnglesByCylinder_deg: number[] }>('BAL-07').crankAnglesByCylinder_deg
      const [radius, rod] = [i.crankRadius_mm / 1000, i.rodLength_mm / 1000]
      const document = layout(
        pins.map((pin, k) => ({ pin, bank: 0, z: k - 1.5 })),
        { radius, rod, mass: i.reciprocatingMass_kg, pitch: i.cylinderPitch_mm / 1000 },
      )
      const [first, second] = [oneOrder(document, i.speed_rpm, 1), oneOrder(document, i.speed_rpm, 2)]
      const toTextbook = textbookSecond(radius, rod)
      return {
        primaryForce_N: first.vertical.amplitudeN,
        secondaryForce_N: second.vertical.amplitudeN,
        primaryCouple_Nm: first.coupleVertical.amplitudeNm,
        secondaryCouple_Nm: second.coupleVertical.amplitudeNm * toTextbook,
      }
    },
  },
  'BAL-09': { figures: fourCrankBalance },
  'BAL-10': {
    figures: (i) => {
      const size = {
        radius: i.crankRadius_mm / 1000,
        rod: i.rodLength_mm / 1000,
        mass: i.reciprocatingMass_kg,
      }
      const document = layout(
        [-45, 45].map((bank) => ({ pin: 0, bank, z: 0 })),
        size,
      )
      const [first, second] = [oneOrder(document, i.speed_rpm, 1), oneOrder(document, i.speed_rpm, 2)]
      return {
        maxSecondaryForce_N: (second.forwardN + second.backwardN) * textbookSecond(size.radius, size.rod),
        rotatingFirstOrderForce_N: first.forwardN,
        counterweightMoment_kg_mm: (1000 * first.forwardN) / radPerSecond(i.speed_rpm) ** 2,
      }
    },
  },
  'BAL-11': {
    figures: (i) => {
      const radius = i.stroke_mm / 2000
      const document = layout(
        [-i.vAngle_deg / 2, i.vAngle_deg / 2].map((bank) => ({ pin: 0, bank, z: 0 })),
        { radius, rod: 4 * radius, mass: i.reciprocatingMass_kg },
      )
      const { forwardN, backwardN } = oneOrder(document, i.speed_rpm, 1)
      return { maxPrimaryForce_N: forwardN + backwardN, minPrimaryForce_N: forwardN - backwardN }
    },
  },
  'BAL-14': {
    figures: (i) => {
      const [radius, rod] = [(i.stroke_in * INCH) / 2, i.rodLength_in * INCH]
      const document = radialThree(radius, rod, i.reciprocatingWeight_lb * POUND)
      const speed = radPerSecond(i.speed_rpm)
      const second = oneOrder(document, i.speed_rpm, 2).backwardN * textbookSecond(radius, rod)
      return {
        balanceWeight_lb:
          oneOrder(document, i.speed_rpm, 1).forwardN / speed ** 2 / (i.balanceRadius_in * INCH) / POUND,
        secondaryForce_lbf: second / printedPound(i),
      }
    },
  },
  'BAL-16': {
    figures: (i) => {
      const [radius, rod] = [i.stroke_mm / 2000, i.rodLength_mm / 1000]
      const document = radialThree(radius, rod, i.reciprocatingMass_kg)
      return {
        maxPrimaryForce_N: oneOrder(document, i.speed_rpm, 1).forwardN,
        maxSecondaryForce_N: oneOrder(document, i.speed_rpm, 2).backwardN * textbookSecond(radius, rod),
      }
    },
  },
  'BAL-18': {
    figures: (i) => {
      const moment = i.disturbingWeight_lb * i.disturbingRadius_in
      const apart = i.planeSeparation_in
      // about one plane, the other plane's weight alone has a couple
      const plane = (disturbedAt: number, about: number) =>
        residualOf(discs([{ moment, angleDeg: 0, axialMm: disturbedAt }], about)).coupleKgMm2 /
        apart /
        i.balanceRadius_in
      const [outside, inside] = [-i.caseA_offsetOutside_in, i.caseB_offsetInside_in]
      return {
        caseA_farPlane_lb: plane(outside, 0),
        caseA_nearPlane_lb: plane(outside, apart),
        caseB_farPlane_lb: plane(inside, 0),
        caseB_nearPlane_lb: plane(inside, apart),
      }
    },
  },
  'BAL-19': {
    figures: (i) => {
      const { weights_lb, radii_in, angles_deg } = inputs<Record<string, number[]>>('BAL-19')
      const moments = weights_lb.map((w, k) => w * radii_in[k])
      const it = staticBalance(moments, angles_deg, i.balanceRadius_in)
      return { balanceWeight_lb: it.mass, resultantAngle_deg: it.angleDeg }
    },
  },
  'BAL-20': { figures: (i) => opposite('BAL-20', i) },
  'BAL-22': { figures: (i) => opposite('BAL-22', i) },
}

function opposite(id: string, i: Inputs): Figures {
  const { masses_kg, radii_mm, angles_deg } = inputs<Record<string, number[]>>(id)
  const it = staticBalance(
    masses_kg.map((m, k) => m * radii_mm[k]),
    angles_deg,
    i.balanceRadius_mm,
  )
  return { balanceMass_kg: it.mass, balanceAngle_deg: (it.angleDeg + 180) % 360 }
}

/**
 * One mass and three crank angles that leave no first-order force and couple: sought by Newton's method on the
 * kernel's own order-1 figures, from the angles read off the book's drawing.
 */
function fourCrankBalance(): Figures {
  const { crankRadius_mm, planesFromThirdCrank_mm, reciprocatingMasses_kg } = inputs<{
    crankRadius_mm: number
    planesFromThirdCrank_mm: Record<string, number>
    reciprocatingMasses_kg: Record<string, number>
  }>('BAL-09')
  const z = [planesFromThirdCrank_mm.first, planesFromThirdCrank_mm.second, 0, planesFromThirdCrank_mm.fourth]
  const left = ([third, second, fourth, thirdAngle]: number[]) => {
    const masses = [
      reciprocatingMasses_kg.first,
      reciprocatingMasses_kg.second,
      third,
      reciprocatingMasses_kg.fourth,
    ]
    const radius = crankRadius_mm / 1000
    const document = layout(
      [0, second, thirdAngle, fourth].map((pin, k) => ({
        pin: ((pin % 360) + 360) % 360,
        bank: 0,
        z: z[k] / 100,
      })),
      { radius, rod: 4 * radius },
    )
    document.cylinders.forEach((c, k) => (c.pistonKg = masses[k]))
    const { vertical, coupleVertical } = oneOrder(document, 100, 1)
    const parts = (amplitude: number, phaseDeg: number) => [
      amplitude * Math.cos(phaseDeg * DEG),
      amplitude * Math.sin(phaseDeg * DEG),
    ]
    return [
      ...parts(vertical.amplitudeN, vertical.phaseDeg),
      ...parts(coupleVertical.amplitudeNm, coupleVertical.phaseDeg),
    ]
  }
  let x = [60, 160, 26, 227]
  for (let step = 0; step < 12; step++) {
    const here = left(x)
    const columns = x.map((_, k) =>
      left(x.map((v, j) => (j === k ? v + 1e-3 : v))).map((v, r) => (v - here[r]) / 1e-3),
    )
    const move = solved(
      here.map((_, r) => columns.map((c) => c[r])),
      [...here],
    )
    x = x.map((v, k) => v - move[k])
  }
  return {
    thirdMass_kg: x[0],
    secondCrankAngle_deg: x[1],
    fourthCrankAngle_deg: x[2],
    thirdCrankAngle_deg: x[3],
  }
}
