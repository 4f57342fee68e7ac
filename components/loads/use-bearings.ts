'use client'

import { useMemo } from 'react'
import {
  bearings,
  bearingSignal,
  projectedArea,
  turnedSignal,
  type Bearing,
} from '@/lib/mechanics/loads/bearings'
import type { CycleParts } from '@/lib/mechanics/loads/cycle-parts'
import { loadFigures, type LoadFigures } from '@/lib/mechanics/loads/load-figures'
import { leastLoadedSector, surfaceLoad, type Sector } from '@/lib/mechanics/loads/surface-load'
import { toSi } from '@/lib/units/units'
import { bearingSizes } from '@/scene/model/bearing-sizes'
import { useResults } from '@/scene/session/react'
import { bearingName, isOfItsOwn } from './bearing-words'

export interface BearingAtSpeed {
  bearing: Bearing
  name: string
  area: number | undefined
  figures: LoadFigures
  /** The least loaded 60° of the journal, and for a main also of its bore. */
  journal: Sector
  block: Sector | null
}

/** Every bearing of the train with its figures at the speed of the sheet. */
export function useBearings(parts: CycleParts): BearingAtSpeed[] {
  const { document, speedRpm } = useResults()
  return useMemo(() => {
    const sizes = bearingSizes(document)
    return bearings(parts)
      .filter((bearing) => isOfItsOwn(bearing, parts.train))
      .map((bearing) => {
        const area = projectedArea(parts, bearing, sizes)
        const load = bearingSignal(parts, bearing, 'total', toSi(speedRpm, 'rpm'))
        const { radial, tangential } = turnedSignal(load, bearing.stand)
        const sector = (x: Float64Array, y: Float64Array) =>
          leastLoadedSector(surfaceLoad(x, y, bearing.pressed))
        return {
          bearing,
          name: bearingName(bearing, parts.train),
          area,
          figures: loadFigures(load, parts.angle, area),
          journal: sector(radial, tangential),
          block: bearing.kind === 'main' ? sector(load.vertical, load.horizontal) : null,
        }
      })
  }, [parts, document, speedRpm])
}
