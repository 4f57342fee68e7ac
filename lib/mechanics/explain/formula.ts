/**
 * A formula as it is read on the sheet, "pi / 4 × bore² × true stroke": + − × / ( ) ² ³, root( ), sin( ), cos( ),
 * tan( ), asin( ) with angles in degrees, pi, numbers, and words for symbols. What is shown is what is worked out.
 */
type Token = { is: 'number'; value: number } | { is: 'symbol' | 'function' | 'sign'; text: string }

const RADIANS = Math.PI / 180
const functions: Record<string, (x: number) => number> = {
  root: Math.sqrt,
  sin: (x) => Math.sin(x * RADIANS),
  cos: (x) => Math.cos(x * RADIANS),
  tan: (x) => Math.tan(x * RADIANS),
  asin: (x) => Math.asin(x) / RADIANS,
}

/** Splits a formula; the longest symbol that fits is taken. Throws SyntaxError at what it does not know. */
function tokens(formula: string, symbols: readonly string[]): Token[] {
  const names = symbols.toSorted((one, other) => other.length - one.length)
  const out: Token[] = []
  for (let at = 0; at < formula.length;) {
    const rest = formula.slice(at)
    const name = names.find((word) => rest.startsWith(word) && !/^[a-z0-9]/i.test(rest.slice(word.length)))
    const [space] = /^\s*/.exec(rest)!
    const [number] = /^\d+(\.\d+)?(e[+-]?\d+)?/i.exec(rest) ?? ['']
    const [call] = /^(root|sin|cos|tan|asin)(?=\()/.exec(rest) ?? ['']
    if (name) out.push({ is: 'symbol', text: name })
    else if (number) out.push({ is: 'number', value: Number(number) })
    else if (call) out.push({ is: 'function', text: call })
    else if (/^pi\b/.test(rest)) out.push({ is: 'number', value: Math.PI })
    else if (/^[+−×/()²³]/.test(rest)) out.push({ is: 'sign', text: rest[0] })
    else if (!space) throw new SyntaxError(`The formula ${formula} has no meaning at “${rest}”.`)
    at += (name || number || call || (/^pi\b/.test(rest) && 'pi') || space || rest[0]).length
  }
  return out
}

/** The value of a formula for these symbols. */
export function evaluate(formula: string, values: Readonly<Record<string, number>>): number {
  const list = tokens(formula, Object.keys(values))
  let at = 0
  const takes = (...signs: string[]) => {
    const token = list[at]
    if (token?.is !== 'sign' || !signs.includes(token.text)) return null
    at++
    return token.text
  }
  const sum = (): number => {
    let value = takes('−') ? -product() : product()
    for (let sign = takes('+', '−'); sign; sign = takes('+', '−'))
      value += sign === '+' ? product() : -product()
    return value
  }
  const product = (): number => {
    let value = power()
    for (let sign = takes('×', '/'); sign; sign = takes('×', '/'))
      value *= sign === '×' ? power() : 1 / power()
    return value
  }
  const power = (): number => {
    const value = single()
    const raised = takes('²', '³')
    return raised === null ? value : value ** (raised === '²' ? 2 : 3)
  }
  const single = (): number => {
    const token = list[at++]
    if (token?.is === 'number') return token.value
    if (token?.is === 'symbol') return values[token.text]
    if (token?.is === 'function') return functions[token.text](single())
    const inside = token?.is === 'sign' && token.text === '(' ? sum() : NaN
    if (!takes(')')) throw new SyntaxError(`The formula ${formula} breaks off.`)
    return inside
  }
  const value = sum()
  if (at < list.length) throw new SyntaxError(`The formula ${formula} does not end where it should.`)
  return value
}

/** The formula with a text in the place of every symbol; the rest stays, but for brackets that come out double. */
export function substitute(formula: string, texts: Readonly<Record<string, string>>): string {
  const names = Object.keys(texts).toSorted((one, other) => other.length - one.length)
  if (names.length === 0) return formula
  const pattern = new RegExp(`(?<![a-z0-9])(${names.join('|')})(?![a-z0-9])`, 'gi')
  const put = formula.replace(pattern, (name) => texts[name])
  return put.replace(/\(\((−[^()]*)\)\)/g, '($1)')
}
