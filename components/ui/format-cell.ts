import type { Cell, Column } from '@/lib/tables/table'

const MINUS = '\u2212'

/** A cell on the screen: at the decimals of its column, or at four figures. */
export function formatCell(cell: Cell, { decimals }: Column): string {
  if (cell === null) return '–'
  if (typeof cell === 'string') return cell
  if (!Number.isFinite(cell)) return '–'
  const text = decimals === undefined ? String(Number(cell.toPrecision(4))) : cell.toFixed(decimals)
  const size = grouped(text.replace(/^-/, ''))
  return /^-/.test(text) && /[1-9]/.test(text) ? MINUS + size : size
}

const grouped = (text: string) => {
  const [whole, part] = text.split('.')
  return whole.replace(/\B(?=(\d{3})+$)/g, ',') + (part ? `.${part}` : '')
}
