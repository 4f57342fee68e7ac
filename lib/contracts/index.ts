import { analyse } from './analyses'
import { draftOperations } from './drafts'
import type { OperationContract } from './operation'
import { peopleOperations } from './people'
import { sceneOperations } from './scenes'
import { shareLinkOperations } from './share-links'
import { systemOperations } from './system'

/** Every operation of the HTTP interface. */
export const allOperations: readonly OperationContract[] = [
  ...systemOperations,
  analyse,
  ...peopleOperations,
  ...sceneOperations,
  ...draftOperations,
  ...shareLinkOperations,
]
