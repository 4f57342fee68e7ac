import { Color, Matrix4, Vector2, Vector3, type IUniform, type Texture } from 'three'
import type { Frame, InkTheme, Rig } from '@/scene/frame/types'
import { light } from '@/scene/frame/manner'

/** The uniforms that all passes share: written in place before each frame, never replaced. */
export interface Drawing {
  uniforms: { [name: string]: IUniform }
  setTheme(theme: InkTheme): void
  setSheet(width: number, height: number, ratio: number): void
  setView(frame: Frame, rig: Rig): void
}

const colours = ['paper', 'part', 'metal', 'ink', 'pencil', 'pencilWash', 'gas'] as const

export function createDrawing(): Drawing {
  const viewProjection = new Matrix4()
  const eye = new Vector3()
  const toLight = new Vector3()
  const sheet = new Vector2(1, 1)
  const depthFit = new Vector2(0, 1)
  const ratio = { value: 1 }
  const inks = Object.fromEntries(colours.map((name) => [name, { value: new Color() }]))
  return {
    uniforms: {
      viewProjection: { value: viewProjection },
      eye: { value: eye },
      toLight: { value: toLight },
      sheet: { value: sheet },
      depthFit: { value: depthFit },
      ratio,
      parts: { value: null as Texture | null },
      ids: { value: null as Texture | null },
      ghostIds: { value: null as Texture | null },
      ghosts: { value: false },
      coverage: { value: null as Texture | null },
      ...Object.fromEntries(colours.map((name) => [`${name}Colour`, inks[name]])),
    },
    setTheme(theme) {
      // The drawing is mixed in sRGB as a 2D canvas mixes, so the numbers pass unconverted.
      for (const name of colours) {
        const value = theme[name]
        inks[name].value.setRGB((value >> 16) / 255, ((value >> 8) & 255) / 255, (value & 255) / 255)
      }
    },
    setSheet(width, height, pixels) {
      sheet.set(width, height)
      ratio.value = pixels
    },
    setView(frame, rig) {
      const m = frame.viewProjection
      for (let i = 0; i < 16; i++) viewProjection.elements[i] = m[i]
      eye.set(frame.eye[0], frame.eye[1], frame.eye[2])
      pointLight(toLight, m)
      fitDepth(depthFit, m, rig.bounds)
    },
  }
}

/** The light stands where it does for whoever looks: rows of the view are the sheet's right and up. */
function pointLight(out: Vector3, m: Float64Array) {
  const r = Math.hypot(m[0], m[4], m[8])
  const u = Math.hypot(m[1], m[5], m[9])
  const rx = m[0] / r
  const ry = m[4] / r
  const rz = m[8] / r
  const ux = m[1] / u
  const uy = m[5] / u
  const uz = m[9] / u
  out.set(
    light.right * rx + light.up * ux + light.toEye * (ry * uz - rz * uy),
    light.right * ry + light.up * uy + light.toEye * (rz * ux - rx * uz),
    light.right * rz + light.up * uz + light.toEye * (rx * uy - ry * ux),
  )
}

function fitDepth(out: Vector2, m: Float64Array, bounds: Float64Array) {
  let far = Infinity
  let near = 0
  for (let corner = 0; corner < 8; corner++) {
    const x = bounds[corner & 1 ? 3 : 0]
    const y = bounds[corner & 2 ? 4 : 1]
    const z = bounds[corner & 4 ? 5 : 2]
    const inverse = 1 / Math.max(1e-6, m[3] * x + m[7] * y + m[11] * z + m[15])
    far = Math.min(far, inverse)
    near = Math.max(near, inverse)
  }
  out.set(far, near)
}
