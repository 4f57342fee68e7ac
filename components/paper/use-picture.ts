import { useEffect, useState } from 'react'
import type { Scene } from '@/scene/model/scene'
import { fetchFile } from './fetch-file'

/** The engine as the server draws it for print: the last one stays until the next is there. Null while there is none. */
export function usePicture(scene: Scene, wanted: boolean): { address: string | null; missing: boolean } {
  const [drawn, setDrawn] = useState<{ address: string | null; missing: boolean }>({
    address: null,
    missing: false,
  })
  useEffect(() => {
    if (!wanted) return
    const control = new AbortController()
    let made: string | null = null
    fetchFile('/api/v1/pictures', { scene, width: 900, height: 580, theme: 'print' }, control.signal)
      .then((blob) => {
        made = URL.createObjectURL(blob)
        setDrawn({ address: made, missing: false })
      })
      .catch(() => {
        if (!control.signal.aborted) setDrawn({ address: null, missing: true })
      })
    return () => {
      control.abort()
      if (made) URL.revokeObjectURL(made)
    }
  }, [scene, wanted])
  return drawn
}
