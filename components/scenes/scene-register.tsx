'use client'

import { useDeferredValue, useState } from 'react'
import { useRouter } from 'next/navigation'
import { Segmented } from '@/components/ui/segmented'
import { Slips, useSlip } from '@/components/ui/slips'
import { Tabs } from '@/components/ui/tabs'
import { call, Refusal } from '@/lib/contracts/call'
import type * as contracts from '@/lib/contracts/scenes'
import type { Operation } from '@/lib/auth/access'
import { RenameDialog } from './rename-dialog'
import { SceneRow, type SceneAct } from './scene-row'
import { useScenes, type SceneLayout, type SceneState } from './use-scenes'

interface Props {
  workshop: string
  may: Operation[]
}

type Summary = contracts.SceneSummary

const states: { value: SceneState; label: string }[] = [
  { value: 'current', label: 'Current' },
  { value: 'archived', label: 'Archived' },
]

const layouts: { value: SceneLayout; label: string }[] = [
  { value: 'all', label: 'All' },
  { value: 'single', label: 'Single' },
  { value: 'in-line', label: 'In line' },
  { value: 'two-banks', label: 'Two banks' },
  { value: 'more-banks', label: 'More banks' },
]

export const SceneRegister = (props: Props) => (
  <Slips>
    <Register {...props} />
  </Slips>
)

function Register({ workshop, may }: Props) {
  const [state, setState] = useState<SceneState>('current')
  const [search, setSearch] = useState('')
  const [layout, setLayout] = useState<SceneLayout>('all')
  const [renaming, setRenaming] = useState<Summary | null>(null)
  const { scenes, loading, error, more, refresh } = useScenes(
    workshop,
    state,
    layout,
    useDeferredValue(search.trim()),
  )
  const slip = useSlip()
  const router = useRouter()

  const put = (verb: 'archive' | 'restore', scene: Summary) =>
    call<typeof contracts.archiveScene | typeof contracts.restoreScene>({
      method: 'POST',
      path: `/api/v1/scenes/{id}/${verb}`,
      params: { id: scene.id },
    })

  const acts: Record<SceneAct, (scene: Summary) => Promise<void> | void> = {
    rename: setRenaming,
    async duplicate(scene) {
      const copy = await call<typeof contracts.duplicateScene>({
        method: 'POST',
        path: '/api/v1/scenes/{id}/duplicate',
        params: { id: scene.id },
        body: {},
        key: crypto.randomUUID(),
      })
      await refresh()
      const { id, title } = copy.scene
      slip({
        text: `“${title}” is in the register.`,
        action: { label: 'Open', run: () => router.push(`/bench?scene=${id}`) },
      })
    },
    async archive(scene) {
      await put('archive', scene)
      await refresh()
      slip({
        text: `“${scene.title}” is archived.`,
        action: { label: 'Restore', run: () => void act('restore', scene) },
      })
    },
    async restore(scene) {
      await put('restore', scene)
      await refresh()
      slip({ text: `“${scene.title}” is back.` })
    },
  }
  const act = async (name: SceneAct, scene: Summary) => {
    try {
      await acts[name](scene)
    } catch (problem) {
      if (!(problem instanceof Refusal)) throw problem
      slip({ text: `${problem.problem.detail} ${problem.problem.cure}`, mark: 'less' })
    }
  }
  const offered = (['rename', 'duplicate', state === 'archived' ? 'restore' : 'archive'] as const).filter(
    (name) => may.includes(`scene.${name}`),
  )

  return (
    <section className="reg" aria-label="Scenes">
      <div className="regtop">
        <h1>Scenes</h1>
        <div className="box find">
          <input
            type="search"
            aria-label="Find a scene"
            placeholder="Find by title"
            value={search}
            onChange={(event) => setSearch(event.target.value)}
          />
        </div>
        <Segmented label="Layout" value={layout} options={layouts} onChange={setLayout} />
      </div>
      <Tabs<SceneState> label="State" value={state} tabs={states} onChange={setState}>
        {error ? (
          <div className="state" role="alert">
            <p>
              <b>The register is out of reach.</b>
              <br />
              <button type="button" className="btn txt" onClick={() => void refresh()}>
                Try now
              </button>
            </p>
          </div>
        ) : scenes.length > 0 ? (
          <table className="regt">
            <thead>
              <tr>
                <th>No.</th>
                <th>Drawing</th>
                <th>Title</th>
                <th className="fire2">Firing</th>
                <th className="r">Displacement</th>
                <th className="r">Version</th>
                <th>Last change</th>
                <th>
                  <span className="vh">Actions</span>
                </th>
              </tr>
            </thead>
            <tbody>
              {scenes.map((scene, index) => (
                <SceneRow key={scene.id} scene={scene} number={index + 1} acts={offered} onAct={act} />
              ))}
            </tbody>
          </table>
        ) : (
          <div className="state">
            <Nothing loading={loading} search={search} layout={layout} state={state} />
          </div>
        )}
        {more ? (
          <p className="reg-more">
            <button type="button" className="btn" onClick={more}>
              Show more scenes
            </button>
          </p>
        ) : null}
      </Tabs>
      {renaming ? (
        <RenameDialog
          scene={renaming}
          onClose={() => setRenaming(null)}
          onRenamed={(title) => {
            setRenaming(null)
            slip({ text: `Renamed to “${title}”.` })
            void refresh()
          }}
        />
      ) : null}
    </section>
  )
}

interface NothingProps {
  loading: boolean
  search: string
  layout: SceneLayout
  state: SceneState
}

function Nothing({ loading, search, layout, state }: NothingProps) {
  if (loading) return <p>Setting out the register</p>
  if (search)
    return (
      <p>
        <b>Nothing by that title.</b>
        <br />
        Try fewer letters, or look among the {state === 'current' ? 'archived' : 'current'} scenes.
      </p>
    )
  if (layout !== 'all')
    return (
      <p>
        <b>No scene of this layout.</b>
        <br />
        Choose another, or all of them.
      </p>
    )
  if (state === 'archived') return <p>Nothing is archived.</p>
  return (
    <p>
      <b>Nothing drawn yet.</b>
      <br />
      Start from a layout below, or bring in a file on the bench.
    </p>
  )
}
