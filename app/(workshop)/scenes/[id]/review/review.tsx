'use client'

import { useMemo, useState } from 'react'
import { rowNumber } from '@/components/bench/row-number'
import { AngleRule } from '@/components/drawing/angle-rule'
import { PlayButtons } from '@/components/drawing/play-buttons'
import { useDrawing } from '@/components/drawing/use-drawing'
import { ExportNotes } from '@/components/notes/export-notes'
import { NoteFlags } from '@/components/notes/note-flags'
import { NoteList } from '@/components/notes/note-list'
import { TouchedNotes } from '@/components/notes/touched-notes'
import { useNoteDesk } from '@/components/notes/use-note-desk'
import { TitleActions, TitleBlock, TitleCell } from '@/components/shell/title-block'
import { Slips } from '@/components/ui/slips'
import { Changes } from '@/components/versions/changes'
import { useComparison } from '@/components/versions/use-comparison'
import { ReviewCells } from '@/components/verdicts/review-cells'
import { VerdictBar } from '@/components/verdicts/verdict-bar'
import { VersionStamp } from '@/components/verdicts/version-stamp'
import type { OpenedScene } from '@/lib/contracts/scenes'
import type { RendererKind, Stage } from '@/scene/stage/types'
import { ReviewStage } from './review-stage'

interface Props {
  opened: OpenedScene
  workshop: string
  person: { id: string; name: string }
  /** The note that the address opens. */
  note: number | null
}

/**
 * One version under review. The sections of the sheet's grid are made here; a feature fills each, fetches its own data
 * and takes `{ sceneId, version, may }`. What they share goes through here.
 */
export function Review({ opened, workshop, note }: Props) {
  const { scene, version, may } = opened
  const drawing = useDrawing(version.document)
  const { clock, model, train, still } = drawing
  const [stage, setStage] = useState<Stage | null>(null)
  const [changed, setChanged] = useState<readonly string[]>([])
  const comparison = useComparison(scene.id, version)
  const [exporting, setExporting] = useState(false)
  const [renderer, setRenderer] = useState<RendererKind | null>(null)
  const { id: sceneId, workshopId, headVersion } = scene
  const desk = useNoteDesk({
    ...{ sceneId, workshopId, headVersion, may, drawing, stage },
    ...{ version: version.number, first: note },
  })
  const lit = useMemo(() => [...desk.lit, ...changed], [desk.lit, changed])
  return (
    <Slips>
      <section className="notes" aria-label="What changed">
        <Changes
          comparison={comparison}
          system={drawing.shown.system}
          onPart={setChanged}
          touched={<TouchedNotes desk={desk} />}
          numberOf={(change) => rowNumber(change, version.document)}
        />
      </section>
      <ReviewStage
        drawing={drawing}
        version={version.number}
        lit={lit}
        comparison={comparison}
        desk={desk}
        stamp={<VersionStamp sceneId={sceneId} version={version.number} />}
        onStage={setStage}
        onRenderer={setRenderer}
      />
      <section className="thread" aria-label="Notes">
        <NoteList desk={desk} />
      </section>
      <section className="timeline" aria-label="Crank angle">
        <PlayButtons clock={clock} still={still} />
        <div className="note-rule">
          <AngleRule clock={clock} events={model.events} names={train.cylinders.map(({ id }) => id)} />
          <NoteFlags desk={desk} />
        </div>
      </section>
      <section className="verdict" aria-label="Your verdict">
        <VerdictBar sceneId={scene.id} version={version.number} may={may} />
      </section>
      <TitleBlock>
        <TitleCell k="Title" span={6} first top>
          <h1 className="v title">{scene.title}</h1>
        </TitleCell>
        <ReviewCells sceneId={scene.id} version={version.number} may={may} />
        <TitleCell k="Workshop" span={3} first>
          <span className="v">{workshop}</span>
        </TitleCell>
        <TitleCell k="Drawn" span={3}>
          <span className="v">
            {renderer === null ? 'Setting out' : renderer === 'canvas' ? 'Without 3D' : 'In 3D'}
          </span>
        </TitleCell>
        <TitleActions>
          <a className="btn" href={`/bench?scene=${scene.id}`}>
            To the bench
          </a>
          <button type="button" className="btn" onClick={() => setExporting(true)}>
            Export notes…
          </button>
          {may.includes('note.write') ? (
            <button
              type="button"
              className="btn"
              aria-pressed={desk.mode.at === 'placing'}
              onClick={() => desk.setMode({ at: 'placing', move: null })}
            >
              Pin a note
            </button>
          ) : null}
        </TitleActions>
      </TitleBlock>
      {exporting ? (
        <ExportNotes sceneId={sceneId} version={version.number} onClose={() => setExporting(false)} />
      ) : null}
    </Slips>
  )
}
