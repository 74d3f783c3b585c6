import type {
  Call,
  ClaimedProcedure,
  NamedRole,
  Outcome,
  Procedure,
  Relation,
  Rule,
  Scale,
  Severity,
  Source,
  Test,
} from './vocabulary'

// ---------------------------------------------------------------- what the engine is given

/**
 * One run of text as the PDF draws it. `x`, `y`: start of the baseline in PDF points, origin bottom left of
 * the unrotated page; `width`: advance along the baseline in points; `size`: font size in points; `angle`:
 * direction of the baseline in degrees counter-clockwise, 0 for upright text; `font`: key into
 * `ReadDocument.fonts`; `endsLine`: the file says that a line ends here (a hint, not to be relied on).
 */
export type TextRun = {
  text: string
  x: number
  y: number
  width: number
  size: number
  angle: number
  font: string
  endsLine: boolean
}

/** `ascent` and `descent` as fractions of the font size (descent negative); `family` as the file names it. */
export type ReadFont = { family: string; ascent: number; descent: number; vertical: boolean }

/** `number` is 1-based; `width`, `height` in points before rotation; `rotation` in degrees clockwise (0, 90, 180, 270). */
export type ReadPage = {
  number: number
  width: number
  height: number
  rotation: number
  runs: TextRun[]
  /** The page is a picture whose characters were recognised: any of them may be wrong. */
  recognised?: boolean
}

/** What the reader of the file left out or took one way of two; `asks` is to the authors. */
export type ReadRemark = { says: string; asks: string }

export type ReadDocument = {
  sha256: string
  title: string | null
  pages: ReadPage[]
  fonts: Record<string, ReadFont>
  remarks?: ReadRemark[]
}

/**
 * A cell as it is shown; `value` is the stored number where the file stores a number, else null. `date`: the file
 * stores a date.
 */
export type ReadCell = { text: string; value: number | null; date?: true }

/** Cells that a spreadsheet shows as one: 0-based row and column of the first, and how many rows and columns. */
export type Merge = [row: number, column: number, rows: number, columns: number]

/** `name` is null for CSV and TSV. `rows` includes header and blank rows; rows may differ in length. */
export type ReadSheet = { name: string | null; rows: ReadCell[][]; merges?: Merge[] }

/**
 * What a person says that a column holds: sheet (0-based), the table by the row of the sheet at which it begins
 * (0-based, as `describeTable` gives it), and the column of the sheet (0-based).
 */
export type NamedColumn = { sheet: number; row: number; column: number; role: NamedRole }

/**
 * A results table handed in beside the manuscript. `file` is the file's own name without folder. `roles`: columns
 * that a person named, which are read as named and no other way.
 */
export type ReadTable = {
  file: string
  sha256: string
  sheets: ReadSheet[]
  roles?: readonly NamedColumn[]
  remarks?: ReadRemark[]
}

/** What the house decides; the defaults are in `defaultHouseRules`. */
export type HouseRules = {
  /** Level used where the manuscript states none, in (0, 1). */
  alpha: number
  /** Procedures that the house accepts for control of the family-wise error rate or the false discovery rate. */
  accepted: readonly Procedure[]
  /** A family of at least this many tests calls for a correction, or for a reason why none is needed. */
  correctionFrom: number
  /** Secondary outcomes are a family of their own. */
  secondaryApart: boolean
}

// ---------------------------------------------------------------- what the engine answers

/** `boxes` in PDF points, origin bottom left of the unrotated page: [x0, y0, x1, y1]. */
export type Box = [x0: number, y0: number, x1: number, y1: number]

export type Place = {
  source: Source
  page: number | null
  row: number | null
  sheet: string | null
  quote: string
  boxes: Box[]
}

export type Report = {
  id: string
  place: Place
  relation: Relation
  value: number
  decimals: number
  low: number
  high: number
  scale: Scale
  statistic: string | null
  comparison: [string, string] | null
  called: Call | null
  family: string | null
}

export type Statistic = {
  id: string
  place: Place
  test: Test
  df: number[]
  value: number
  decimals: number
  pLow: number | null
  pHigh: number | null
  report: string | null
}

export type Claim = {
  id: string
  place: Place
  procedure: ClaimedProcedure
  m: number | null
  alpha: number | null
  threshold: number | null
  groups: number | null
}

export type Decision = {
  report: string
  called: boolean | null
  adjusted: [low: number, high: number]
  significant: boolean | null
  survivesUpTo: number | null
}

export type Fit = { procedure: Procedure | 'raw'; m: number }

/**
 * How a family's decisions came about, so that they can be computed again elsewhere. `procedure`: the one judged by,
 * 'raw' where no correction is called for, 'any' where one is claimed without a name. `groups`: for procedures on
 * statistics, 0 where not known. `sizes`: the m judged at; with several, a decision stands only where all agree.
 * `parts`: numbers of tests that an m below the family's size applies to one by one; one number where it is whole.
 * `undone`: by what printed adjusted values are turned back where nothing else is printed. `trusted`: the printed
 * adjusted values follow the claim, so that their digits count. `fitsUpTo`: the largest m tried for `fits`.
 * `tests`: in the order of the decisions; `statistics` are ids, `witnesses` the prints (reports and statistics, by id)
 * that speak of the test's p-value and what each is taken for, a statistic by half of its two-sided p where the test is
 * `oneSided`; `raw`: the range of the unadjusted p that follows, null where nothing is known.
 */
