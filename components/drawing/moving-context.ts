import { createContext, use } from 'react'
import type { MovingScene } from './start-scene'

/** The scene that moves on this page, for what comes after it. */
export const MovingContext = createContext<MovingScene | null>(null)

export const useMovingScene = () => use(MovingContext)
