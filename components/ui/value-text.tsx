import { classes } from './classes'

type ValueTextProps = {
  /** As printed, such as `.008` or `0.0004`, or already formatted with formatComputed. */
  value: string
  /** The statistic's letter, set in italics as the trade prints it: p, t, F, z, r, q; Greek letters stay upright. */
  name?: string
  /** `=` by default; left out where the value begins with a relation of its own. */
  relation?: string
  /** Degrees of freedom after the letter: `2, 45` prints F(2, 45). */
  df?: string
  className?: string
}

// 'p', 'F', 'adj p' are set in italics; 'χ²' and 'α' are not.
const latin = /^[A-Za-z ]+$/

/** A number as the trade prints it: F(2, 45) = 4.52, p < .001. Never breaks over a line. */
export function ValueText({ value, name, relation = '=', df, className }: ValueTextProps) {
  const own = /^[<>≤≥=]/.test(value)
  return (
    <span className={classes('tabular whitespace-nowrap', className)}>
      {name ? (
        <>
          {latin.test(name) ? <i>{name}</i> : name}
          {df ? `(${df})` : null}
          {own ? ' ' : ` ${relation} `}
        </>
      ) : null}
      {value}
    </span>
  )
}
