/** The free view: from the free end, its drive end away to the right, a little from above. */
export const defaultYaw = (-42 * Math.PI) / 180
export const defaultPitch = (26 * Math.PI) / 180

/** Unit vector from the target to the eye of an orbit camera. */
export function eyeDirection(yaw: number, pitch: number): [number, number, number] {
  return [Math.sin(yaw) * Math.cos(pitch), Math.sin(pitch), -Math.cos(yaw) * Math.cos(pitch)]
}

export const defaultDirection = eyeDirection(defaultYaw, defaultPitch)
