'use client'

import { useId, useState, type DragEvent } from 'react'
import { DataTable } from '@/components/ui/data-table'
import { formatNumber } from '@/lib/units/format'
import { readCells } from '@/lib/tables/read-cells'
import type { CrankTrain } from '@/scene/model/crank-train'
import { readTraceFile, type ReadTrace } from '@/scene/model/trace-file'

/** A file that was chosen, and what came of it. */
export interface ChosenTrace {
  name: string
  read: ReadTrace
}

/** Larger files hold no more than the points that are taken anyway. */
const MOST_BYTES = 4_000_000

async function readFile(file: File, cycle: CrankTrain['cycle']): Promise<ChosenTrace> {
  if (file.size > MOST_BYTES)
    return {
      name: file.name,
      read: {
        ok: false,
        total: 1,
        faults: [
          {
            row: 0,
            code: 'file-too-large',
            message: `The file has ${formatNumber(file.size / 1e6, { decimals: 1 })} MB; a trace has ${MOST_BYTES / 1e6} MB at most.`,
            fix: 'Give one cycle, 20,000 points at most.',
          },
        ],
      },
    }
  const { rows, separator } = readCells(await file.text())
  return { name: file.name, read: readTraceFile(rows, separator !== ',', cycle) }
}

interface Props {
  cycle: CrankTrain['cycle']
  chosen: ChosenTrace | null
  onChosen(trace: ChosenTrace): void
}

/** Takes a measured trace by choosing or dropping a file; every row that cannot be taken stands in a table. */
export function TraceFile({ cycle, chosen, onChosen }: Props) {
  const id = useId()
  const [over, setOver] = useState(false)
  const take = async (file: File | undefined) => {
    if (file) onChosen(await readFile(file, cycle))
  }
  const drop = {
    onDragOver: (event: DragEvent) => {
      event.preventDefault()
      setOver(true)
    },
    onDragLeave: () => setOver(false),
    onDrop: (event: DragEvent) => {
      event.preventDefault()
      setOver(false)
      void take(event.dataTransfer.files[0])
    },
  }
  const half = cycle === 'four-stroke' ? 360 : 180
  return (
    <div className="gas-file">
      <div className={over ? 'gas-drop over' : 'gas-drop'} {...drop}>
        <label htmlFor={id}>Measured trace, a CSV file: choose it, or drop it here</label>
        <input
          id={id}
          type="file"
          accept=".csv,.txt,.tsv,text/csv"
          aria-describedby={`${id}-form`}
          onChange={(event) => {
            void take(event.target.files?.[0])
            event.target.value = ''
          }}
        />
        <p className="cap" id={`${id}-form`}>
          A header that names the units (angle in deg or rad; pressure in bar, kPa, MPa or psi, absolute or
          gauge), then one whole cycle: −{half} to {half} from firing top dead centre, or 0 to {2 * half} with
          the top dead centre of 0 in the header. At most 20,000 rows; commas, semicolons or tabs.
        </p>
      </div>
      {chosen && !chosen.read.ok ? <Faults name={chosen.name} {...chosen.read} /> : null}
    </div>
  )
}

function Faults({ name, faults, total }: { name: string } & Extract<ReadTrace, { ok: false }>) {
  const more = total - faults.length
  return (
    <div className="errnote" role="alert">
      <b>{name} was not taken.</b>{' '}
      {total === 1 ? 'One thing stands' : `${formatNumber(total, { decimals: 0 })} things stand`} in the way
      {more > 0 ? `; the first ${faults.length} are listed` : ''}. The engine keeps its gas.
      <DataTable
        bare
        table={{
          title: `What stands in the way in ${name}`,
          columns: [
            { name: 'Row', unit: '' },
            { name: 'What is wrong', unit: '' },
            { name: 'What would be right', unit: '' },
          ],
          rows: faults.map(({ row, message, fix }) => [
            row > 0 ? String(row) : 'file',
            message.replace(/^Row \d+: /, ''),
            fix,
          ]),
        }}
      />
    </div>
  )
}
