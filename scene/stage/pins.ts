import { project } from '@/scene/frame/camera'
import { buildRay, fillRay, pickPart } from '@/scene/frame/picking'
import { fillPinned, ON_ENGINE_FRAME, pointOnPart, standsBehind } from '@/scene/frame/pins'
import { HIDDEN, type Camera } from '@/scene/frame/types'
import { createPlaces, layOut, uncross, type BalloonPlaces } from './balloon-places'
import { legendRoom } from './legend'
import { legendRows } from './overlay'
import { solid } from './paint-arrow'
import { paintEnd, paintLeader, type LeaderForm } from './paint-leader'
import { adoptPinStyle } from './pin-style'
import type { CreateDetails, Details, Hold, Picture, StageLook } from './types'
import { createUpperLayers } from './upper-layers'

/** A remark that stands on a point of a part and rides with it. */
export interface Pin {
  number: number
  /** A part's id; what is not a part is pinned to the engine as a whole. */
  part: string
  /** In the part's own coordinates, m. */
  point: readonly [number, number, number]
  /** Of its flag: filled, washed or an outline. */
  form: 'filled' | 'washed' | 'outline'
  on: boolean
  /** Says what the flag stands for. */
  label: string
}

/** Pins over a stage: handed to it as further details, told what to show by the page. */
export interface PinLayer {
  details: CreateDetails
  /** Hears which flag is chosen; the answer stops it. */
  listen(onPin: (number: number) => void): () => void
  /** In the order in which they get flags where there is not room for all. */
  set(pins: readonly Pin[]): void
  /** Where the eye is; null before anything stands. */
  camera(): Camera | null
  /** Width of the sheet through its height; null before anything stands. */
  aspect(): number | null
  /** What stands on the sheet at this place, CSS pixels, and the point of it in its own coordinates. */
  pick(x: number, y: number): { part: string; point: [number, number, number] } | null
  /** A point of the world in the coordinates of the part as it stands on the sheet; null before anything does. */
  pointOn(part: string, world: ArrayLike<number>): [number, number, number] | null
}

const flagWidth = 26
const pitch = 25
const edge = 22
const air = 16
const bottom = 26
/** How many pins are asked in one moving picture whether something stands before them. */
const asked = 4

interface Standing {
  pin: Pin
  part: number
  /** Null where there is no room for its flag. */
  flag: HTMLButtonElement | null
}

export function createPinLayer(): PinLayer {
  let onPin: (number: number) => void = () => {}
  let pins: readonly Pin[] = []
  let shown: Pins | null = null
  return {
    details(hold, under) {
      shown = standPins(hold, under, (number) => onPin(number))
      shown.set(pins)
      return shown
    },
    listen(next) {
      onPin = next
      return () => {
        onPin = () => {}
      }
    },
    set(next) {
      pins = next
      shown?.set(next)
    },
    camera: () => shown?.camera() ?? null,
    aspect: () => shown?.aspect() ?? null,
    pick: (x, y) => shown?.pick(x, y) ?? null,
    pointOn: (part, world) => shown?.pointOn(part, world) ?? null,
  }
}

interface Pins extends Details, Pick<PinLayer, 'set' | 'camera' | 'aspect' | 'pick' | 'pointOn'> {}

