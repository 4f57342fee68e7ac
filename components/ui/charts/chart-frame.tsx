'use client'

import { useEffect, useId, useRef, useState, type KeyboardEvent, type PointerEvent } from 'react'
import { DataTable } from '../data-table'
import { SaveFiles } from '../save-files'
import type { Drawn, FrameProps, Points } from './types'

/**
 * What every chart has: a title, a sentence that sums it up, a drawing at the width there is, points that are read by
 * pointer and by key, the same figures as a table, and files of all that.
 */
export function ChartFrame({ title, sentence, table, compact, along, onChoose, children }: FrameProps) {
  const id = useId()
  const host = useRef<HTMLElement>(null)
  const picture = useRef<SVGSVGElement>(null)
  const [width, setWidth] = useState(compact ? 260 : 480)
  const [twin, setTwin] = useState(false)

  useEffect(() => {
    const observer = new ResizeObserver(([entry]) => setWidth(Math.round(entry.contentRect.width)))
    observer.observe(host.current!)
    return () => observer.disconnect()
  }, [])
  const drawn = children(Math.max(160, width))

  return (
    <figure className={compact ? 'chart compact' : 'chart'} ref={host} aria-labelledby={`${id}-title`}>
      <figcaption className={compact ? 'vh' : 'chart-head'}>
        <h4 id={`${id}-title`}>{title}</h4>
        <p className="cap" id={`${id}-sentence`}>
          {sentence}
        </p>
      </figcaption>
      <Reading
        points={drawn.points}
        along={along}
        onChoose={onChoose}
        label={title}
        sentence={`${id}-sentence`}
      >
        {(marker) => (
          <svg
            ref={picture}
            width={Math.max(160, width)}
            height={drawn.height}
            viewBox={`0 0 ${Math.max(160, width)} ${drawn.height}`}
            role="img"
            aria-label={sentence}
          >
            {drawn.picture}
            {marker}
          </svg>
        )}
      </Reading>
      <div className="chart-tools">
        <button
          type="button"
          className="twin-button"
          aria-expanded={twin}
          aria-controls={`${id}-twin`}
          onClick={() => setTwin(!twin)}
        >
          {twin ? 'Hide table' : 'Table'}
        </button>
        <SaveFiles table={table} picture={picture} />
      </div>
      {twin ? (
        <div id={`${id}-twin`}>
          <DataTable table={table} bare />
        </div>
      ) : null}
    </figure>
  )
}

interface ReadingProps {
  points: Drawn['points']
  along?: boolean
  label: string
  sentence: string
  onChoose?(index: number): void
  children(marker: React.ReactNode): React.ReactNode
}

/** The reading point: one at a time, moved by arrow keys or the pointer, said in a line below. */
function Reading({ points, along, label, sentence, onChoose, children }: ReadingProps) {
  const [asked, setAsked] = useState<number | null>(null)
  if (!points || points.count === 0) return children(null)
  const last = points.count - 1
  const at = asked === null ? null : Math.min(asked, last)

  const onKey = (event: KeyboardEvent) => {
    const from = at ?? -1
    const leap = event.shiftKey ? 10 : 1
    const to = {
      ArrowRight: from + leap,
      ArrowUp: from + leap,
      ArrowLeft: from - leap,
      ArrowDown: from - leap,
      Home: 0,
      End: last,
      PageUp: from + Math.ceil(points.count / 12),
      PageDown: from - Math.ceil(points.count / 12),
    }[event.key]
    if (to !== undefined) setAsked(Math.max(0, Math.min(last, to)))
    else if (event.key === 'Escape') setAsked(null)
    else if ((event.key === 'Enter' || event.key === ' ') && at !== null && onChoose) onChoose(at)
    else return
    event.preventDefault()
  }
  const nearest = (event: PointerEvent) => {
    const box = event.currentTarget.getBoundingClientRect()
    return nearestPoint(points, event.clientX - box.left, event.clientY - box.top, along)
  }
  const place = at === null ? null : points.place(at)
  return (
    <>
      <div
        className="chart-read"
        role="slider"
        tabIndex={0}
        aria-label={label}
        aria-describedby={sentence}
        aria-valuemin={1}
        aria-valuemax={points.count}
        aria-valuenow={(at ?? 0) + 1}
        aria-valuetext={at === null ? 'arrow keys read the points' : points.words(at)}
        onKeyDown={onKey}
        onPointerMove={(event) => setAsked(nearest(event))}
        onPointerLeave={() => setAsked(null)}
        onClick={() => at !== null && onChoose?.(at)}
      >
        {children(place && <circle className="mk reading" data-live cx={place.x} cy={place.y} r="4" />)}
      </div>
      <p className={at === null ? 'chart-said fig' : 'chart-said fig on'} aria-hidden="true">
        {at === null ? ' ' : points.words(at)}
      </p>
    </>
  )
}

function nearestPoint(points: Points, x: number, y: number, along = false): number {
  let best = 0
  let least = Infinity
  for (let i = 0; i < points.count; i++) {
    const place = points.place(i)
    const away = along ? Math.abs(place.x - x) : Math.hypot(place.x - x, place.y - y)
    if (away < least) [best, least] = [i, away]
  }
  return best
}
