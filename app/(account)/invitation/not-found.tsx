import { UnavailableInvitation } from '@/components/account/unavailable-invitation'
import { invitationMetadata } from './metadata'

export const metadata = invitationMetadata

export default UnavailableInvitation
