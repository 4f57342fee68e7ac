import type { Train } from '../train'
import * as balance from './balance'
import * as deadCentres from './dead-centres'
import * as energy from './energy'
import * as indicated from './indicated'
import { buildEngine, type Asked, type Engine } from './engine'
import { finish, type Draft, type Explanation } from './explanation'
import * as firing from './firing'
import * as forces from './forces'
import * as mains from './mains'
import * as motion from './motion'
import * as shaking from './shaking'
import * as sizes from './sizes'
import * as torque from './torque'

/** Every figure that can be explained, by the name it is asked for. */
export const explained = {
  displacement: sizes.displacement,
  'mean-piston-speed': sizes.meanPistonSpeed,
  'compression-volume': sizes.compressionVolume,
  'rod-to-stroke': sizes.rodToStroke,
  'bore-to-stroke': sizes.boreToStroke,
  'journal-overlap': sizes.overlap,
  'counterweight-capacity': sizes.counterweightCapacity,
  'pin-height': motion.pinHeight,
  'piston-travel': motion.travel,
  'piston-velocity': motion.velocity,
  'piston-acceleration': motion.acceleration,
  'rod-angle': motion.rodAngle,
  'true-stroke': deadCentres.trueStroke,
  'top-dead-centre': deadCentres.topDeadCentre,
  'bottom-dead-centre': deadCentres.bottomDeadCentre,
  'gas-force': forces.gasForce,
  'side-thrust': forces.sideThrust,
  'rod-load': forces.rodLoad,
  'first-order-force': forces.firstOrder,
  'second-order-force': forces.secondOrder,
  'main-peak': mains.mainPeak,
  'main-mean': mains.mainMean,
  'main-specific-load': mains.specificLoad,
  'pin-specific-load': mains.pinSpecificLoad,
  'shaking-force': shaking.shakingForce,
  'shaking-couple': shaking.shakingCouple,
  'order-forward': shaking.orderForward,
  'order-backward': shaking.orderBackward,
  'order-couple-forward': shaking.orderCoupleForward,
  'order-couple-backward': shaking.orderCoupleBackward,
  torque: torque.torque,
  'torque-mean': torque.torqueMean,
  'torque-peak': torque.torquePeak,
  'energy-fluctuation': energy.energyFluctuation,
  flywheel: energy.flywheel,
  'speed-fluctuation': energy.speedFluctuation,
  imep: indicated.imep,
  'indicated-power': indicated.indicatedPower,
  'firing-interval': firing.firingInterval,
  'firing-evenness': firing.firingEvenness,
  'reciprocating-mass': balance.reciprocatingMass,
  'rotating-mass': balance.rotatingMass,
  'bob-weight': balance.bobWeight,
  'balance-factor': balance.balanceFactor,
  'residual-static': balance.residualStatic,
  'residual-couple': balance.residualCouple,
  'permissible-residual': balance.permissibleResidual,
} satisfies Record<string, (engine: Engine) => Draft>

export type FigureId = keyof typeof explained
export const figureIds = Object.keys(explained) as [FigureId, ...FigureId[]]

/**
 * What stands behind one figure of a train: formula, values put in, assumptions, method and source. Its value is the
 * figure of the analysis, worked out by that formula. Throws RangeError for a part that the train does not have, for a
 * size that is not given, and for what `buildPlan` refuses.
 */
export const explain = (train: Train, figure: FigureId, asked: Asked): Explanation =>
  finish(figure, explained[figure](buildEngine(train, asked)))
