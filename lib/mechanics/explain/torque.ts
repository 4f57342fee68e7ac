import type { Engine } from './engine'
import { symbol, type Draft } from './explanation'
import { handbook, massless, newton, sampledEachDegree, steady } from './words'

export function torque({ instant }: Engine): Draft {
  return {
    title: 'Turning moment at this angle',
    quantity: 'torque',
    unit: 'N m',
    formula: 'gas torque + inertia torque',
    symbols: [
      symbol('gas torque', 'gas force × piston movement a radian, all cylinders', instant.gasTorque, 'N m'),
      symbol(
        'inertia torque',
        'what it takes to speed pistons and rods up and down',
        instant.inertiaTorque,
        'N m',
      ),
    ],
    assumptions: ['Positive where it drives the rotation.', steady, massless],
    source: newton,
  }
}

export function torqueMean(engine: Engine): Draft {
  const { torque: signal } = engine.cycle()
  return {
    title: 'Mean turning moment',
    quantity: 'torque',
    unit: 'N m',
    formula: 'sum / samples',
    symbols: [
      symbol(
        'sum',
        'of the turning moment at every degree',
        signal.reduce((sum, each) => sum + each, 0),
        'N m',
      ),
      symbol('samples', 'degrees of the cycle', signal.length),
    ],
    assumptions: [
      'Inertia gives back over a cycle what it takes: the mean is the gas alone.',
      sampledEachDegree,
      massless,
    ],
    source: handbook,
  }
}

/** The greatest magnitude of the turning moment, with its angle. */
export function torquePeak(engine: Engine): Draft {
  const { torque: signal } = engine.cycle()
  const at = signal.reduce((best, value, i) => (Math.abs(value) > Math.abs(signal[best]) ? i : best), 0)
  return {
    title: `Greatest turning moment, at ${at}°`,
    quantity: 'torque',
    unit: 'N m',
    formula: 'root(moment²)',
    symbols: [symbol('moment', `turning moment at ${at}°`, signal[at], 'N m')],
    assumptions: [sampledEachDegree, steady, massless],
    source: handbook,
  }
}

export function meanPower(engine: Engine): Draft {
  const { torque: signal } = engine.cycle()
  return {
    title: 'Power of the mean turning moment',
    quantity: 'power',
    unit: 'kW',
    formula: 'mean × speed / 1000',
    symbols: [
      symbol(
        'mean',
        'turning moment, mean of the cycle',
        signal.reduce((sum, each) => sum + each, 0) / signal.length,
        'N m',
      ),
      symbol('speed', 'crank speed', engine.plan.speed, 'rad/s'),
    ],
    assumptions: ['Nothing is taken off for what the engine drives.', sampledEachDegree, massless],
    source: handbook,
  }
}
