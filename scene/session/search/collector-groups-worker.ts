import { bestCollectorGroups, type CollectorGroupings } from '@/lib/mechanics/collector-groups'
import type { CollectorGroupsRequest } from './find-collector-groups'
import { serveSearch } from './serve-search'

serveSearch<CollectorGroupsRequest, CollectorGroupings>(({ train, count, window }) =>
  bestCollectorGroups(train, count, { window }),
)
