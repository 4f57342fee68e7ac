'use client'

import { LeafSection } from '@/components/figures/leaf'
import { download, fileStem } from '@/components/ui/download'
import { formatNumber } from '@/lib/units/format'
import type { Scene } from '@/scene/model/scene'
import { snapshot } from '@/scene/session/draft'
import { useBench } from '@/scene/session/react'
import { fetchFile } from './fetch-file'
import { TaskWords } from './task-words'
import { titledPicture } from './titled-picture'
import { useTask } from './use-task'

const pictureSize = { width: 2000, height: 1250 }

/** Model and picture of what the stage shows now. */
export function ModelSection() {
  const { session, clock } = useBench()
  const model = useTask()
  const picture = useTask()
  const now = () => snapshot(session, clock)
  const saveModel = (form: 'glb' | 'gltf') => {
    const scene = now()
    const name = `${fileStem(scene.train.title)}.${form}`
    return model.run('Building the model.', `The model is saved as ${name}.`, async (signal) =>
      download(name, await fetchFile('/api/v1/models', { scene, form }, signal)),
    )
  }
  const savePicture = () => {
    const scene = now()
    const name = `${fileStem(scene.train.title)}.png`
    return picture.run('Drawing the picture.', `The picture is saved as ${name}.`, async (signal) => {
      const drawn = await fetchFile('/api/v1/pictures', { scene, theme: themeNow(), ...pictureSize }, signal)
      download(name, await titledPicture(drawn, scene.train.title, conditionOf(scene)))
    })
  }
  return (
    <>
      <LeafSection title="Model" at="glTF 2.0, metres, y up">
        <p className="read">
          The parts as they stand at the angle shown now, named as in the drawing. What is hidden there is
          left out.
        </p>
        <div className="paper-actions">
          <button type="button" className="btn" disabled={model.busy} onClick={() => void saveModel('glb')}>
            Save the model (.glb)
          </button>
          <button type="button" className="btn" disabled={model.busy} onClick={() => void saveModel('gltf')}>
            Save the model (.gltf)
          </button>
          <TaskWords task={model} />
        </div>
      </LeafSection>
      <LeafSection title="Picture" at={`${pictureSize.width} × ${pictureSize.height} with a title strip`}>
        <p className="read">
          The engine in ink at the angle and view shown now, in the colours of this page. Force vectors and
          labels are not in it.
        </p>
        <div className="paper-actions">
          <button type="button" className="btn" disabled={picture.busy} onClick={() => void savePicture()}>
            Save the picture (PNG)
          </button>
          <TaskWords task={picture} />
        </div>
      </LeafSection>
    </>
  )
}

const conditionOf = ({ view }: Scene) =>
  `${formatNumber(view.angleDeg, { decimals: 1 })}°, ${formatNumber(view.speedRpm, { decimals: 0 })} rpm`

function themeNow(): 'light' | 'dark' {
  const set = document.documentElement.dataset.theme
  if (set === 'light' || set === 'dark') return set
  return window.matchMedia('(prefers-color-scheme: dark)').matches ? 'dark' : 'light'
}
