'use client'

import { useMemo, useState } from 'react'
import { LeafSection } from '@/components/figures/leaf'
import { download, fileStem } from '@/components/ui/download'
import { Segmented } from '@/components/ui/segmented'
import { Switch } from '@/components/ui/switch'
import { sheetContent } from '@/lib/sheet/sheet-content'
import { sheetParts, type Paper, type SheetPart, type SheetUnits } from '@/lib/sheet/sheet-parts'
import type { Scene } from '@/scene/model/scene'
import { useSessionState } from '@/scene/session/react'
import { sameTrain } from '@/scene/session/same-train'
import { fetchFile } from './fetch-file'
import { SheetPreview } from './sheet-preview'
import { TaskWords } from './task-words'
import { useTask } from './use-task'

const partWords: Record<SheetPart, string> = {
  drawing: 'Drawing of the engine',
  data: 'Main data and masses',
  balance: 'Orders',
  counterweights: 'Counterweights and bob-weights',
  loads: 'Loads',
  completeness: 'What a class society asks for',
}

interface Props {
  /** As it stood when the leaf was opened or the angle was last taken. */
  scene: Scene
  onTakeAngle(): void
}

/** The design sheet: what goes on it, how it will look, and the file. */
export function DesignSheetSection({ scene, onTakeAngle }: Props) {
  const saved = useSessionState((state) => state.saved)
  const [paper, setPaper] = useState<Paper>('A4')
  const [units, setUnits] = useState<SheetUnits>('both')
  const [parts, setParts] = useState<readonly SheetPart[]>(sheetParts)
  const task = useTask()
  const content = useMemo(
    () =>
      sheetContent({
        scene,
        units,
        parts,
        stamp: {
          title: scene.train.title,
          date: '',
          ...(saved && {
            sceneId: saved.sceneId,
            version: saved.version,
            changed: !sameTrain(saved.scene.train, scene.train),
          }),
        },
      }),
    [scene, units, parts, saved],
  )
  const toggle = (part: SheetPart, on: boolean) =>
    setParts(sheetParts.filter((each) => (each === part ? on : parts.includes(each))))
  const print = () =>
    task.run(
      'Setting out the design sheet.',
      `The design sheet is saved as ${fileStem(scene.train.title)}.pdf.`,
      async (signal) => {
        const of = saved && { sceneId: saved.sceneId, version: saved.version }
        const body = { scene, paper, units, parts, ...(of && { of }) }
        download(`${fileStem(scene.train.title)}.pdf`, await fetchFile('/api/v1/design-sheets', body, signal))
      },
    )
  return (
    <LeafSection title="Design sheet" at={content.condition} wide>
      <div className="paper-choices">
        <span className="paper-choice">
          <span className="cap">Paper</span>
          <Segmented
            label="Paper"
            value={paper}
            options={[
              { value: 'A4', label: 'A4' },
              { value: 'Letter', label: 'Letter' },
            ]}
            onChange={setPaper}
          />
        </span>
        <span className="paper-choice">
          <span className="cap">Units</span>
          <Segmented
            label="Units on the sheet"
            value={units}
            options={[
              { value: 'both', label: 'SI and US' },
              { value: 'si', label: 'SI' },
              { value: 'us', label: 'US' },
            ]}
            onChange={setUnits}
          />
        </span>
        <span className="paper-parts" role="group" aria-label="What is on the sheet">
          {sheetParts.map((part) => (
            <Switch
              key={part}
              label={partWords[part]}
              on={parts.includes(part)}
              onChange={(on) => toggle(part, on)}
            />
          ))}
        </span>
      </div>
      <SheetPreview content={content} scene={scene} paper={paper} />
      <div className="paper-actions">
        <button type="button" className="btn" onClick={onTakeAngle}>
          Take the angle shown now
        </button>
        <button type="button" className="btn pri" disabled={task.busy} onClick={() => void print()}>
          Save the design sheet (PDF)
        </button>
        <TaskWords task={task} />
      </div>
    </LeafSection>
  )
}
