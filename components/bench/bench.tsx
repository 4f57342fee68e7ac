'use client'

import { useEffect, useEffectEvent, useMemo, useState, type ComponentType, type ReactNode } from 'react'
import { useStore } from 'zustand'
import { LeafContext } from '@/components/figures/leaf'
import { Slips, useSlip } from '@/components/ui/slips'
import { StampContext } from '@/components/ui/stamp'
import { panelId, TabList } from '@/components/ui/tabs'
import type { Operation } from '@/lib/auth/access'
import { call } from '@/lib/contracts/call'
import type { keepDraft as keepDraftOperation, keepSceneDraft } from '@/lib/contracts/drafts'
import { newScene } from '@/scene/model/default-scene'
import type { Scene } from '@/scene/model/scene'
import { keepDraft } from '@/scene/session/draft'
import { BenchContext, ResultsContext, useBench, useSessionState } from '@/scene/session/react'
import { createResults } from '@/scene/session/results'
import { sameTrain } from '@/scene/session/same-train'
import type { Saved } from '@/scene/session/session'
import { stampOf } from '@/scene/session/stamp'
import { begin, setClock, type BenchStart } from './begin'
import { Drive } from './drive'
import { FiringStrip } from './firing-strip'
import { MergeDialog } from './merge-dialog'
import { PartsList } from './parts-list'
import type { BenchPerson } from './person'
import { PresetsDialog } from './presets-dialog'
import { SaveDialog, SignInDialog } from './save-dialog'
import { SetOutDialog } from './set-out-dialog'
import { StagePanel } from './stage-panel'
import { BenchTitle } from './title'
import { useTicking } from './use-clock'
import { useFiles } from './use-files'
import { useSaving, type Instead } from './use-saving'

interface ShareProps {
  sceneId: string
  version: number
  title: string
  changed: boolean
  may: readonly Operation[]
  onClose(): void
}

interface StandingProps {
  sceneId: string
  version: number
  changed: boolean
  may: readonly Operation[]
}

export interface BenchProps extends BenchStart {
  person: BenchPerson | null
  /** The margin notes, a feature of their own. */
  notes: ReactNode
  /** Links to the saved scene, a feature too. */
  Share: ComponentType<ShareProps>
  /** How the saved version stands with those who judge it. */
  Standing: ComponentType<StandingProps>
  /** The pages beside the drawing, features too. */
  leaves: Record<string, { title: string; Content: ComponentType }>
}

/** The page where a crank train is described and run. */
export function Bench({ person, notes, leaves, Share, Standing, ...start }: BenchProps) {
  const [tools] = useState(() => begin(start))
  const [compute] = useState(createResults)
  const [stamp] = useState(() => () => stampOf(tools.session.getState(), new Date()))
  const scene = useStore(tools.session, (state) => state.scene)
  const base = useStore(tools.session, (state) => state.base)
  const results = useMemo(() => compute(scene), [compute, scene])

  useTicking(tools.clock)
  useEffect(() => setClock(tools), [tools, base])
  useEffect(() => tools.clock.setCycle(results.train.cycle), [tools, results.train.cycle])
  return (
    <BenchContext value={tools}>
      <ResultsContext value={results}>
        <Slips>
          <StampContext value={stamp}>
            <Sections {...{ person, notes, leaves, Share, Standing }} latest={start.opened} />
          </StampContext>
        </Slips>
      </ResultsContext>
    </BenchContext>
  )
}

type Open = 'presets' | 'set-out' | 'save' | 'share' | 'sign-in-save' | 'sign-in-share' | null

