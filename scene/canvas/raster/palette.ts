import { LIT, type InkTheme } from '@/scene/frame/types'
import type { FlatRig } from './prepare'
import { crownWash, litShade } from '@/scene/frame/manner'
import type { Palette, Raster, RasterFrame } from './types'

const PAPER = 0
const METAL = 1
const PART = 2
const LIT_LIGHT = 3
const LIT_SHADE = 4
const CROWNS = 5 // light and shade of each cylinder's crown

/** Tints are told apart to this many steps: fewer tables to mix anew. */
const tintSteps = 32

export function createPalette(flat: FlatRig): Palette {
  const theme = { paper: 0, part: 0, metal: 0, ink: 0, line: 0, pencil: 0, pencilWash: 0, gas: 0, fire: 0 }
  return {
    theme,
    colours: new Uint32Array((CROWNS + 2 * flat.cylinderCount) * 256),
    fillOf: new Uint16Array(flat.surfaceCount * 2),
    tints: new Int32Array(flat.cylinderCount),
  }
}

export function loadTheme(palette: Palette, theme: InkTheme) {
  palette.theme = { ...theme }
  mixFill(palette, PAPER, theme.paper)
  mixFill(palette, METAL, theme.metal)
  mixFill(palette, PART, theme.part)
  mixFill(palette, LIT_LIGHT, theme.pencilWash)
  mixFill(palette, LIT_SHADE, mix(theme.pencilWash, theme.pencil, litShade))
  palette.tints.fill(-1)
}

/** Crowns take the tint of their cylinder, lit parts the pencil's wash. */
export function fillPalette({ flat, palette, visibility }: Raster, frame: RasterFrame) {
  for (let cylinder = 0; cylinder < flat.cylinderCount; cylinder++) {
    const step = Math.round(Math.min(1, Math.max(0, frame.tint[cylinder] || 0)) * tintSteps)
    if (step === palette.tints[cylinder]) continue
    palette.tints[cylinder] = step
    const { theme } = palette
    const wash = (step / tintSteps) * crownWash
    mixFill(palette, CROWNS + 2 * cylinder, mix(theme.metal, theme.gas, wash))
    mixFill(palette, CROWNS + 2 * cylinder + 1, mix(theme.part, theme.gas, wash))
  }
  for (let s = 1; s < flat.surfaceCount; s++) {
    const part = flat.surfacePart[s]
    const cylinder = flat.partCylinder[part]
    const crown = flat.surfaceFill[s] === 2 && cylinder >= 0
    let shade = crown ? CROWNS + 2 * cylinder + 1 : PART
    let bright = crown ? CROWNS + 2 * cylinder : METAL
    if (visibility[part] === LIT) {
      shade = LIT_SHADE
      bright = LIT_LIGHT
    }
    palette.fillOf[s * 2] = shade << 8
    palette.fillOf[s * 2 + 1] = bright << 8
  }
}

function mixFill(palette: Palette, fill: number, colour: number) {
  for (let ink = 0; ink < 256; ink++) {
    const rgb = mix(colour, palette.theme.ink, ink / 255)
    palette.colours[fill * 256 + ink] = 0xff000000 | ((rgb & 255) << 16) | (rgb & 0xff00) | (rgb >> 16)
  }
}

/** From colour a to colour b, 0xRRGGBB. */
function mix(a: number, b: number, share: number) {
  let out = 0
  for (let shift = 0; shift <= 16; shift += 8) {
    const from = (a >> shift) & 255
    out |= Math.round(from + (((b >> shift) & 255) - from) * share) << shift
  }
  return out
}