function standPins(hold: Hold, under: Details | null, onPin: (number: number) => void): Pins {
  adoptPinStyle()
  const { host, eye, sheet } = hold
  const layers = createUpperLayers(host, false)
  const ray = buildRay()
  const world = new Float64Array(3)
  const spot = new Float64Array(3)
  const forms = { seen: formOf(solid, 2.6), seenOn: formOf(solid, 4), behind: formOf([4, 3], 2.6) }
  let picture: Picture | null = null
  let look: StageLook | null = null
  let pins: readonly Pin[] = []
  let standing: Standing[] = []
  let places: BalloonPlaces = createPlaces(0)
  let dots = new Float64Array(0)
  let behind = new Uint8Array(0)
  let next = 0
  let settled = false
  let fresh = true

  function formOf(dashes: readonly number[], dot: number): LeaderForm {
    return { colour: hold.palette.pencil, width: 1.2, dot, dashes }
  }

  const partOf = (id: string) => picture?.rig.parts.findIndex((part) => part.id === id) ?? -1

  /** Who stands where: only now and then, so it may allocate. */
  function settle() {
    if (!picture || !look) return
    const { rig, visibility } = picture
    fresh = false
    settled = true
    layers.written.replaceChildren()
    const index = new Map(rig.parts.map((part, i) => [part.id, i]))
    const top = legendRoom(legendRows(look)).height + air
    const room = 2 * (Math.floor(Math.max(0, sheet.height - top - bottom) / pitch) + 1)
    standing = pins.flatMap((pin): Standing[] => {
      const part = index.get(pin.part) ?? ON_ENGINE_FRAME
      return part >= 0 && visibility[part] === HIDDEN ? [] : [{ pin, part, flag: null }]
    })
    dots = new Float64Array(2 * standing.length)
    behind = new Uint8Array(standing.length)
    places = createPlaces(Math.min(room, standing.length))
    for (let i = 0; i < places.count; i++) standing[i].flag = makeFlag(standing[i].pin)
    layers.written.append(...standing.flatMap(({ flag }) => flag ?? []))
    fillDots()
    layOut(places, { ...{ width: sheet.width, height: sheet.height }, ...{ top, bottom, edge, pitch } })
    move()
  }

  function makeFlag({ number, form, on, label }: Pin) {
    const flag = document.createElement('button')
    flag.type = 'button'
    // the list beside the drawing has the same notes for the keyboard
    flag.tabIndex = -1
    flag.className = `stage-pin ${form}${on ? ' on' : ''}`
    flag.textContent = String(number)
    flag.setAttribute('aria-label', label)
    flag.addEventListener('click', () => onPin(number))
    return flag
  }

  function fillDots() {
    if (!picture) return
    const { pose, frame } = picture
    for (let i = 0; i < standing.length; i++) {
      const { pin, part } = standing[i]
      const [x, y, z] = pin.point
      fillPinned(world, pose, part, x, y, z)
      if (!project(spot, frame.viewProjection, world[0], world[1], world[2], sheet.width, sheet.height))
        continue
      dots[2 * i] = spot[0]
      dots[2 * i + 1] = spot[1]
      if (i >= places.count) continue
      places.dot[2 * i] = spot[0]
      places.dot[2 * i + 1] = spot[1]
    }
  }

  function lookBehind(from: number, count: number) {
    if (!picture) return
    const { rig, pose, visibility, frame } = picture
    for (let k = 0; k < count; k++) {
      const i = (from + k) % standing.length
      const { pin, part } = standing[i]
      if (part === ON_ENGINE_FRAME) continue
      const [x, y, z] = pin.point
      fillPinned(world, pose, part, x, y, z)
      behind[i] = standsBehind(ray, rig, pose, visibility, eye.camera, frame.eye, world, part) ? 1 : 0
    }
  }

  function move() {
    for (let i = 0; i < places.count; i++) {
      const at = 2 * places.at[i]
      const x = places.place[at]
      const y = places.place[at + 1]
      standing[i].flag?.style.setProperty('transform', `translate(${x}px, ${y}px)`)
    }
  }

  function paint() {
    const { pen } = layers
    const { palette } = hold
    pen.clearRect(0, 0, sheet.width, sheet.height)
    for (let i = standing.length - 1; i >= 0; i--) {
      const form = behind[i] === 1 ? forms.behind : standing[i].pin.on ? forms.seenOn : forms.seen
      const x = dots[2 * i]
      const y = dots[2 * i + 1]
      if (i >= places.count) {
        paintEnd(pen, palette, form, x, y)
        continue
      }
      const at = 2 * places.at[i]
      const px = places.place[at]
      paintLeader(pen, palette, form, flagWidth / 2, px, places.place[at + 1], x, y)
    }
  }

  return {
    stand(nextPicture, nextLook) {
      under?.stand(nextPicture, nextLook)
      if (picture?.rig !== nextPicture.rig || look?.hidden !== nextLook.hidden) fresh = true
      picture = nextPicture
      look = nextLook
    },
    resize() {
      under?.resize()
      settled = false
    },
    tick: () => under?.tick(),
    turn: (angle) => under?.turn(angle),
    finish(still) {
      under?.finish(still)
      if (!picture || sheet.width === 0 || sheet.height === 0) return
      layers.resize(sheet.width, sheet.height, sheet.ratio)
      if (fresh || (still && !settled)) settle()
      else {
        fillDots()
        if (uncross(places)) move()
      }
      if (standing.length > 0) {
        lookBehind(next, still ? standing.length : Math.min(asked, standing.length))
        next = (next + asked) % standing.length
      }
      paint()
      if (still) for (let i = 0; i < places.count; i++) say(standing[i].flag, dots[2 * i], dots[2 * i + 1])
    },
    retheme(palette) {
      under?.retheme(palette)
      for (const form of Object.values(forms)) form.colour = palette.pencil
    },
    dispose() {
      under?.dispose()
      layers.remove()
    },
    set(nextPins) {
      pins = nextPins
      fresh = true
      hold.touch()
    },
    camera: () => picture && structuredClone(eye.camera),
    aspect: () => (sheet.height > 0 ? sheet.width / sheet.height : null),
    pick(x, y) {
      if (!picture || sheet.width === 0 || sheet.height === 0) return null
      const { rig, pose, visibility } = picture
      const { width, height } = sheet
      fillRay(ray, eye.camera, width / height, (2 * x) / width - 1, 1 - (2 * y) / height)
      const part = pickPart(rig, pose, visibility, ray)
      return part < 0 ? null : { part: rig.parts[part].id, point: pointOnPart(pose, part, ray.hit) }
    },
    pointOn(part, at) {
      return picture && pointOnPart(picture.pose, partOf(part), at)
    },
  }
}

/** Where its point is on the sheet, for whoever measures it; only at rest. */
function say(flag: HTMLButtonElement | null, x: number, y: number) {
  flag?.setAttribute('data-at', `${x.toFixed(2)} ${y.toFixed(2)}`)
}
