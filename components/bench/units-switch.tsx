'use client'

import { Segmented } from '@/components/ui/segmented'
import { useBench, useSessionState } from '@/scene/session/react'

/** SI or US, one switch for the whole sheet. */
export function UnitsSwitch() {
  const { session } = useBench()
  const system = useSessionState((state) => state.system)
  return (
    <Segmented
      label="Units"
      value={system}
      options={[
        { value: 'si', label: 'mm, g' },
        { value: 'us', label: 'in, oz' },
      ]}
      onChange={session.setSystem}
    />
  )
}
