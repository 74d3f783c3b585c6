import type { Place } from '@/lib/checks/types'
import { classes } from '../ui/classes'

/** Where something stands, in full. */
export function placeWords(place: Pick<Place, 'page' | 'row' | 'sheet'>): string {
  return place.page === null && place.row !== null && place.sheet
    ? `${place.sheet}, ${shortPlace(place)}`
    : shortPlace(place)
}

function shortPlace(place: Pick<Place, 'page' | 'row'>): string {
  if (place.page !== null) return `p. ${place.page}`
  return place.row === null ? '–' : `row ${place.row}`
}

type PlaceLinkProps = {
  place: Place
  /** What is shown there, for the screen reader. */
  what: string
  onShow: () => void
  /** The whole row is the target. */
  row?: boolean
  className?: string
}

/** Leads to a place in the manuscript or the results table. */
export function PlaceLink({ place, what, onShow, row, className }: PlaceLinkProps) {
  return (
    <button
      type="button"
      onClick={onShow}
      aria-label={`${placeWords(place)}: show ${what}`}
      className={classes(
        'tabular text-xs whitespace-nowrap text-tide hover:underline',
        row && 'row-link',
        className,
      )}
    >
      {shortPlace(place)}
    </button>
  )
}
