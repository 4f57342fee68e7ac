import type { ReactNode } from 'react'
import { LiveScene } from '@/components/drawing/live-scene'
import type { SharedScene } from '@/lib/contracts/shared'
import type { TrainSummary } from '@/scene/model/summary'
import { ApprovalStamp } from './approval-stamp'
import { FigureTables } from './figure-tables'
import { KeptNotice } from './kept-notice'

interface Props {
  shared: SharedScene
  /** Address of the whole page. */
  page: string
  poster: string
  summary: TrainSummary
  after: ReactNode
}

/** A link's page inside another: the drawing, its figures below, and a way to the whole page. */
export const FramedSheet = ({ shared, page, poster, summary, after }: Props) => (
  <main className="framed">
    <header>
      <h1 className="v title">{shared.title}</h1>
      <span className="cap">
        {shared.workshop}, version {shared.version} of {shared.versions}
      </span>
      <a href={page} target="_blank" rel="noopener noreferrer">
        Open the whole page
      </a>
    </header>
    <section className="stage" aria-label="Drawing" data-part="drawing">
      <LiveScene
        scene={shared.document}
        poster={poster}
        label={shared.title}
        description={summary.sentence}
        after={after}
      />
    </section>
    <section className="walk" aria-label="Figures" data-part="figures">
      <ApprovalStamp approved={shared.approved} version={shared.version} />
      <FigureTables summary={summary} />
      <KeptNotice days={shared.openingsKeptDays} what="frame" />
    </section>
  </main>
)
