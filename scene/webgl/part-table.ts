import { DataTexture, FloatType, NearestFilter, RGBAFormat } from 'three'
import { fillFar, placeBanks } from '@/scene/frame/banks'
import { GHOST, type Frame, type Part, type Rig, type Visibility } from '@/scene/frame/types'

/**
 * What the shaders must know of each part, a column a part in one small float texture, so that a frame is one upload:
 * row 0 cos, sin, x, y of its motion; row 1 visibility, bank, body, how far back its bank stands; row 2 its first surface
 * number, tint, and the direction of its bore across the crank (0, 0 where it has none);
 * row 3 the middle of its box, where its hatch hangs, and the family of that hatch.
 */
export interface PartTable {
  texture: DataTexture
  /** Is any part a ghost? */
  readonly ghosts: boolean
  setVisibility(visibility: Visibility): void
  write(frame: Frame): void
  dispose(): void
}

const rows = 4
const hatchFamilies = 6
const boreKinds = new Set<Part['kind']>(['piston', 'ring', 'piston-pin', 'liner'])

export function createPartTable(rig: Rig): PartTable {
  const count = rig.parts.length
  const data = new Float32Array(4 * rows * count)
  const texture = new DataTexture(data, count, rows, RGBAFormat, FloatType)
  texture.minFilter = texture.magFilter = NearestFilter
  const banks = placeBanks(rig.parts, rig.anchors.firing)
  const style = 4 * count
  const surface = 8 * count
  const hatch = 12 * count
  let first = 1 // 0 is paper
  rig.parts.forEach((part, i) => {
    data[style + 4 * i + 1] = part.bank
    data[style + 4 * i + 2] = part.body + 1
    data[surface + 4 * i] = first
    first += rig.meshes[part.mesh].surfaces.length
    const { box } = rig.meshes[part.mesh]
    for (let k = 0; k < 3; k++) data[hatch + 4 * i + k] = (box[k] + box[k + 3]) / 2
    data[hatch + 4 * i + 3] = Math.max(0, part.bank) % hatchFamilies
    if (part.cylinder < 0 || !boreKinds.has(part.kind)) return
    const [x, y] = rig.anchors.firing[part.cylinder]
    const reach = Math.hypot(x, y) || 1
    data[surface + 4 * i + 2] = x / reach
    data[surface + 4 * i + 3] = y / reach
  })
  let ghosts = false
  return {
    texture,
    get ghosts() {
      return ghosts
    },
    setVisibility(visibility) {
      ghosts = visibility.includes(GHOST)
      for (let i = 0; i < count; i++) data[style + 4 * i] = visibility[i]
    },
    write(frame) {
      fillFar(banks, frame.viewProjection)
      for (let i = 0; i < 4 * count; i++) data[i] = frame.pose[i]
      for (let i = 0; i < count; i++) {
        const { bank, cylinder } = rig.parts[i]
        data[style + 4 * i + 3] = bank < 0 ? 0 : banks.far[bank]
        data[surface + 4 * i + 1] = cylinder < 0 ? 0 : frame.tint[cylinder]
      }
      texture.needsUpdate = true
    },
    dispose: () => texture.dispose(),
  }
}
