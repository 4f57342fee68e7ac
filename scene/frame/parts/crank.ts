import type { Room } from '../room'
import { addJournals, addPins } from './journals'
import { addWebs } from './webs'

export interface CrankParts {
  /** Part index of each throw's pin. */
  pins: number[]
  /** How far from the crank axis webs and counterweights reach, m. */
  reach: number
}

export function addCrank(room: Room): CrankParts {
  addJournals(room)
  const pins = addPins(room)
  return { pins, reach: addWebs(room) }
}
