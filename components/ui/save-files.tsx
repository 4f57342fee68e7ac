'use client'

import { useContext, useRef, type RefObject } from 'react'
import { tableCsv } from '@/lib/tables/csv'
import { tableJson } from '@/lib/tables/json'
import type { Table } from '@/lib/tables/table'
import { download, fileStem } from './download'
import { pngOf, svgText } from './picture-file'
import { StampContext } from './stamp'

interface Props {
  table: Table
  /** Where the figures are drawn as well. */
  picture?: RefObject<SVGSVGElement | null>
}

/** Files of one chart or table. */
export function SaveFiles({ table, picture }: Props) {
  const stamp = useContext(StampContext)
  const box = useRef<HTMLDetailsElement>(null)
  const save = async (kind: string, content: () => Blob | Promise<Blob>) => {
    if (box.current) box.current.open = false
    download(`${fileStem(table.title)}.${kind}`, await content())
  }
  const svg = () => svgText(picture!.current!, { title: table.title, ...stamp() })
  const kinds: [string, () => Blob | Promise<Blob>][] = [
    ['csv', () => new Blob([tableCsv(table, stamp())], { type: 'text/csv' })],
    ['json', () => new Blob([tableJson(table, stamp())], { type: 'application/json' })],
  ]
  if (picture)
    kinds.unshift(
      ['svg', () => new Blob([svg()], { type: 'image/svg+xml' })],
      ['png', () => pngOf(picture.current!, svg())],
    )
  return (
    <details className="save-files" ref={box}>
      <summary aria-label={`Save ${table.title} as a file`}>Save as…</summary>
      <div className="save-kinds">
        {kinds.map(([kind, content]) => (
          <button key={kind} type="button" className="twin-button" onClick={() => save(kind, content)}>
            {kind.toUpperCase()}
          </button>
        ))}
      </div>
    </details>
  )
}
