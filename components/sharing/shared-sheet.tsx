import type { ReactNode } from 'react'
import { LiveScene } from '@/components/drawing/live-scene'
import { GuestSheet } from '@/components/shell/guest-sheet'
import { TitleActions, TitleBlock, TitleCell } from '@/components/shell/title-block'
import type { SharedScene } from '@/lib/contracts/shared'
import type { TrainSummary } from '@/scene/model/summary'
import { ApprovalStamp } from './approval-stamp'
import { dayInWords, timeInWords } from './days'
import { deskPlaces } from './desk-places'
import { FigureTables } from './figure-tables'
import { KeptNotice } from './kept-notice'

interface Props {
  shared: SharedScene
  /** Address of the picture that stands until the drawing moves. */
  poster: string
  summary: TrainSummary
  /** What the page has besides, once the engine is seen. */
  after: ReactNode
}

/** What a share link opens: the drawing at the saved angle and view, its figures in words, and whose it is. */
export function SharedSheet({ shared, poster, summary, after }: Props) {
  const { version, versions, approved } = shared
  return (
    <GuestSheet brand={shared.workshop} className="share" words="No account needed">
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
        <FigureTables summary={summary} />
        <KeptNotice days={shared.openingsKeptDays} what="page" />
      </section>
      <TitleBlock>
        <TitleCell k={`Shown by ${shared.workshop}`} span={6} first top>
          <h1 className="v title">{shared.title}</h1>
        </TitleCell>
        <TitleCell k="Version" span={3} first>
          <span className="v">
            {version} of {versions}, saved {dayInWords(shared.savedAt)}
          </span>
        </TitleCell>
        <TitleCell k="Open until" span={3}>
          <span className="v">{shared.endsAt ? timeInWords(shared.endsAt) : 'it is withdrawn'}</span>
          <span className="cap" id={deskPlaces.ends} />
        </TitleCell>
        {approved ? (
          <TitleCell k="Status" span={6} first>
            <ApprovalStamp approved={approved} version={version} />
          </TitleCell>
        ) : null}
        <TitleActions>
          <span className="guest-actions" id={deskPlaces.actions} />
        </TitleActions>
      </TitleBlock>
    </GuestSheet>
  )
}
