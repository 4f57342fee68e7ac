import { UnavailableSheet } from '@/components/sharing/unavailable-sheet'
import { linkMetadata } from './link-metadata'

export const metadata = linkMetadata

export default UnavailableSheet
