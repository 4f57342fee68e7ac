import { useSyncExternalStore } from 'react'
import { readUnits } from '@/scene/session/kept-units'

const never = () => () => {}

/** The units chosen on the bench. */
export const useUnits = () =>
  useSyncExternalStore(
    never,
    () => readUnits(localStorage),
    () => 'si' as const,
  )
