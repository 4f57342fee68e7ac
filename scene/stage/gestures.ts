export interface GestureIntents {
  orbit(dx: number, dy: number): void
  pan(dx: number, dy: number): void
  /** Factor on the distance; x and y from the sheet's top left. */
  zoom(factor: number, x: number, y: number): void
  /** A drag, a pinch or a turn of the wheel is over. */
  end(): void
  click(x: number, y: number): void
  /** Null when the pointer has left. */
  hover(at: Point | null): void
}

export interface Point {
  x: number
  y: number
}

/** A hand that moved no farther than this has clicked. */
const clickSlop = 4
/** The wheel has no end of its own; this long without it is one, ms. */
const wheelRest = 180
const zoomPerWheelPixel = 0.0015

/** One finger or the main button orbits; shift, another button or two fingers pan; wheel and pinch zoom; a click picks. */
export function listenToGestures(surface: HTMLElement, intents: GestureIntents): () => void {
  const pointers = new Map<number, Point>()
  let travelled = 0
  let panning = false
  let wheelTimer: ReturnType<typeof setTimeout> | undefined

  const place = (event: MouseEvent): Point => {
    const box = surface.getBoundingClientRect()
    return { x: event.clientX - box.left, y: event.clientY - box.top }
  }

  const down = (event: PointerEvent) => {
    if (pointers.size === 2) return
    surface.setPointerCapture(event.pointerId)
    if (pointers.size === 0) travelled = 0
    else travelled = Infinity
    panning = event.button !== 0 || event.shiftKey
    pointers.set(event.pointerId, place(event))
  }

  const move = (event: PointerEvent) => {
    const now = place(event)
    const before = pointers.get(event.pointerId)
    if (!before) {
      if (event.pointerType !== 'touch') intents.hover(now)
      return
    }
    const dx = now.x - before.x
    const dy = now.y - before.y
    travelled += Math.abs(dx) + Math.abs(dy)
    if (pointers.size === 2) pinch(event.pointerId, before, now)
    else if (travelled > clickSlop) {
      if (panning) intents.pan(dx, dy)
      else intents.orbit(dx, dy)
    }
    if (travelled > clickSlop || pointers.size === 2) pointers.set(event.pointerId, now)
  }

  /** Two fingers: the middle pans, the spread zooms about the middle. */
  const pinch = (id: number, before: Point, now: Point) => {
    for (const [other, still] of pointers) {
      if (other === id) continue
      const spread = Math.hypot(before.x - still.x, before.y - still.y)
      const wider = Math.hypot(now.x - still.x, now.y - still.y)
      intents.pan((now.x - before.x) / 2, (now.y - before.y) / 2)
      if (spread > 0 && wider > 0) intents.zoom(spread / wider, (now.x + still.x) / 2, (now.y + still.y) / 2)
    }
  }

  const up = (event: PointerEvent) => {
    if (!pointers.delete(event.pointerId) || pointers.size > 0) return
    if (travelled > clickSlop) intents.end()
    else if (event.type === 'pointerup' && event.button === 0) {
      const at = place(event)
      intents.click(at.x, at.y)
    }
  }

  const leave = () => {
    if (pointers.size === 0) intents.hover(null)
  }

  const wheel = (event: WheelEvent) => {
    event.preventDefault()
    const at = place(event)
    const pixels = event.deltaMode === WheelEvent.DOM_DELTA_PIXEL ? event.deltaY : event.deltaY * 16
    intents.zoom(Math.exp(Math.max(-400, Math.min(400, pixels)) * zoomPerWheelPixel), at.x, at.y)
    clearTimeout(wheelTimer)
    wheelTimer = setTimeout(intents.end, wheelRest)
  }

  const menu = (event: Event) => event.preventDefault()

  surface.addEventListener('pointerdown', down)
  surface.addEventListener('pointermove', move)
  surface.addEventListener('pointerup', up)
  surface.addEventListener('pointercancel', up)
  surface.addEventListener('pointerleave', leave)
  surface.addEventListener('wheel', wheel, { passive: false })
  surface.addEventListener('contextmenu', menu)
  return () => {
    clearTimeout(wheelTimer)
    surface.removeEventListener('pointerdown', down)
    surface.removeEventListener('pointermove', move)
    surface.removeEventListener('pointerup', up)
    surface.removeEventListener('pointercancel', up)
    surface.removeEventListener('pointerleave', leave)
    surface.removeEventListener('wheel', wheel)
    surface.removeEventListener('contextmenu', menu)
  }
}
