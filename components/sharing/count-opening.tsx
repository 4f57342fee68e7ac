'use client'

import { useEffect, useRef } from 'react'

/** Tells once that the page is before somebody's eyes; nothing on it depends on the answer. */
export function CountOpening({ address }: { address: string }) {
  const told = useRef(false)
  useEffect(() => {
    const tell = () => {
      if (told.current || document.visibilityState !== 'visible') return
      told.current = true
      void fetch(address, { method: 'POST', keepalive: true }).catch(() => {})
    }
    tell()
    document.addEventListener('visibilitychange', tell)
    return () => document.removeEventListener('visibilitychange', tell)
  }, [address])
  return null
}
