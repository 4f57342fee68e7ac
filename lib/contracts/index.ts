import { analyse } from './analyses'
import { balanceOperations } from './balance'
import { bearingLoads } from './bearing-loads'
import { listClearances } from './clearances'
import { draftOperations } from './drafts'
import { designSheetOperations } from './design-sheets'
import { explain } from './explanations'
import { firingOperations } from './firing'
import { modelOperations } from './models'
import { readTrace } from './gas'
import { findLayouts } from './layouts'
import type { OperationContract } from './operation'
import { peopleOperations } from './people'
import { sceneOperations } from './scenes'
import { shareLinkOperations } from './share-links'
import { speedSweep } from './speed-sweeps'
import { systemOperations } from './system'
import { torsionalModes } from './torsional-modes'
import { turningMoment } from './turning-moment'

/** Every operation of the HTTP interface. */
export const allOperations: readonly OperationContract[] = [
  ...systemOperations,
  analyse,
  ...balanceOperations,
  bearingLoads,
  turningMoment,
  speedSweep,
  torsionalModes,
  explain,
  ...firingOperations,
  findLayouts,
  readTrace,
  listClearances,
  ...designSheetOperations,
  ...modelOperations,
  ...peopleOperations,
  ...sceneOperations,
  ...draftOperations,
  ...shareLinkOperations,
]
