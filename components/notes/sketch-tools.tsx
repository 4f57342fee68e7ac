'use client'

import { useId } from 'react'
import { Icon } from '@/components/ui/icon'
import { Segmented } from '@/components/ui/segmented'
import { mostOnStill } from '@/scene/model/still-drawing'
import { emptySketch, type Tool } from './sketch'
import type { NoteDesk } from './use-note-desk'

const tools: { value: Tool; label: string }[] = [
  { value: 'arrow', label: 'Arrow' },
  { value: 'box', label: 'Box' },
  { value: 'freehand', label: 'Freehand' },
]

interface Props {
  desk: NoteDesk
  /** The note that the drawing belongs to, or only where it will be pinned. */
  at: Parameters<NoteDesk['goTo']>[0]
}

/** Begins a drawing on the still picture, and holds what belongs to it besides the strokes. */
export function SketchTools({ desk, at }: Props) {
  const { sketch, setSketch } = desk
  const id = useId()
  if (!sketch)
    return (
      <button
        type="button"
        className="btn sm draw-on"
        onClick={() => {
          // it is shown at the note's view, so it is drawn there
          desk.goTo(at)
          setSketch(emptySketch(desk.layer.aspect() ?? 1))
        }}
      >
        Draw on the picture
      </button>
    )
  return (
    <fieldset className="sketch-tools">
      <legend>Drawn on the picture</legend>
      <div className="row">
        <Segmented
          label="Pencil"
          value={sketch.tool}
          options={tools}
          onChange={(tool) => setSketch({ ...sketch, tool })}
        />
        <button
          type="button"
          className="btn sm ic"
          aria-label="Undo the last stroke"
          disabled={sketch.shapes.length === 0}
          onClick={() => setSketch({ ...sketch, shapes: sketch.shapes.slice(0, -1) })}
        >
          <Icon name="undo" />
        </button>
        <button type="button" className="btn sm txt" onClick={() => setSketch(null)}>
          No drawing
        </button>
      </div>
      <div className="lf">
        <label htmlFor={id}>What it shows, in words</label>
        <div className="box">
          <input
            id={id}
            value={sketch.words}
            maxLength={mostOnStill.words}
            onChange={(event) => setSketch({ ...sketch, words: event.target.value })}
          />
        </div>
      </div>
      <p className="cap" role="status">
        {sketch.shapes.length === 0 ? 'Nothing drawn yet.' : `${sketch.shapes.length} drawn.`}
      </p>
    </fieldset>
  )
}
