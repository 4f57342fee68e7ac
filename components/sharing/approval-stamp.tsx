import type { SharedScene } from '@/lib/contracts/shared'
import { dayInWords } from './days'

/** Says that the version shown is the one the workshop approved. */
export const ApprovalStamp = ({ approved, version }: Pick<SharedScene, 'approved' | 'version'>) =>
  approved ? (
    <span className="stamp">
      <b>{approved.word === 'approve' ? 'Approved' : 'Approved with remarks'}</b>
      <span>
        version {version}, {dayInWords(approved.at)}
      </span>
    </span>
  ) : null
