import type { Look } from './types'

/** A line in its own form: the resultant is double. */
export const Line = ({ look, path }: { look: Look; path: string }) => (
  <>
    <path className={`pl ${look}`} d={path} />
    {look === 'res' ? <path className="pl2" d={path} /> : null}
  </>
)
