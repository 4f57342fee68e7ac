import { useEffect, useRef, useState } from 'react'

/** The size of an element in CSS pixels, kept while it stands. */
export function useSize<T extends HTMLElement>() {
  const ref = useRef<T>(null)
  const [size, setSize] = useState({ width: 0, height: 0 })
  useEffect(() => {
    const watch = new ResizeObserver(([{ contentRect }]) =>
      setSize({ width: Math.round(contentRect.width), height: Math.round(contentRect.height) }),
    )
    watch.observe(ref.current!)
    return () => watch.disconnect()
  }, [])
  return { ref, ...size }
}
