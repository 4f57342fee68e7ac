import type { Instant, Plan } from '@/lib/mechanics/instant'
import type { NamedView } from '@/scene/frame/named-views'
import type { Camera, Frame, PartGroup, Pose, Rig, Visibility } from '@/scene/frame/types'
import type { Overlays } from '@/scene/model/scene'
import type { Clock } from '@/scene/session/clock'
import type { Eye } from './eye'
import type { Palette } from './palette'
import type { PastGhost } from './past-ghost'

/** All that a picture needs to move. */
export interface MovingModel {
  rig: Rig
  /**
   * An older version of the engine, drawn over it at the same crank angle by what is handed in with it: a page that never
   * draws one does not fetch how.
   */
  past?: { rig: Rig; ghost: PastGhost }
}

/** Everything one stage moves its parts with, in buffers that live as long as the model does. */
export interface Picture {
  model: MovingModel
  rig: Rig
  pose: Pose
  visibility: Visibility
  frame: Frame
}

/** What follows from the speed. */
export interface Forces {
  /** The kernel's plan at the speed that the forces are for. */
  plan: Plan
  /** Firing events over one cycle, rad, in order. */
  events: { cylinder: number; angle: number }[]
  /** Largest force over the cycle, N: it sets the page's one scale of force. */
  peakForce: number
  /** The scale of force in metres a newton, where several drawings share one; else `peakForce` sets it. */
  metresPerNewton?: number
  /** Couple drawn as a full arc, N m: the cycle's largest, but never one that is next to nothing for such a crank. */
  fullCouple: number
  /** Highest pressure over any piston in the cycle, Pa: a crown is tinted by its share of it. */
  peakPressure: number
  /** Shaking force over one cycle, vertical and horizontal in turn, N: the orbit. */
  orbit: Float64Array
}

/** What stands on the stage: made anew (by memo) when the document or the speed changes, never per frame. */
export interface StageModel extends MovingModel, Forces {}

export { namedViews, type NamedView } from '@/scene/frame/named-views'

export interface Balloon {
  /** The number in the parts list. */
  number: number
  /** Part ids it may stand on; the first one visible is taken. */
  parts: string[]
  state: 'plain' | 'on' | 'bad'
}

export interface StageLook {
  hidden: PartGroup[]
  ghost: PartGroup[]
  overlays: Overlays
  /** Picked or pointed at in the parts list: part ids. */
  lit: string[]
  balloons: Balloon[]
  /** How forces are written in the legend and at the arrow tips. */
  forceUnit: 'N' | 'lbf'
}

export type RendererKind = 'webgl' | 'canvas'

export interface StageEvents {
  /** `world` is where it was met, m, until the next pick. */
  onPick?(part: string | null, world: ArrayLike<number>): void
  onHover?(part: string | null): void
  onBalloon?(number: number): void
  /** After an orbit, pan or zoom has ended, or a named view was taken. */
  onCamera?(camera: Camera): void
  /** Which renderer draws, and in one sentence why. */
  onRenderer?(kind: RendererKind, reason: string): void
  /** Once, when the engine is seen to move; where its clock stands, when it is seen. */
  onSeen?(): void
  /** Once for every drawn angle: update DOM by reference here, never state. Told by the details. */
  onTick?(instant: Instant): void
}

export interface StageOptions {
  /** `auto` asks the browser (scene/stage/probe). */
  renderer: RendererKind | 'auto'
  /** A pane: no labels, no balloons, no pointer. */
  pane?: NamedView
  /** May the camera ease (200 ms)? */
  motion: boolean
}

/**
 * Everything over and around the moving parts: forces, marks, words, what hands do. A stage moves without it, so that a
 * page can show an engine running before it has fetched the rest.
 */
export interface Details {
  /** Another model or look. */
  stand(picture: Picture, look: StageLook): void
  /** The sheet has another size, or the eye is going elsewhere. */
  resize(): void
  /** At the start of a frame. */
  tick(): void
  /** The crank has turned: fills what the frame shows beside the pose. */
  turn(angle: number): void
  /** The picture is on the sheet: paint and write over it. */
  finish(still: boolean): void
  retheme(palette: Palette): void
  dispose(): void
}

/** What a stage lets its details see and do. */
export interface Hold {
  host: HTMLElement
  clock: Clock
  events: StageEvents
  /** A pane: no labels, no balloons, no pointer. */
  pane: boolean
  eye: Eye
  sheet: SheetSize
  readonly palette: Palette
  /** Draw again. */
  touch(): void
  /** A frame, if only to look. */
  wake(): void
  /** By hand. */
  move(camera: Camera): void
  /** The hand has let go. */
  moved(): void
  view(name: NamedView): void
}

/** CSS pixels and how many of the device's go into one. */
export interface SheetSize {
  width: number
  height: number
  ratio: number
}

/** Further details go over the first and carry out what those `under` them do, too. */
export type CreateDetails = (hold: Hold, under: Details | null) => Details

export interface Stage {
  /** A model without forces can only move. */
  setModel(model: MovingModel | StageModel): void
  setLook(look: StageLook): void
  /** Null frames the whole engine. */
  setCamera(camera: Camera | null): void
  view(name: NamedView): void
  /** Draw with this one from now on; a lost WebGL context does the same by itself. */
  setRenderer(kind: RendererKind | 'auto'): void
  /** Colours have changed (theme). */
  retheme(): void
  /** Brings the details in, or further ones over them. */
  enrich(createDetails: CreateDetails): void
  dispose(): void
}

/**
 * Mounts a stage in `host` (position: relative) and draws on demand: after a setter, a gesture, or the clock.
 * Implemented in ./create-stage.
 */
export type CreateStage = (
  host: HTMLElement,
  clock: Clock,
  events: StageEvents,
  options: StageOptions,
) => Stage
