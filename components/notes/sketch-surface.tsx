'use client'

import { useEffect, useRef, useState, type KeyboardEvent, type PointerEvent } from 'react'
import { freehand, refusedShape, spanned, type Place, type Shape, type Sketch } from './sketch'
import { StillShape } from './still-layer'

interface Props {
  sketch: Sketch
  onSketch(sketch: Sketch): void
}

const arrows: Record<string, Place> = {
  ArrowLeft: [-1, 0],
  ArrowRight: [1, 0],
  ArrowUp: [0, -1],
  ArrowDown: [0, 1],
}

/** The still picture as paper: a hand draws on it, or arrow keys move a cross and Enter sets both ends of an arrow or a box. */
export function SketchSurface({ sketch, onSketch }: Props) {
  const { aspect, shapes, tool } = sketch
  const paper = useRef<SVGSVGElement>(null)
  const trail = useRef<Place[]>([])
  const [under, setUnder] = useState<Shape | null>(null)
  const [cross, setCross] = useState<Place>([0.5, 0.5])
  const [from, setFrom] = useState<Place | null>(null)
  const [said, setSaid] = useState('')
  useEffect(() => paper.current?.focus({ preventScroll: true }), [])

  const placeOf = (event: PointerEvent): Place => {
    const box = paper.current!.getBoundingClientRect()
    return [(event.clientX - box.left) / box.width, (event.clientY - box.top) / box.height]
  }
  const add = (shape: Shape | null) => {
    setUnder(null)
    if (!shape) return
    const against = refusedShape(sketch, shape)
    setSaid(against ?? '')
    if (!against) onSketch({ ...sketch, shapes: [...shapes, shape] })
  }
  const shapeOf = (places: readonly Place[]) =>
    tool === 'freehand' ? freehand(places) : spanned(tool, places[0], places[places.length - 1])

  const down = (event: PointerEvent) => {
    if (event.button !== 0) return
    event.currentTarget.setPointerCapture(event.pointerId)
    trail.current = [placeOf(event)]
  }
  const move = (event: PointerEvent) => {
    if (trail.current.length === 0) return
    trail.current.push(placeOf(event))
    setUnder(shapeOf(trail.current))
  }
  const up = (event: PointerEvent) => {
    if (trail.current.length === 0) return
    add(shapeOf([...trail.current, placeOf(event)]))
    trail.current = []
  }

  const key = (event: KeyboardEvent) => {
    const by = arrows[event.key]
    const size = event.shiftKey ? 0.002 : 0.02
    if (by) {
      const next: Place = [
        Math.min(1, Math.max(0, cross[0] + by[0] * size)),
        Math.min(1, Math.max(0, cross[1] + by[1] * size)),
      ]
      setCross(next)
      if (from && tool !== 'freehand') setUnder(spanned(tool, from, next))
      setSaid(`${Math.round(next[0] * 100)} across, ${Math.round(next[1] * 100)} down`)
    } else if (event.key === 'Enter' && tool === 'freehand') {
      setSaid('Freehand needs a hand: take the arrow or the box.')
    } else if (event.key === 'Enter' && tool !== 'freehand') {
      if (!from) {
        setFrom(cross)
        setSaid('One end set: move to the other, Enter sets it.')
      } else {
        add(spanned(tool, from, cross))
        setFrom(null)
      }
    } else if (event.key === 'Escape' && from) {
      setFrom(null)
      setUnder(null)
    } else if (event.key === 'Backspace') onSketch({ ...sketch, shapes: shapes.slice(0, -1) })
    else return
    event.preventDefault()
  }

  const [x, y] = [cross[0] * aspect, cross[1]]
  return (
    <div className="still-paper">
      <svg
        ref={paper}
        className="still is-paper"
        viewBox={`0 0 ${aspect} 1`}
        style={{ aspectRatio: aspect }}
        tabIndex={0}
        role="application"
        aria-roledescription="still picture to draw on"
        aria-label="Draw here. Arrow keys move the cross, Enter sets an end, Backspace undoes, Escape drops the end that is set."
        onPointerDown={down}
        onPointerMove={move}
        onPointerUp={up}
        onPointerCancel={() => {
          trail.current = []
          setUnder(null)
        }}
        onKeyDown={key}
      >
        {[...shapes, ...(under ? [under] : [])].map((shape, i) => (
          <StillShape key={i} shape={shape} aspect={aspect} />
        ))}
        <path className="still-cross" d={`M${x - 0.02} ${y}h.04M${x} ${y - 0.02}v.04`} />
        {from ? <circle className="still-end" cx={from[0] * aspect} cy={from[1]} r={0.006} /> : null}
      </svg>
      <p className="vh" role="status">
        {said}
      </p>
    </div>
  )
}
