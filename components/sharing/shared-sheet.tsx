import { LiveScene } from '@/components/drawing/live-scene'
import { GuestSheet } from '@/components/shell/guest-sheet'
import { TitleActions, TitleBlock, TitleCell } from '@/components/shell/title-block'
import type { SharedScene } from '@/lib/contracts/share-links'
import type { TrainSummary } from '@/scene/model/summary'
import { CountOpening } from './count-opening'
import { PrintButton } from './print-button'

interface Props {
  shared: SharedScene
  /** Under which the link's own addresses stand. */
  base: string
  summary: TrainSummary
}

const day = new Intl.DateTimeFormat('en-GB', {
  day: 'numeric',
  month: 'long',
  year: 'numeric',
  timeZone: 'UTC',
})

/** What a share link opens: the drawing at the saved angle and view, its figures in words, and whose it is. */
export function SharedSheet({ shared, base, summary }: Props) {
  return (
    <GuestSheet brand={shared.workshop} className="share" words="No account needed">
      <CountOpening address={`${base}/openings`} />
      <section className="stage" aria-label="Drawing">
        <LiveScene
          scene={shared.document}
          poster={`${base}/poster.png`}
          label={shared.title}
          description={summary.sentence}
        />
      </section>
      <section className="walk" aria-label="Figures">
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
          Planning figures: rigid crank, steady speed. The maker’s data, the machine shop and a qualified
          person come first.
        </p>
      </section>
      <TitleBlock>
        <TitleCell k={`Shown by ${shared.workshop}`} span={6} first top>
          <h1 className="v title">{shared.title}</h1>
        </TitleCell>
        <TitleCell k="Version" span={3} first>
          <span className="v">
            {shared.version}, saved {day.format(new Date(shared.savedAt))}
          </span>
        </TitleCell>
        <TitleCell k="Open until" span={3}>
          <span className="v">{shared.endsAt ? day.format(new Date(shared.endsAt)) : 'it is withdrawn'}</span>
        </TitleCell>
        <TitleActions note="Opening this page is counted: how often and when last.">
          <PrintButton />
        </TitleActions>
      </TitleBlock>
    </GuestSheet>
  )
}
