import type { Bearing } from '@/lib/mechanics/loads/bearings'
import type { Train } from '@/lib/mechanics/train'

/** How a bearing is called on the sheet. */
export function bearingName({ kind, id, index }: Bearing, train: Train): string {
  if (kind === 'main') return `main ${id}`
  if (kind === 'rod') return `rod ${id} on pin ${train.throws[train.cylinders[index].throw].id}`
  if (kind === 'knuckle') return `link rod ${id} on its knuckle`
  const rods = rodsOn(train, index).map((rod) => train.cylinders[rod].id)
  return rods.length > 1 ? `pin ${id}, rods ${rods.join(' and ')} together` : `pin ${id}, rod ${rods.join()}`
}

/** Rods that sit on a throw's pin themselves. */
export const rodsOn = (train: Train, index: number): number[] =>
  train.cylinders.flatMap(({ throw: on, link }, cylinder) => (on === index && !link ? [cylinder] : []))

/** A rod alone on its pin is the pin over again. */
export const isOfItsOwn = (bearing: Bearing, train: Train): boolean =>
  bearing.kind !== 'rod' || rodsOn(train, train.cylinders[bearing.index].throw).length > 1

export type Frame = 'journal' | 'block'

type Directions = [string, string, string, string]

export function directionsOf({ kind }: Bearing, frame: Frame): Directions {
  if (frame === 'block') return ['up, 0°', '90°', 'down, 180°', '270°']
  if (kind === 'main') return ['crank 0°', '90°', '180°', '270°']
  if (kind === 'knuckle') return ['along master, 0°', '90°', '180°', '270°']
  return ['outward, 0°', '90°', 'inward, 180°', '270°']
}

export function surfaceWords({ kind }: Bearing, frame: Frame): { surface: string; from: string } {
  if (frame === 'block') return { surface: 'bore in the block', from: 'straight up' }
  if (kind === 'main') return { surface: 'journal', from: 'the crank’s 0°' }
  if (kind === 'knuckle') return { surface: 'knuckle pin', from: 'the master rod’s axis' }
  return { surface: 'pin', from: 'its outward side' }
}
