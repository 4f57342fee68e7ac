import { firingEvents, firingOf } from '../firing'
import type { Plan } from '../instant'

export interface Caution {
  code: string
  message: string
}

const rpm = (speed: number) => Math.round((speed * 30) / Math.PI).toLocaleString('en')

/** What the figures assume, and what they defer to: always said, with what this train and speed call for besides. */
export function cautions({ train, speed, fires }: Plan): Caution[] {
  const said: Caution[] = [
    {
      code: 'maker-first',
      message:
        "The engine maker's data, the machine shop's and the local rules, and a qualified person come before these figures.",
    },
    {
      code: 'rigid-crank',
      message:
        'The crank and its bearings are taken as rigid: bending, torsional vibration and oil film are not in these figures. Do not size parts from them alone.',
    },
    {
      code: 'constant-speed',
      message: 'The crank turns at constant speed; friction and gravity are left out.',
    },
  ]
  const add = (code: string, message: string) => said.push({ code, message })
  if (train.mains.length >= 2)
    add(
      'hinged-mains',
      'Main bearing loads are shared by the lever rule, as if the crank were hinged at every main: a stiff crank shares them otherwise.',
    )
  if (train.operating.max !== undefined && speed > train.operating.max)
    add(
      'over-speed',
      `${rpm(speed)} rpm is above the maximum of ${rpm(train.operating.max)} rpm. Forces rise with the square of speed: never run past the limit of the weakest part.`,
    )
  if (speed === 0)
    add('standing', 'At 0 rpm there are positions and gas forces only: nothing moves, so nothing is inertia.')
  if (train.gas.model === 'none')
    add(
      'no-gas',
      'No gas model is given: the same pressure stands over and under every piston, and all loads are inertia.',
    )
  if (train.gas.model === 'heat-release')
    add('heat-release', 'Cylinder pressure is a single-zone estimate from the heat given, not a measurement.')
  if (train.cylinders.some(({ rod }) => !rod.rigid))
    add(
      'two-mass-rod',
      'A rod without its own moment of inertia is taken as two masses at its ends, which overstates or understates its own couple.',
    )
  const { events, intervals } = firingOf(train, firingEvents(train, Array.from(fires)))
  if (events.length > 2 && Math.max(...intervals) > 2 * Math.PI + 0.01)
    add('bunched-firing', 'The cylinders fire close together and then pause for more than a turn.')
  if (train.crankMass !== undefined || train.counterweights.length > 0)
    add(
      'prove-balance',
      'Rotating parts are not to be run on a balance that has not been proved on a machine.',
    )
  return said
}
