import type { InkTheme, Visibility } from '@/scene/frame/types'
import type { FlatRig } from './prepare'

/** Everything one picture is drawn in. Allocated with the rig and the size, never with a frame. */
export interface Raster {
  flat: FlatRig
  view: View
  runs: Runs
  palette: Palette
  visibility: Visibility
  /** Seams, hatch and refinement, once they are there. */
  fine: Fine | null
  width: number
  height: number
  /** Picture pixels a CSS pixel: line widths and hatch grow with it. */
  scale: number
  /** Depth, surface and tone a pixel, nearest greatest, 0 is paper; one row more above and below. */
  pixels: Int32Array
  /** The same for ghosts, made when the first ghost is drawn. */
  ghostPixels: Int32Array
  /** Coverage by ink, with the same extra rows. */
  ink: Uint8Array
  /** RGBA in memory order, `width` × `height`. */
  image: Uint32Array<ArrayBuffer>
  /** What the last picture drew: x0, y0, x1, y1 (ends left out). */
  drawn: Int32Array
  /** What must be put on the canvas: the last picture's box united with this one's. */
  dirty: Int32Array
  /** The next picture covers everything: new size or colours. */
  whole: boolean
  /** Still picture: sums of samples, made when the first is refined. */
  sumRedBlue: Uint32Array
  sumGreen: Uint32Array
}

/** What makes a picture fine (./fine); an engine can be seen to move before it is there. */
export interface Fine {
  inkSeams(raster: Raster): void
  hangHatch(raster: Raster): void
  hatchRow(raster: Raster, surface: number, y: number, left: number, right: number): void
  addSample(raster: Raster, sample: number): void
  showSamples(raster: Raster, samples: number): void
  firstSamples: number
  allSamples: number
}

export interface RasterFrame {
  pose: Float64Array
  viewProjection: Float64Array
  eye: Float64Array
  tint: Float32Array
}

/** Doubles that change each frame, kept in one array so that none is boxed. */
export type Lens = Float64Array

/** How the parts stand before the eye in this frame. */
export interface View {
  /** 16 a part: rows that give picture x·w, picture y·w, w, and the distance from the near plane, of part coordinates. */
  matrix: Float64Array
  state: Uint8Array
  /** 4 a part: box on the picture. */
  box: Float64Array
  /** 2 a part: least and greatest 1/w of its box before the near plane. */
  inverses: Float64Array
  /** w of the middle of each part's box. */
  middle: Float64Array
  /** 6 a part: eye and light in part coordinates. */
  local: Float64Array
  /** 0 near … 1 far, a part: how far behind the nearest bank its bank stands. */
  far: Float64Array
  /** How the hatch of each part hangs (./hatch). */
  hang: Float64Array
  /** Parts that are drawn, nearest first; ghosts apart. */
  solids: Int32Array
  solidCount: number
  ghosts: Int32Array
  ghostCount: number

  /**
   * Projected vertices; the depth is scaled 1/w. After those of the rig two spare ones for a clipped edge, then
   * as many as there are faces for clipped faces, the next free one being `spare`.
   */
  x: Float64Array
  y: Float64Array
  z: Float64Array
  spare: number
  facing: Uint8Array
  /** How much thinner lines are along a surface that is narrow on screen. */
  thin: Float64Array
  /** Of each surface's faces that look at us: true area and area on the picture. */
  trueArea: Float64Array
  seenArea: Float64Array

  /** Faces to fill: 3 vertices each, with surface and tone. Solids nearest first, then ghosts. */
  corners: Int32Array
  codes: Int32Array
  solidFaces: number
  faces: number

  lens: Lens
}

/** The visible pieces of edges of one picture, before they are inked. */
export interface Runs {
  count: number
  /** 4 a run: both ends, in picture pixels. */
  ends: Float64Array
  /** Share of the run that has another body beyond it. */
  outline: Float64Array
  half: Float64Array
  /** Most coverage the run may reach, 0 … 255. */
  strength: Uint8Array
  length: Float64Array
  /** The common length below which the run is a fleck. */
  least: Float64Array
  /** The first run that ends on each projected vertex, −1 for none. */
  atVertex: Int32Array
  /** Runs that hang together form a tree; the root holds their common length. */
  parent: Int32Array
}

/** 256 colours a fill: from the bare fill to full ink, so that composing is a table look-up. */
export interface Palette {
  theme: InkTheme
  colours: Uint32Array
  /** First colour of the fill of each surface and tone (surface · 2 + tone). */
  fillOf: Uint16Array
  /** Tint step that each cylinder's crown is mixed for. */
  tints: Int32Array
}
