import type { MeshBuilder } from './mesh-builder'

/** Along which part axis a solid's own third coordinate lies; its plane follows in cyclic order. */
export type Axis = 'x' | 'y' | 'z'

export function placed(builder: MeshBuilder, axis: Axis): (a: number, b: number, c: number) => number {
  if (axis === 'z') return (a, b, c) => builder.vertex(a, b, c)
  if (axis === 'y') return (a, b, c) => builder.vertex(b, c, a)
  return (a, b, c) => builder.vertex(c, a, b)
}