export type Working = {
  procedure: Procedure | 'raw' | 'any'
  alpha: number
  groups: number
  sizes: number[]
  parts: number[]
  undone: { procedure: Procedure | null; m: number }
  trusted: boolean
  fitsUpTo: number
  tests: {
    statistics: string[]
    oneSided: boolean
    witnesses: { id: string; is: 'raw' | 'adjusted' | 'open' }[]
    raw: [low: number, high: number] | null
  }[]
}

export type Family = {
  id: string
  label: string
  members: string[]
  claim: string | null
  groups: number | null
  m: { printed: number; claimed: number | null; due: number | null; why: string }
  outcome: Outcome
  why: string
  decisions: Decision[]
  fits: Fit[]
  /** Null for an audit that was kept before this was. */
  working: Working | null
}

export type Finding = {
  id: string
  rule: Rule
  severity: Severity
  family: string | null
  reports: string[]
  place: Place | null
  says: string
  asks: string
  cites: string[]
}

export type Audit = {
  engine: string
  document: { pages: number; sha256: string; title: string | null }
  table: { file: string; rows: number; sha256: string } | null
  alpha: { value: number; quote: string | null; page: number | null }
  reports: Report[]
  statistics: Statistic[]
  claims: Claim[]
  families: Family[]
  findings: Finding[]
}

// ---------------------------------------------------------------- between reading and judging

/** Where a stretch of text stands in the paper, as far as its headings tell. */
export const SECTION_KINDS = [
  'title',
  'abstract',
  'introduction',
  'methods',
  'results',
  'discussion',
  'references',
  'other',
] as const
export type SectionKind = (typeof SECTION_KINDS)[number]

/**
 * The manuscript as continuous text: `text` holds paragraphs separated by '\n\n', lines joined, hyphenation
 * undone, normalised characters (see lib/checks/text). `boxesOf` and `pageOf` lead from a half-open range of
 * character offsets in `text` back to the page.
 */
export type Prose = {
  text: string
  sections: { kind: SectionKind; heading: string; start: number; end: number }[]
  pageOf: (offset: number) => number
  boxesOf: (start: number, end: number) => Box[]
}

/** A cell of a table found on a page: text after normalising, with its boxes. Empty string for an empty cell. */
export type PdfCell = { text: string; boxes: Box[] }

/**
 * A table found on a page by its geometry. `header`: rows above the body (column-wise texts); `rows`: body;
 * every row has `columns` cells. `caption` and `notes` as printed ('' where none). `number` as in "Table 2".
 * `offset`: where in `Prose.text` it belongs (the end of the paragraph before it).
 */
export type PdfTable = {
  page: number
  number: string | null
  caption: string
  notes: string
  columns: number
  header: PdfCell[][]
  rows: PdfCell[][]
  offset: number
}

/** What `lib/checks/text` makes of the positioned runs. Text that belongs to a table is not in `prose`. */
export type LaidOut = {
  prose: Prose
  tables: PdfTable[]
  unread: Place[]
  /** Pages whose text was recognised from a picture. */
  recognised?: Place[]
  remarks?: ReadRemark[]
}

/** A report with what the reader saw around it; the judgement uses it, the audit drops it. */
export type ReadReport = Report & {
  /** Offset in `Prose.text` of the first character; for table cells the table's offset. */
  offset: number
  section: SectionKind
  heading: string
  /** Index into `LaidOut.tables`, or sheet index of the results table, or null. */
  table: number | null
  /** Row and column in that table's body, 0-based, or null. */
  cell: { row: number; column: number } | null
  /** The sentence, or the row joined by ' | '. */
  sentence: string
  /** Outcome or variable named by the row, the caption or the sentence where it can be told. */
  outcome: string | null
  /** What the number is: a member of a family, or a test that is not (omnibus, baseline, assumption). */
  role: 'comparison' | 'omnibus' | 'baseline' | 'assumption' | 'interaction' | 'other'
  /** Stated as one-sided where it stands. */
  oneSided: boolean
  /** True where only an asterisk or 'n.s.' stands for the value. */
  markOnly: boolean
}

export type ReadStatistic = Statistic & {
  offset: number
  table: number | null
  sentence: string
  /** As of a report; absent outside a column of statistics. */
  cell?: { row: number; column: number }
}

export type ReadClaim = Claim & {
  offset: number
  section: SectionKind
  sentence: string
  /** What the sentence says the correction is for: all pairs, many-to-one against a control, outcomes. */
  scope: { design: 'all-pairs' | 'many-to-one' | 'outcomes' | 'contrasts' | null; control: string | null }
  /** The error rate that the manuscript says is controlled by it. */
  errorRate: 'fwer' | 'fdr' | null
}

/** Everything that was read, before judging. */
export type Reading = {
  alpha: { value: number; quote: string | null; page: number | null }
  reports: ReadReport[]
  statistics: ReadStatistic[]
  claims: ReadClaim[]
  /** What of the results table could not be read, or should be looked at. */
  tableRemarks?: TableRemark[]
}

/** Something about the results table, at the cell where it is about one; `asks` is to the authors. */
export type TableRemark = ReadRemark & { place: Place | null }
