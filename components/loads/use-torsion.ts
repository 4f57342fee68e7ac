'use client'

import { useMemo } from 'react'
import type { CycleParts } from '@/lib/mechanics/loads/cycle-parts'
import {
  criticalSpeeds,
  modeVectorSum,
  runningRange,
  usualOrders,
  type RunningRange,
} from '@/lib/mechanics/torsion/critical-speeds'
import { shaftModes, type ShaftMode } from '@/lib/mechanics/torsion/shaft-modes'
import type { Caution } from '@/lib/mechanics/analysis/cautions'
import { stiffnessesByThrow, stiffnessesOf, torsionChain } from '@/scene/frame/torsion-chain'
import { torsionAssumptions } from '@/scene/frame/torsion-words'
import { useResults } from '@/scene/session/react'
import type { Critical } from './torsion-words'

export interface Torsion {
  stations: string[]
  inertias: number[]
  stiffnesses: number[]
  modes: ShaftMode[]
  criticals: Critical[]
  range: RunningRange | null
  assumptions: Caution[]
}

/** The crank as lumped inertias, with its modes and criticals; or what is missing for them. */
export function useTorsion({ train, plan }: CycleParts, shear: number, byThrow: number | undefined) {
  const { document } = useResults()
  const chain = useMemo(() => torsionChain(document, train), [document, train])
  const torsion = useMemo((): Torsion | null => {
    const { stations, twists, stationOf } = chain
    const inertias = stations.flatMap(({ inertia }) => (inertia === null ? [] : [inertia]))
    if (inertias.length < stations.length || (byThrow === undefined && !twists)) return null
    const stiffnesses =
      byThrow === undefined ? stiffnessesOf(twists!, shear) : stiffnessesByThrow(train.throws.length, byThrow)
    const modes = shaftModes({ inertias, stiffnesses })
    const range = runningRange(train)
    const frequencies = modes.map(({ frequency }) => frequency)
    return {
      stations: stations.map(({ name }) => name),
      inertias,
      stiffnesses,
      modes,
      range,
      criticals: criticalSpeeds(frequencies, usualOrders(train), range).map((one) => ({
        ...one,
        vectorSum: modeVectorSum(plan.fires, one.order, modes[one.mode], stationOf),
      })),
      assumptions: torsionAssumptions(chain, {
        stiffnesses: byThrow === undefined ? { shear } : 'by-throw',
        inertias: 'document',
      }),
    }
  }, [chain, train, plan, shear, byThrow])
  return { missing: chain.missing, torsion }
}
