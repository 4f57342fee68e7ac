import { accountOperations } from './account'
import { analyse } from './analyses'
import { auditOperations } from './audit-log'
import { balanceOperations } from './balance'
import { bearingLoads } from './bearing-loads'
import { listClearances } from './clearances'
import { draftOperations } from './drafts'
import { designSheetOperations } from './design-sheets'
import { explain } from './explanations'
import { exportOperations } from './exports'
import { firingOperations } from './firing'
import { mailOperations } from './mail'
import { modelOperations } from './models'
import { readTrace } from './gas'
import { invitationOperations } from './invitations'
import { findLayouts } from './layouts'
import { guestNoteOperations } from './guest-notes'
import { noteOperations } from './notes'
import type { OperationContract } from './operation'
import { peopleOperations } from './people'
import { sceneOperations } from './scenes'
import { shareLinkOperations } from './share-links'
import { sharedOperations } from './shared'
import { speedSweep } from './speed-sweeps'
import { systemOperations } from './system'
import { tokenOperations } from './tokens'
import { torsionalModes } from './torsional-modes'
import { turningMoment } from './turning-moment'
import { workshopOperations } from './workshops'
import { verdictOperations } from './verdicts'
import { versionOperations } from './versions'

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
  ...exportOperations,
  ...peopleOperations,
  ...accountOperations,
  ...workshopOperations,
  ...invitationOperations,
  ...tokenOperations,
  ...sceneOperations,
  ...versionOperations,
  ...draftOperations,
  ...shareLinkOperations,
  ...noteOperations,
  ...guestNoteOperations,
  ...mailOperations,
  ...sharedOperations,
  ...verdictOperations,
  ...auditOperations,
]
