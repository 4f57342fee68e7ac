'use client'

import { useState } from 'react'
import { parseQuantity, type Mend } from '@/lib/units/parse'
import type { Quantity, System } from '@/lib/units/quantities'
import type { UnitName } from '@/lib/units/units'

export interface Typed {
  /** SI. */
  value: number | undefined
  refused?: { text: string; message: string; mends: Mend[] }
  enter(text: string): void
  /** Puts back what stood before anything was typed. */
  drop(): void
}

/** A figure typed into a calculator: the last good one counts, what was refused stays in the field with its reason. */
export function useTyped(
  quantity: Quantity,
  as: System | UnitName,
  initial: number | undefined,
  judge: (value: number) => string | null,
): Typed {
  const [value, setValue] = useState<number | null>(null)
  const [refused, setRefused] = useState<Typed['refused']>()
  return {
    value: value ?? initial,
    refused,
    enter(text) {
      const parsed = parseQuantity(text, quantity, as)
      const message = parsed.ok ? judge(parsed.value) : parsed.message
      if (message !== null) setRefused({ text, message, mends: parsed.ok ? [] : parsed.mends })
      else if (parsed.ok) {
        setRefused(undefined)
        setValue(parsed.value)
      }
    },
    drop() {
      setRefused(undefined)
      setValue(null)
    },
  }
}
