'use client'

import { lazy, Suspense, useEffect, useId, useRef, useState, type ReactNode } from 'react'
import type { Train } from '@/lib/mechanics/train'
import type { Scene } from '@/scene/model/scene'
import { MovingContext } from './moving-context'
import type { MovingScene } from './start-scene'

// Two steps: first what moves, and once it is seen to move everything else. The poster is there before any script.
const SceneDrive = lazy(() => import('./scene-drive'))

export interface RunningSceneProps {
  scene: Scene
  train: Train
  /** Address of the same picture, drawn by the server at the saved angle and view. */
  poster: string
  label: string
  /** Words for those who see no picture. */
  description: string
  /** What the page has besides, shown once the engine is seen; it may ask for the scene by `useMovingScene`. */
  after?: ReactNode
}

export function RunningScene({ scene, train, poster, label, description, after }: RunningSceneProps) {
  const host = useRef<HTMLDivElement>(null)
  const words = useId()
  const [seen, setSeen] = useState<MovingScene | null>(null)
  useEffect(() => {
    let gone = false
    let moving: MovingScene | null = null
    void import('./start-scene').then(async ({ startScene }) => {
      if (gone || !host.current) return
      moving = await startScene(host.current, scene, train, () => setSeen(moving))
      if (gone) moving.stage.dispose()
    })
    return () => {
      gone = true
      setSeen(null)
      moving?.stage.dispose()
    }
  }, [scene, train])
  const dark = `${poster}${poster.includes('?') ? '&' : '?'}theme=dark`
  const alt = seen ? '' : description
  return (
    <div className="live-scene" data-running={seen ? true : undefined}>
      <div className="poster" aria-hidden={seen ? true : undefined}>
        <img className="only-light" src={poster} alt={alt} loading="lazy" />
        <img className="only-dark" src={dark} alt={alt} loading="lazy" />
      </div>
      <div
        ref={host}
        className="stage-host"
        style={{ position: 'relative', width: '100%', height: '100%' }}
        role="application"
        aria-roledescription="moving drawing"
        aria-label={label}
        aria-describedby={words}
        tabIndex={0}
      />
      <p className="vh" id={words}>
        {description}
      </p>
      {seen ? (
        <MovingContext value={seen}>
          <Suspense>
            <SceneDrive scene={scene} train={train} moving={seen} />
          </Suspense>
          {after}
        </MovingContext>
      ) : null}
    </div>
  )
}
