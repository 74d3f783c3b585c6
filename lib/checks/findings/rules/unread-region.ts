import type { Bench } from '../../families/case'
import type { LaidOut, Reading } from '../../types'
import type { Found, RuleRow } from '../finding'

/** A note to the reviewer: something to look at with one's own eyes. */
function find({ laidOut, reading }: Bench): Found[] {
  return [
    ...findUnread(laidOut),
    ...findRecognised(laidOut),
    ...findRemarks(laidOut),
    ...findTableRemarks(reading),
  ]
}

function findUnread({ unread }: LaidOut): Found[] {
  return unread.map((place) => ({
    severity: 'note',
    family: null,
    reports: [],
    place,
    says: `A region on page ${place.page ?? '?'} that looks like numbers could not be read${place.quote ? `: "${place.quote.slice(0, 120)}"` : ''}.`,
    asks: 'Please supply the numbers of this region as text or as a results table.',
    cites: [],
  }))
}

/** A character that was recognised from a picture may be another one: 8 for 3, a lost decimal point. */
function findRecognised({ recognised = [] }: LaidOut): Found[] {
  return recognised.map((place) => ({
    ...note,
    place,
    says: `Page ${place.page ?? '?'} was recognised from its picture; check each number.`,
    asks: 'Please supply this page as text, or its numbers as a results table.',
  }))
}

function findRemarks({ remarks = [] }: LaidOut): Found[] {
  return remarks.map(({ says, asks }) => ({ ...note, place: null, says, asks }))
}

/** A cell that a spreadsheet made a date of, rows that are hidden: see lib/checks/table. */
function findTableRemarks({ tableRemarks = [] }: Reading): Found[] {
  return tableRemarks.map((remark) => ({ ...note, ...remark }))
}

const note = { severity: 'note', family: null, reports: [], cites: [] } satisfies Partial<Found>

export const unreadRegion: RuleRow = {
  rule: 'unread-region',
  says: 'a page or table region that looked like numbers and could not be read',
  find,
}
