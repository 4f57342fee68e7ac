import type { Train } from '../train'
import * as balance from './balance'
import * as bearing from './bearing'
import * as clearance from './clearance'
import * as counterweight from './counterweight'
import * as deadCentres from './dead-centres'
import * as energy from './energy'
import * as indicated from './indicated'
import { buildEngine, type Asked, type Engine } from './engine'
import { finish, type Draft, type Explanation } from './explanation'
import * as firing from './firing'
import * as forces from './forces'
import * as mains from './mains'
import * as motion from './motion'
import * as planes from './planes'
import * as shaking from './shaking'
import * as sizes from './sizes'
import * as succession from './succession'
import * as torque from './torque'
import * as torqueOrders from './torque-orders'

/** Every figure that can be explained, by the name it is asked for. */
export const explained = {
  displacement: sizes.displacement,
  'mean-piston-speed': sizes.meanPistonSpeed,
  'compression-volume': sizes.compressionVolume,
  'rod-to-stroke': sizes.rodToStroke,
  'bore-to-stroke': sizes.boreToStroke,
  'journal-overlap': sizes.overlap,
  'counterweight-capacity': sizes.counterweightCapacity,
  'counterweight-share': counterweight.counterweightShare,
  'slug-volume': counterweight.slugVolume,
  'slug-mass': counterweight.slugMass,
  'slug-diameter': counterweight.slugDiameter,
  'skirt-to-counterweight': clearance.skirtToCounterweight,
  'piston-to-deck': clearance.pistonToDeck,
  'bore-wall': clearance.boreWall,
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
  'rod-pull': forces.rodPull,
  'first-order-force': forces.firstOrder,
  'second-order-force': forces.secondOrder,
  'main-peak': mains.mainPeak,
  'main-mean': mains.mainMean,
  'main-specific-load': mains.specificLoad,
  'pin-specific-load': mains.pinSpecificLoad,
  'bearing-peak': bearing.bearingPeak,
  'bearing-mean': bearing.bearingMean,
  'bearing-peak-on-area': bearing.bearingPeakOnArea,
  'bearing-mean-on-area': bearing.bearingMeanOnArea,
  'least-loaded-sector': bearing.leastLoaded,
  'shaking-force': shaking.shakingForce,
  'shaking-couple': shaking.shakingCouple,
  'order-forward': shaking.orderForward,
  'order-backward': shaking.orderBackward,
  'order-couple-forward': shaking.orderCoupleForward,
  'order-couple-backward': shaking.orderCoupleBackward,
  'order-long-axis': shaking.orderLongAxis,
  'order-short-axis': shaking.orderShortAxis,
  'order-couple-long-axis': shaking.orderCoupleLongAxis,
  'order-couple-short-axis': shaking.orderCoupleShortAxis,
  torque: torque.torque,
  'torque-mean': torque.torqueMean,
  'torque-peak': torque.torquePeak,
  'mean-power': torque.meanPower,
  'torque-order': torqueOrders.torqueOrder,
  'order-vector-sum': torqueOrders.orderVectorSum,
  'energy-fluctuation': energy.energyFluctuation,
  flywheel: energy.flywheel,
  'speed-fluctuation': energy.speedFluctuation,
  imep: indicated.imep,
  'imep-gross': indicated.imepGross,
  'indicated-power': indicated.indicatedPower,
  'peak-pressure': indicated.peakPressure,
  'firing-interval': firing.firingInterval,
  'firing-evenness': firing.firingEvenness,
  'firing-rms': succession.firingRms,
  'collector-spread': succession.collectorSpread,
  'same-bank': succession.sameBank,
  'same-throw': succession.sameThrow,
  'next-throw': succession.nextThrow,
  'reciprocating-mass': balance.reciprocatingMass,
  'rotating-mass': balance.rotatingMass,
  'bob-weight': balance.bobWeight,
  'balance-factor': balance.balanceFactor,
  'residual-static': balance.residualStatic,
  'residual-couple': balance.residualCouple,
  'permissible-residual': balance.permissibleResidual,
  'plane-residual': planes.planeResidual,
  'plane-permissible': planes.planePermissible,
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
