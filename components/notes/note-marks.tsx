'use client'

import { SketchSurface } from './sketch-surface'
import { StillDrawings } from './still-layer'
import type { NoteDesk } from './use-note-desk'

/** What people have drawn over the still picture, and the paper for whoever draws now. */
export function NoteMarks({ desk }: { desk: NoteDesk }) {
  const { seen, sketch, setSketch } = desk
  return (
    <div className="note-marks">
      <StillDrawings drawings={seen} />
      {sketch ? <SketchSurface sketch={sketch} onSketch={setSketch} /> : null}
    </div>
  )
}