function Sections({
  person,
  notes,
  leaves,
  Share,
  Standing,
  latest,
}: Pick<BenchProps, 'person' | 'notes' | 'leaves' | 'Share' | 'Standing'> & {
  /** The latest version of the scene that was opened, as it was then. */
  latest: { sceneId: string; head: number } | null
}) {
  const { session } = useBench()
  const slip = useSlip()
  const [open, setOpen] = useState<Open>(null)
  const [drawn, setDrawn] = useState({ words: 'setting out', reason: '' })
  const saved = useSessionState((state) => state.saved)
  const title = useSessionState((state) => state.scene.train.title)
  const changed = useSessionState(
    ({ saved: of, scene }) => of !== null && !sameTrain(of.scene.train, scene.train),
  )
  const saving = useSaving(person)
  const files = useFiles()
  const keptAt = useDraft(person)
  const close = () => setOpen(null)
  const head = saved ? Math.max(saved.version, latest?.sceneId === saved.sceneId ? latest.head : 0) : 0
  useUndoKeys()
  const sceneId = saved?.sceneId
  const [leaf, setLeaf] = useLeaf(leaves)
  // The address says which scene and leaf this is, so that a reload and a bookmark find it again.
  useEffect(() => {
    const asked = new URLSearchParams({
      ...(sceneId && { scene: sceneId }),
      ...(leaf !== DRAWING && { leaf }),
    })
    window.history.replaceState(null, '', asked.size > 0 ? `/bench?${asked}` : '/bench')
  }, [sceneId, leaf])

  const onSave = () => setOpen(person ? 'save' : 'sign-in-save')
  const onShare = () => {
    if (!person) setOpen('sign-in-share')
    else if (saved) setOpen('share')
    else {
      slip({ text: 'A link opens a saved version: save this one first.', mark: 'less' })
      setOpen('save')
    }
  }
  const save = async (message: string, instead?: Instead) => {
    if (!(await saving.save(message, instead))) return
    close()
    slip({ text: `Version ${session.getState().saved!.version} saved.` })
  }
  const { Content } = leaves[leaf] ?? {}
  return (
    <LeafContext value={setLeaf}>
      <div className="leaf-tabs">
        <TabList
          id={LEAVES}
          label="Leaves"
          value={leaf}
          tabs={[
            { value: DRAWING, label: 'Drawing' },
            ...Object.entries(leaves).map(([value, { title: label }]) => ({ value, label })),
          ]}
          onChange={setLeaf}
        />
      </div>
      {Content ? (
        <div className="leaf-area" role="tabpanel" id={panelId(LEAVES)} aria-labelledby={`${LEAVES}-${leaf}`}>
          <Content />
        </div>
      ) : (
        <>
          {notes}
          <StagePanel
            id={panelId(LEAVES)}
            onRenderer={(kind, reason) =>
              setDrawn({ words: kind === 'webgl' ? 'with 3D' : 'without 3D', reason })
            }
          />
        </>
      )}
      <PartsList
        onPresets={() => setOpen('presets')}
        onSetOut={() => setOpen('set-out')}
        onDownload={files.download}
        onFile={files.bringIn}
      />
      <section className="fstrip" aria-label="Firing strip">
        <Drive />
        <FiringStrip />
      </section>
      <BenchTitle
        person={person}
        drawn={drawn}
        keptAt={keptAt}
        head={head}
        busy={saving.busy}
        standing={
          saved && person ? (
            <Standing sceneId={saved.sceneId} version={saved.version} changed={changed} may={person.may} />
          ) : null
        }
        onSave={onSave}
        onShare={onShare}
      />
      {open === 'presets' ? (
        <PresetsDialog
          onClose={close}
          onChoose={(preset) => {
            session.open(newScene(preset.train), 'preset')
            close()
          }}
        />
      ) : null}
      {open === 'set-out' ? (
        <SetOutDialog
          onClose={close}
          onDone={(document) => {
            session.open(newScene(document), 'set out')
            close()
          }}
        />
      ) : null}
      {open === 'sign-in-save' ? <SignInDialog to="save" onClose={close} /> : null}
      {open === 'sign-in-share' ? <SignInDialog to="share" onClose={close} /> : null}
      {open === 'save' && !saving.conflict ? (
        <SaveDialog
          version={head + 1}
          title={title}
          busy={saving.busy}
          problem={saving.problem}
          onClose={() => {
            saving.forget()
            close()
          }}
          onSave={save}
        />
      ) : null}
      {saving.conflict ? (
        <MergeDialog
          // another save in between is another choice
          key={saving.conflict.head.number}
          conflict={saving.conflict}
          busy={saving.busy}
          problem={saving.problem}
          onSave={save}
          onTheirs={() => {
            saving.takeTheirs()
            close()
          }}
          onClose={() => {
            saving.forget()
            close()
          }}
        />
      ) : null}
      {open === 'share' && saved ? (
        <Share
          {...{ title, changed }}
          sceneId={saved.sceneId}
          version={saved.version}
          may={person?.may ?? []}
          onClose={close}
        />
      ) : null}
      {files.dialog}
    </LeafContext>
  )
}

const LEAVES = 'leaves'
const DRAWING = 'drawing'

/** Which leaf is open; the address may ask for one. */
function useLeaf(leaves: BenchProps['leaves']) {
  return useState(() => {
    const asked = new URLSearchParams(window.location.search).get('leaf')
    return asked !== null && asked in leaves ? asked : DRAWING
  })
}

const clockTime = (at: number) =>
  new Date(at).toLocaleTimeString('en-GB', { hour: '2-digit', minute: '2-digit' })

/** Keeps the draft here, and on the server for whoever is signed in. Answers when it was last kept. */
function useDraft(person: BenchPerson | null): string | null {
  const { session, clock } = useBench()
  const [keptAt, setKeptAt] = useState<string | null>(null)
  const signedIn = person !== null
  useEffect(
    () =>
      keepDraft({
        store: localStorage,
        session,
        clock,
        onKept: (at) => setKeptAt(clockTime(at)),
        remote: signedIn ? keepOnServer : undefined,
      }),
    [session, clock, signedIn],
  )
  return keptAt
}

async function keepOnServer(document: Scene, saved: Saved | null): Promise<void> {
  if (saved)
    await call<typeof keepSceneDraft>({
      method: 'PUT',
      path: '/api/v1/scenes/{id}/draft',
      params: { id: saved.sceneId },
      body: { base: saved.version, document },
    })
  else
    await call<typeof keepDraftOperation>({
      method: 'PUT',
      path: '/api/v1/draft',
      body: { base: null, document },
    })
}

/** Undo and redo by keys, where no field is being typed in. */
function useUndoKeys(): void {
  const { session } = useBench()
  const onKey = useEffectEvent((event: KeyboardEvent) => {
    const typing = event.target instanceof HTMLElement && event.target.matches('input, textarea, select')
    if (typing || !(event.ctrlKey || event.metaKey) || event.altKey) return
    const letter = event.key.toLowerCase()
    if (letter === 'z' && !event.shiftKey) session.undo()
    else if (letter === 'y' || (letter === 'z' && event.shiftKey)) session.redo()
    else return
    event.preventDefault()
  })
  useEffect(() => {
    window.addEventListener('keydown', onKey)
    return () => window.removeEventListener('keydown', onKey)
  }, [])
}
