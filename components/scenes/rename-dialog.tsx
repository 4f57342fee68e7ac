'use client'

import { useId, useState, type FormEvent } from 'react'
import { Dialog } from '@/components/ui/dialog'
import { call, Refusal } from '@/lib/contracts/call'
import type { renameScene, SceneSummary } from '@/lib/contracts/scenes'

interface Props {
  scene: SceneSummary
  onClose(): void
  onRenamed(title: string): void
}

export function RenameDialog({ scene, onClose, onRenamed }: Props) {
  const id = useId()
  const [title, setTitle] = useState(scene.title)
  const [refusal, setRefusal] = useState<Refusal | null>(null)
  async function submit(event: FormEvent) {
    event.preventDefault()
    try {
      await call<typeof renameScene>({
        method: 'PATCH',
        path: '/api/v1/scenes/{id}',
        params: { id: scene.id },
        body: { title },
      })
      onRenamed(title.trim())
    } catch (error) {
      if (!(error instanceof Refusal)) throw error
      setRefusal(error)
    }
  }
  return (
    <Dialog
      title="Rename scene"
      onClose={onClose}
      about={{ k: 'Scene', v: scene.title }}
      actions={
        <>
          <button type="button" className="btn" onClick={onClose}>
            Keep as it is
          </button>
          <button type="submit" form={`${id}-form`} className="btn pri">
            Rename
          </button>
        </>
      }
    >
      <form id={`${id}-form`} className="lf" onSubmit={submit}>
        <label htmlFor={id}>Title</label>
        <div className={refusal ? 'box bad' : 'box'}>
          <input
            id={id}
            value={title}
            required
            maxLength={200}
            onChange={(event) => setTitle(event.target.value)}
          />
        </div>
        <p className="msg refused" role="alert">
          {refusal ? `${refusal.problem.detail} ${refusal.problem.cure}` : ''}
        </p>
      </form>
    </Dialog>
  )
}
