import { balancing } from './balancing'
import type { Case } from './entry'
import { firing } from './firing'
import { flywheel } from './flywheel'
import { forces } from './forces'
import { gas } from './gas'
import { kinematics } from './kinematics'
import { standards } from './standards'
import { torsion } from './torsion'

/** What of the published figures is run through the kernel, by topic. */
export const topics: Record<string, Record<string, Case>> = {
  'slider-crank kinematics': kinematics,
  'forces and lumped masses': forces,
  balancing,
  'firing orders': firing,
  flywheel,
  'gas and cycle': gas,
  'standards and practice': standards,
  'torsional vibration': torsion,
}
