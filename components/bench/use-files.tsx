'use client'

import { useState, type ReactNode } from 'react'
import { download, fileStem } from '@/components/ui/download'
import { useSlip } from '@/components/ui/slips'
import { snapshot } from '@/scene/session/draft'
import { readFile } from '@/scene/session/file'
import type { Issue } from '@/scene/session/judge'
import { useBench } from '@/scene/session/react'
import { FileDialog } from './file-dialog'

interface Files {
  download(): void
  bringIn(file: File): Promise<void>
  /** What is wrong with the last file, while that is being read. */
  dialog: ReactNode
}

/** The scene as a file, out and in. */
export function useFiles(): Files {
  const { session, clock } = useBench()
  const slip = useSlip()
  const [wrong, setWrong] = useState<{ name: string; issues: Issue[] } | null>(null)
  return {
    download() {
      const scene = snapshot(session, clock)
      const content = new Blob([JSON.stringify(scene, null, 2)], { type: 'application/json' })
      download(`${fileStem(scene.train.title)}.json`, content)
    },
    async bringIn(file) {
      const answer = readFile(await file.text())
      if (!answer.ok) {
        setWrong({ name: file.name, issues: answer.issues })
        return
      }
      session.open(answer.scene, 'file')
      slip({ text: `${file.name} is on the bench.`, action: { label: 'Undo', run: session.undo } })
    },
    dialog: wrong ? (
      <FileDialog name={wrong.name} issues={wrong.issues} onClose={() => setWrong(null)} />
    ) : null,
  }
}
