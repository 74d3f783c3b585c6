import { logGammaTails } from './incomplete-gamma'

/** log P(χ² > x) for `df` > 0 degrees of freedom and x >= 0. Source: Abramowitz and Stegun (1964), 26.4.19. */
export function chiSquareLogUpper(x: number, df: number): number {
  return logGammaTails(0.5 * df, 0.5 * x).upper
}
