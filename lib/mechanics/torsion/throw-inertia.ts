import { bobWeights } from '../balance'
import type { Train } from '../train'

/**
 * Inertia of each throw about the crank axis, kg m²: I_crank + (m_rot + m_rec/2)·r², in the order of `train.throws`.
 * m_rot and m_rec are all rods of the throw as two masses, link rods with their master; half the reciprocating mass is
 * its mean over a turn. `crank` is what the crank itself has there: pin, webs, counterweights.
 * Common practice.
 */
export const throwInertias = (train: Train, crank: readonly number[]): number[] =>
  bobWeights(train).map(
    ({ rotating, reciprocating }, i) =>
      crank[i] + (rotating + reciprocating / 2) * train.throws[i].radius ** 2,
  )
