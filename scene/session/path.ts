export { applyChanges, getAt, setAt, type Change, type Path } from '@/scene/model/path'
