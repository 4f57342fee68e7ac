import type { SceneCamera } from '@/scene/model/scene'
import type { Camera } from './types'

const DEGREE = Math.PI / 180
const FOV = 16 * DEGREE

/** The document's camera (degrees, millimetres) as the stage's. */
export function cameraOf({ yawDeg, pitchDeg, distanceMm, targetMm }: SceneCamera): Camera {
  return {
    yaw: yawDeg * DEGREE,
    pitch: pitchDeg * DEGREE,
    distance: distanceMm / 1000,
    target: targetMm.map((mm) => mm / 1000) as [number, number, number],
    fov: FOV,
  }
}

/** The stage's camera as the document keeps it: for a view, a hundredth of a degree and of a millimetre are enough. */
export function sceneCameraOf({ yaw, pitch, distance, target }: Camera, steps = 100): SceneCamera {
  const round = (value: number) => Math.round(value * steps) / steps + 0
  return {
    yawDeg: round(yaw / DEGREE),
    pitchDeg: round(pitch / DEGREE),
    distanceMm: round(distance * 1000),
    targetMm: target.map((metres) => round(metres * 1000)) as [number, number, number],
  }
}
