export { namedViews, type NamedView } from '@/scene/model/named-views'
