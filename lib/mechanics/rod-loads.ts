import type { Instant, Plan } from './instant'

/**
 * Loads of one cylinder, and its part in torque and shaking force, by Newton and Euler in the cylinder's frame; every
 * link of a master must have been done before the master. Expects motion and gas force filled.
 *
 * Piston (mass m_p, gas force F towards the crank, acceleration s″ω² along u), with Q the piston on the rod:
 *   Q_u = −F − m_p s″ω²;   side thrust on the wall = −Q_v.
 * Rod (mass m, centre of gravity G at h from the big end B, inertia J about it; leaning by −ψ), with L what links put on
 * it and M their moment about B, moments about B:
 *   l (cos ψ Q_v + sin ψ Q_u) + M = −J ψ″ω² + m h (cos ψ a_Gv + sin ψ a_Gu).
 * What the rod, with the bearing m_b that goes with its big end, puts on its pin:  Q + L − m a_G − m_b a_B.
 * Inertia torque and shaking force by d'Alembert: −Σ m a · ∂x/∂θ and −Σ m a.
 */
export function fillRodLoads(out: Instant, plan: Plan, i: number): void {
  const { motion, carried } = out
  const { rod, pistonMass, bigEndBearing, rodLength, axial } = plan.train.cylinders[i]
  const path = plan.paths[i]
  const { cosBank, sinBank } = path
  const square = plan.speed * plan.speed
  const sin = motion.sin[i]
  const cos = motion.cos[i]
  const angle1 = motion.angle1[i]
  const angle2 = motion.angle2[i]
  const h = rod.cgFromBigEnd

  // per rad and rad²
  const centreU1 = motion.bigEndU1[i] - h * sin * angle1
  const centreV1 = motion.bigEndV1[i] - h * cos * angle1
  const centreU2 = motion.bigEndU2[i] - h * (cos * angle1 * angle1 + sin * angle2)
  const centreV2 = motion.bigEndV2[i] + h * (sin * angle1 * angle1 - cos * angle2)

  // what the links put on this rod, turned into its cylinder's frame
  const linkU = carried.vertical[i] * cosBank + carried.horizontal[i] * sinBank
  const linkV = carried.horizontal[i] * cosBank - carried.vertical[i] * sinBank

  const pistonU = -out.gasForce[i] - pistonMass * motion.pin2[i] * square
  const inertiaMoment = (rod.mass * h * (cos * centreV2 + sin * centreU2) - rod.inertia * angle2) * square
  const pistonV = (inertiaMoment - carried.moment[i] - rodLength * sin * pistonU) / (rodLength * cos)

  const inertiaU = -(rod.mass * centreU2 + bigEndBearing * motion.bigEndU2[i]) * square
  const inertiaV = -(rod.mass * centreV2 + bigEndBearing * motion.bigEndV2[i]) * square
  const pinU = pistonU + linkU + inertiaU
  const pinV = pistonV + linkV + inertiaV
  const pinVertical = pinU * cosBank - pinV * sinBank
  const pinHorizontal = pinU * sinBank + pinV * cosBank

  out.pistonPinU[i] = pistonU
  out.pistonPinV[i] = pistonV
  out.sideThrust[i] = -pistonV
  const master = path.master
  if (master < 0) {
    out.crankPinVertical[i] = pinVertical
    out.crankPinHorizontal[i] = pinHorizontal
    if (plan.carriedBy.length > 0) {
      const { first, share } = plan.carriedBy[i]
      out.mainVertical[first] += (1 - share) * pinVertical
      out.mainHorizontal[first] += (1 - share) * pinHorizontal
      out.mainVertical[first + 1] += share * pinVertical
      out.mainHorizontal[first + 1] += share * pinHorizontal
    }
  } else {
    out.knuckleVertical[i] = pinVertical
    out.knuckleHorizontal[i] = pinHorizontal
    carried.vertical[master] += pinVertical
    carried.horizontal[master] += pinHorizontal
    carried.moment[master] += motion.armU[i] * pinV - motion.armV[i] * pinU
  }

  const gasTorque = -out.gasForce[i] * motion.pin1[i]
  const inertiaTorque =
    -(
      pistonMass * motion.pin2[i] * motion.pin1[i] +
      rod.mass * (centreU2 * centreU1 + centreV2 * centreV1) +
      rod.inertia * angle2 * angle1 +
      bigEndBearing * (motion.bigEndU2[i] * motion.bigEndU1[i] + motion.bigEndV2[i] * motion.bigEndV1[i])
    ) * square
  out.cylinderGasTorque[i] = gasTorque
  out.cylinderInertiaTorque[i] = inertiaTorque
  out.gasTorque += gasTorque
  out.inertiaTorque += inertiaTorque

  const forceU = inertiaU - pistonMass * motion.pin2[i] * square
  const vertical = forceU * cosBank - inertiaV * sinBank
  const horizontal = forceU * sinBank + inertiaV * cosBank
  const arm = axial - plan.train.referenceAxial
  out.shakingVertical += vertical
  out.shakingHorizontal += horizontal
  out.coupleVertical += arm * vertical
  out.coupleHorizontal += arm * horizontal
}
