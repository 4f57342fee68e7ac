'use client'

import { useMemo } from 'react'
import { FiringStrip as Strip } from '@/components/drawing/firing-strip'
import { useBench, useResults, useSessionState } from '@/scene/session/react'

/** The strip of the engine on the bench, with its pressures where they are shown. */
export function FiringStrip() {
  const { clock } = useBench()
  const { model, analysis } = useResults()
  const train = useSessionState((state) => state.scene.train)
  const shown = useSessionState((state) => state.scene.view.overlays.pressure)
  const pressures = useMemo(() => {
    if (!shown) return null
    const traces = Object.entries(analysis.gas).map(([id, { pressureBar }]) => [id, pressureBar])
    return { angleDeg: analysis.angleDeg, pressureBar: Object.fromEntries(traces) }
  }, [analysis, shown])
  return <Strip clock={clock} train={train} forces={model} pressures={pressures} />
}
