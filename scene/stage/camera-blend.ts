import type { Camera } from '@/scene/frame/types'

/** Into −π … π. */
const wrapTurn = (angle: number): number => angle - 2 * Math.PI * Math.round(angle / (2 * Math.PI))

export function copyCamera(out: Camera, from: Camera): void {
  out.yaw = from.yaw
  out.pitch = from.pitch
  out.distance = from.distance
  out.fov = from.fov
  for (let i = 0; i < 3; i++) out.target[i] = from.target[i]
}

/** Between two cameras the short way round, t from 0 to 1. */
export function blendCamera(out: Camera, from: Camera, to: Camera, t: number): void {
  out.yaw = from.yaw + wrapTurn(to.yaw - from.yaw) * t
  out.pitch = from.pitch + (to.pitch - from.pitch) * t
  out.distance = from.distance * (to.distance / from.distance) ** t
  out.fov = from.fov + (to.fov - from.fov) * t
  for (let i = 0; i < 3; i++) out.target[i] = from.target[i] + (to.target[i] - from.target[i]) * t
}

/** The same view to the eye: what comes back from a document has been rounded. */
export function sameCamera(a: Camera, b: Camera): boolean {
  const near = 1e-3
  return (
    Math.abs(wrapTurn(a.yaw - b.yaw)) < near &&
    Math.abs(a.pitch - b.pitch) < near &&
    Math.abs(a.distance / b.distance - 1) < near &&
    a.target.every((t, i) => Math.abs(t - b.target[i]) < near * b.distance)
  )
}
