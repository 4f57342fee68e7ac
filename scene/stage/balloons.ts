import { project } from '@/scene/frame/camera'
import { HIDDEN } from '@/scene/frame/types'
import { createPlaces, layOut, uncross, type BalloonPlaces } from './balloon-places'
import type { Palette } from './palette'
import { solid, type Pen } from './paint-arrow'
import { paintLeader, type LeaderForm } from './paint-leader'
import type { Balloon, Picture } from './types'

/** Numbered balloons of the parts list: buttons down the sides of the sheet, leaders on the overlay. */
export interface Balloons {
  set(balloons: Balloon[]): void
  /** The eye or the sheet has changed: find places afresh when it is still. */
  unsettle(): void
  place(picture: Picture, width: number, height: number, still: boolean): void
  paint(pen: Pen, palette: Palette): void
}

const radius = 12
const edge = 26
const pitch = 34
const top = 104 // below the legend
const bottom = 36

const spot = new Float64Array(3)

interface Standing {
  balloon: Balloon
  button: HTMLButtonElement
  part: number
}

export function createBalloons(layer: HTMLElement, onBalloon: (number: number) => void): Balloons {
  let balloons: Balloon[] = []
  let buttons = new Map<number, HTMLButtonElement>()
  let standing: Standing[] = []
  let places: BalloonPlaces = createPlaces(0)
  const form: LeaderForm = { colour: '', width: 0.8, dot: 2, dashes: solid }
  let settled = false
  /** Other balloons, or other parts to stand on: not to be put off. */
  let fresh = true

  const makeButton = (number: number) => {
    const button = document.createElement('button')
    button.type = 'button'
    button.textContent = String(number)
    button.setAttribute('aria-label', `Number ${number} of the parts list`)
    button.addEventListener('click', () => onBalloon(number))
    layer.append(button)
    return button
  }

  /** Who stands where: only now and then, so it may allocate. */
  const settle = (picture: Picture, width: number, height: number) => {
    settled = true
    fresh = false
    const partOf = new Map(picture.rig.parts.map((part, i) => [part.id, i]))
    const seen = (id: string) => {
      const part = partOf.get(id)
      return part !== undefined && picture.visibility[part] !== HIDDEN
    }
    standing = balloons.flatMap((balloon) => {
      const id = balloon.parts.find(seen)
      const button = buttons.get(balloon.number)
      if (!button) return []
      button.hidden = id === undefined
      return id === undefined ? [] : [{ balloon, button, part: partOf.get(id) as number }]
    })
    places = createPlaces(standing.length)
    fillDots(picture, width, height)
    layOut(places, { width, height, top, bottom, edge, pitch })
    move()
  }

  const fillDots = ({ rig, pose, frame }: Picture, width: number, height: number) => {
    for (let i = 0; i < standing.length; i++) {
      const { part } = standing[i]
      const { box } = rig.meshes[rig.parts[part].mesh]
      const x = (box[0] + box[3]) / 2
      const y = (box[1] + box[4]) / 2
      const cos = pose[4 * part]
      const sin = pose[4 * part + 1]
      const wx = cos * x - sin * y + pose[4 * part + 2]
      const wy = sin * x + cos * y + pose[4 * part + 3]
      if (!project(spot, frame.viewProjection, wx, wy, (box[2] + box[5]) / 2, width, height)) continue
      places.dot[2 * i] = spot[0]
      places.dot[2 * i + 1] = spot[1]
    }
  }

  const move = () => {
    for (let i = 0; i < standing.length; i++) {
      const at = 2 * places.at[i]
      standing[i].button.style.transform = `translate(${places.place[at]}px, ${places.place[at + 1]}px)`
    }
  }

  return {
    set(next) {
      balloons = next
      fresh = true
      const kept = new Map<number, HTMLButtonElement>()
      for (const { number, state } of next) {
        const button = buttons.get(number) ?? makeButton(number)
        button.className = `stage-balloon ${state}`
        kept.set(number, button)
        buttons.delete(number)
      }
      for (const button of buttons.values()) button.remove()
      buttons = kept
    },
    unsettle() {
      settled = false
    },
    place(picture, width, height, still) {
      if (fresh || (still && !settled)) return settle(picture, width, height)
      fillDots(picture, width, height)
      if (uncross(places)) move()
    },
    paint(pen, palette) {
      for (let i = 0; i < standing.length; i++) {
        form.colour = standing[i].balloon.state === 'bad' ? palette.pencil : palette.ink
        const at = 2 * places.at[i]
        const x = places.place[at]
        const y = places.place[at + 1]
        paintLeader(pen, palette, form, radius, x, y, places.dot[2 * i], places.dot[2 * i + 1])
      }
    },
  }
}
