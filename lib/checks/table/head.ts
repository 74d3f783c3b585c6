import { fold } from '../extract/grammar/fold'

/** Words by which a line is told to be one of heads: 'p', 't', 'df', 'SE', 'Comparison', 'Group A', 'n', 'mean', 'P adj'. */
const HEAD =
  /^(?:p|q|t|F|z|r|n|N|df|d\.f\.|DF|FG|SE|SD|sd|se|m|M|χ2|U|W|H)$|^(?:p|q|adj|raw|sig|t|f|z|chi|num|den|std|diff|mean|median|estimate|compar|contrast|pair|group|treatment|outcome|measure|variable|gene|region|behavio|end-?point|statistic|n\b|ci\b|95|lower|upper|holm|bonf|tukey|fdr|significan|result|condition|effect|term|grade|stream|test)/i

/** Whether a cell of a line looks like the head of a column. */
export const roleIsKnown = (cell: string): boolean => HEAD.test(fold(cell).trim())
