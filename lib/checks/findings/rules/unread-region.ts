import type { Bench } from '../../families/case'
import type { Found, RuleRow } from '../finding'

/** A note to the reviewer: something to look at with one's own eyes. */
function find({ laidOut }: Bench): Found[] {
  return laidOut.unread.map((place) => ({
    severity: 'note',
    family: null,
    reports: [],
    place,
    says: `A region on page ${place.page ?? '?'} that looks like numbers could not be read${place.quote ? `: "${place.quote.slice(0, 120)}"` : ''}.`,
    asks: 'Please supply the numbers of this region as text or as a results table.',
    cites: [],
  }))
}

export const unreadRegion: RuleRow = {
  rule: 'unread-region',
  says: 'a page or table region that looked like numbers and could not be read',
  find,
}
