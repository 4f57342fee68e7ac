import type { Camera } from '@/scene/frame/types'
import { blendCamera, copyCamera } from './camera-blend'

/** The camera that draws, and where it is going. Moves cut, or ease for 200 ms where motion is allowed. */
export interface Eye {
  readonly camera: Camera
  /** At once, and whatever was under way is dropped. */
  set(camera: Camera): void
  goTo(camera: Camera, now: number): void
  /** Writes the camera for this moment; true where it has moved. */
  step(now: number): boolean
}

const ease = 200

const blank = (): Camera => ({ yaw: 0, pitch: 0, target: [0, 0, 0], distance: 1, fov: 0.25 })

export function createEye(motion: boolean): Eye {
  const camera = blank()
  const from = blank()
  const to = blank()
  let began = -1
  let placed = false
  const set = (next: Camera) => {
    copyCamera(camera, next)
    began = -1
    placed = true
  }
  return {
    camera,
    set,
    goTo(next, now) {
      if (!motion || !placed) return set(next)
      copyCamera(from, camera)
      copyCamera(to, next)
      began = now
    },
    step(now) {
      if (began < 0) return false
      const t = Math.min(1, Math.max(0, (now - began) / ease))
      if (t < 1) blendCamera(camera, from, to, t * t * (3 - 2 * t))
      else set(to)
      return true
    },
  }
}
