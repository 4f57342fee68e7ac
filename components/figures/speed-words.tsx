'use client'

import { formatNumber } from '@/lib/units/format'
import { useResults } from '@/scene/session/react'

export function SpeedWords() {
  const { speedRpm } = useResults()
  return <>at {formatNumber(speedRpm, { decimals: 0 })} rpm</>
}
