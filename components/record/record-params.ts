import { parseAsInteger, parseAsIsoDate, parseAsString, parseAsStringLiteral } from 'nuqs/server'
import { EVENTS } from '@/lib/rules/events'

/** The record's filter in the address. Days are whole days, UTC. */
export const recordParsers = {
  event: parseAsStringLiteral(EVENTS),
  actor: parseAsString,
  manuscript: parseAsString,
  from: parseAsIsoDate,
  to: parseAsIsoDate,
  page: parseAsInteger.withDefault(1),
}
