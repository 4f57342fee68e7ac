import type { readTrace as contract, TraceAnswer } from '@/lib/contracts/gas'
import type { BodyOf } from '@/lib/contracts/operation'
import { refused } from '@/lib/errors/problem'
import { readCells } from '@/lib/tables/read-cells'
import { readTraceFile } from '@/scene/model/trace-file'

/** A measured trace from its file, for anybody who asks; every row that cannot be taken is an issue of its own. */
export function readTrace({ cycle, csv }: BodyOf<typeof contract>): TraceAnswer {
  const { rows, separator } = readCells(csv)
  const trace = readTraceFile(rows, separator !== ',', cycle)
  if (trace.ok) {
    const { angleDeg, pressureBar, understood } = trace
    return { angleDeg, pressureBar, understood }
  }
  const more = trace.total - trace.faults.length
  throw refused([
    ...trace.faults.map(({ row, ...fault }) => ({ path: row > 0 ? `csv.row[${row}]` : 'csv', ...fault })),
    ...(more > 0
      ? [
          {
            path: 'csv',
            code: 'more-rows',
            message: `${more} more ${more === 1 ? 'row is' : 'rows are'} at fault.`,
            fix: 'Mend the rows that are listed and send the file again.',
          },
        ]
      : []),
  ])
}
