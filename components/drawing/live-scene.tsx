'use client'

import dynamic from 'next/dynamic'
import { useState } from 'react'
import type { Scene } from '@/scene/model/scene'

// fetched after the page stands: the poster is there before any script
const RunningScene = dynamic(() => import('./running-scene').then((module) => module.RunningScene), {
  ssr: false,
})

interface Props {
  scene: Scene
  /** Address of the same picture, drawn by the server at the saved angle and view. */
  poster: string
  label: string
  /** Words for those who see no picture. */
  description: string
}

/** A scene that runs by itself, for pages that only show: first its poster, then the moving drawing. */
export function LiveScene({ scene, poster, label, description }: Props) {
  const [running, setRunning] = useState(false)
  const dark = `${poster}${poster.includes('?') ? '&' : '?'}theme=dark`
  return (
    <div className="live-scene" data-running={running || undefined}>
      <div className="poster" aria-hidden={running || undefined}>
        <img className="only-light" src={poster} alt={running ? '' : description} loading="lazy" />
        <img className="only-dark" src={dark} alt={running ? '' : description} loading="lazy" />
      </div>
      <RunningScene
        scene={scene}
        label={label}
        description={description}
        onRunning={() => setRunning(true)}
      />
    </div>
  )
}
