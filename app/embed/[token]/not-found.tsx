import { linkMetadata } from '@/app/s/[token]/link-metadata'
import { UnavailableSheet } from '@/components/sharing/unavailable-sheet'

export const metadata = linkMetadata

export default UnavailableSheet
