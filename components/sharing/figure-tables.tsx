import type { TrainSummary } from '@/scene/model/summary'

/** The figures of a train in words and both sets of units, as the server writes them. */
export const FigureTables = ({ summary }: { summary: TrainSummary }) => (
  <>
    <h2>{summary.layout}</h2>
    <p className="read">{summary.sentence}</p>
    {summary.tables.map((table) => (
      <table className="tab figs" key={table.title}>
        <thead>
          <tr>
            <th>{table.title}</th>
            <th className="r" colSpan={2}>
              mm, g
            </th>
            <th className="r" colSpan={2}>
              in, oz
            </th>
          </tr>
        </thead>
        <tbody>
          {table.rows.map((row) => (
            <tr key={row.name}>
              <th scope="row">{row.name}</th>
              <td className="n">{row.si.text}</td>
              <td className="u">{row.si.unit}</td>
              <td className="n">{row.us.text}</td>
              <td className="u">{row.us.unit}</td>
            </tr>
          ))}
        </tbody>
      </table>
    ))}
    <p className="caution">
      Planning figures: rigid crank, steady speed. The maker’s data, the machine shop and a qualified person
      come first.
    </p>
  </>
)
