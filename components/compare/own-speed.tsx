'use client'

import { useEffect, useEffectEvent } from 'react'
import { TypedField } from '@/components/figures/typed-field'
import { useTyped } from '@/components/figures/use-typed'
import { formatQuantity } from '@/lib/units/format'
import { fromSi, toSi } from '@/lib/units/units'

const mostRpm = 100_000

interface Props {
  label: string
  speedRpm: number
  onSpeed(speedRpm: number): void
}

/** The speed of an engine whose speed is let go. */
export function OwnSpeed({ label, speedRpm, onSpeed }: Props) {
  const typed = useTyped('speed', 'rpm', toSi(speedRpm, 'rpm'), (value) =>
    value > 0 && value <= toSi(mostRpm, 'rpm') ? null : 'A speed is above 0 and at most 100,000 rpm.',
  )
  const tell = useEffectEvent((value: number) => onSpeed(fromSi(value, 'rpm')))
  useEffect(() => {
    if (typed.value !== undefined) tell(typed.value)
  }, [typed.value])
  const { text, unit } = formatQuantity(typed.value ?? 0, 'speed', 'si')
  return <TypedField label={label} typed={typed} shown={{ text, unit }} />
}
