import type { Instant, Plan } from '@/lib/mechanics/instant'
import { namedViews, type NamedView } from '@/scene/frame/camera'
import type { Camera, PartGroup, Rig } from '@/scene/frame/types'
import type { Overlays } from '@/scene/model/scene'
import type { Clock } from '@/scene/session/clock'

/** What stands on the stage: made anew (by memo) when the document or the speed changes, never per frame. */
export interface StageModel {
  rig: Rig
  /** The kernel's plan at the speed that the forces are for. */
  plan: Plan
  /** Firing events over one cycle, rad, in order. */
  events: { cylinder: number; angle: number }[]
  /** Largest force over the cycle, N: it sets the page's one scale of force. */
  peakForce: number
  /** Couple drawn as a full arc, N m: the cycle's largest, but never one that is next to nothing for such a crank. */
  fullCouple: number
  /** Highest pressure over any piston in the cycle, Pa: a crown is tinted by its share of it. */
  peakPressure: number
  /** Shaking force over one cycle, vertical and horizontal in turn, N: the orbit. */
  orbit: Float64Array
}

export { namedViews, type NamedView }

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
  /** Section plane across the crank, m, or none. */
  sectionAxial: number | null
  overlays: Overlays
  /** Picked or pointed at in the parts list: part ids. */
  lit: string[]
  balloons: Balloon[]
  /** How forces are written in the legend and at the arrow tips. */
  forceUnit: 'N' | 'lbf'
}

export type RendererKind = 'webgl' | 'canvas'

export interface StageEvents {
  onPick?(part: string | null): void
  onHover?(part: string | null): void
  onBalloon?(number: number): void
  /** After an orbit, pan or zoom has ended, or a named view was taken. */
  onCamera?(camera: Camera): void
  /** Which renderer draws, and in one sentence why. */
  onRenderer?(kind: RendererKind, reason: string): void
  /** Once for every drawn angle: update DOM by reference here, never state. */
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

export interface Stage {
  setModel(model: StageModel): void
  setLook(look: StageLook): void
  /** Null frames the whole engine. */
  setCamera(camera: Camera | null): void
  view(name: NamedView): void
  /** Draw with this one from now on; a lost WebGL context does the same by itself. */
  setRenderer(kind: RendererKind | 'auto'): void
  /** Colours have changed (theme). */
  retheme(): void
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
