import { toTrain } from '@/scene/model/to-train'
import { RunningScene, type RunningSceneProps } from './running-scene'

/** A scene that runs by itself, for pages that only show: first its poster, then the moving drawing. */
export const LiveScene = (props: Omit<RunningSceneProps, 'train'>) => (
  <RunningScene {...props} train={toTrain(props.scene.train)} />
)
