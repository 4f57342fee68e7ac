'use client'

import { useState } from 'react'
import { TitleActions, TitleBlock, TitleCell } from '@/components/shell/title-block'
import { Slips } from '@/components/ui/slips'
import type { Operation } from '@/lib/auth/access'
import { LinkDetail } from './link-detail'
import { LinkTable } from './link-table'
import { ShareDialog } from './share-dialog'
import { useLinks } from './use-links'

interface Props {
  sceneId: string
  title: string
  headVersion: number
  workshop: string
  may: readonly Operation[]
  /** The link that a mail led to. */
  first: string | null
}

/** All links of a scene, and what became of each. */
export function LinkRegister({ sceneId, title, headVersion, workshop, may, first }: Props) {
  const links = useLinks(sceneId)
  const [chosen, setChosen] = useState(first)
  const [making, setMaking] = useState(false)
  const link = links.links?.find(({ id }) => id === chosen) ?? links.links?.[0]
  return (
    <Slips>
      <section className="link-list" aria-label="Links">
        <h2 className="vh">Links</h2>
        {links.error ? <p className="msg">{links.error.message}</p> : null}
        {links.links === undefined && !links.error ? <p className="setting-out">Setting out</p> : null}
        {links.links?.length === 0 ? (
          <div className="state">
            <p>
              <b>No link leads here yet.</b>
              <br />
              Make one, and whoever has it sees the engine run without an account.
            </p>
          </div>
        ) : null}
        {links.links && links.links.length > 0 ? (
          <LinkTable links={links.links} chosen={link?.id} onChoose={setChosen} />
        ) : null}
      </section>
      {link ? (
        <LinkDetail key={link.id} {...{ link, headVersion, may, links }} />
      ) : (
        <div className="link-detail" />
      )}
      <TitleBlock>
        <TitleCell k="Share links of" span={6} first top>
          <h1 className="v title">{title}</h1>
        </TitleCell>
        <TitleCell k="Workshop" span={3} first>
          <span className="v">{workshop}</span>
        </TitleCell>
        <TitleCell k="Latest version" span={3}>
          <span className="v">{headVersion}</span>
        </TitleCell>
        <TitleActions>
          <a className="btn" href={`/bench?scene=${sceneId}`}>
            To the bench
          </a>
          {may.includes('link.create') ? (
            <button type="button" className="btn pri" onClick={() => setMaking(true)}>
              Make a link…
            </button>
          ) : null}
        </TitleActions>
      </TitleBlock>
      {making ? (
        <ShareDialog
          {...{ sceneId, title, may }}
          version={headVersion}
          changed={false}
          onClose={() => setMaking(false)}
        />
      ) : null}
    </Slips>
  )
}
