import { b } from './b'
export const a = () => b
