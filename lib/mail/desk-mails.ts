import { escapeMarkdown } from '@/lib/letters/escape-markdown'
import { renderLetter } from '@/lib/letters/render-letter'
import { getSettings } from '@/lib/settings'
import type { Mail } from './queue-mail'

/*
 * Mails about a manuscript: neutral words and a link. None holds anything of a manuscript, its title included,
 * nor who wrote or reviews it, but for the editors and but for the letter that was released.
 */

type About = {
  to: { name: string; email: string }
  manuscriptId: string
  reference: string | null
}

export function composeHandedIn(about: About & { round: number }): Mail {
  const what = about.round > 1 ? 'the revision of your manuscript' : 'your manuscript'
  return compose(about, 'handed-in', `${nameOf(about)} has arrived`, [
    `Thank you: ${what} has arrived and is kept as ${nameOf(about)}.`,
    'Here you can follow what happens with it:',
  ])
}

export function composeStuck(about: About): Mail {
  return compose(about, 'stuck', `${nameOf(about)}: a file could not be read`, [
    `A file of ${nameOf(about)} could not be read. Nothing is lost; it waits until you have looked at it.`,
    'Here it says what is wrong and what you can do:',
  ])
}

export function composeAssigned(about: About & { dueAt: number }): Mail {
  return compose(about, 'assigned', `A review is offered to you: ${nameOf(about)}`, [
    `The review of ${nameOf(about)} is offered to you. It would be due on ${sayDate(about.dueAt)}.`,
    'Please accept or decline it here; if you have a conflict of interest, please say so there:',
  ])
}

export function composeDeclined(about: About & { reviewer: string }): Mail {
  return compose(about, 'declined', `${nameOf(about)}: the review was declined`, [
    `${about.reviewer} has declined the review of ${nameOf(about)}. It waits to be assigned again.`,
    'Here is the manuscript:',
  ])
}

export function composeSteppedAside(about: About & { reviewer: string }): Mail {
  return compose(about, 'stepped-aside', `${nameOf(about)}: the reviewer stepped aside`, [
    `${about.reviewer} has a conflict of interest on ${nameOf(about)} and sees it no more. It waits to be assigned again.`,
    'Here is the manuscript:',
  ])
}

export function composeEnded(about: About): Mail {
  return compose(
    about,
    'ended',
    `${nameOf(about)}: your review has ended`,
    [`The review of ${nameOf(about)} was taken back by an editor; you need do nothing more. Thank you.`],
    '/docket',
  )
}

export function composeWithdrawn(about: About): Mail {
  return compose(
    about,
    'withdrawn',
    `${nameOf(about)} was withdrawn`,
    [`${nameOf(about)} was withdrawn by whoever handed it in; you need do nothing more. Thank you.`],
    '/docket',
  )
}

export function composeVerdictDrafted(about: About): Mail {
  return compose(
    about,
    'verdict-drafted',
    `${nameOf(about)}: a verdict waits for its release`,
    [`The verdict on ${nameOf(about)} is drafted.`, 'Here you can read it, release it or send it back:'],
    `/manuscripts/${about.manuscriptId}/verdict`,
  )
}

export function composeSentBack(about: About): Mail {
  return compose(
    about,
    'sent-back',
    `${nameOf(about)}: your verdict was sent back`,
    [`An editor asks you to look at your verdict on ${nameOf(about)} again.`, 'Here it says why:'],
    `/manuscripts/${about.manuscriptId}/verdict`,
  )
}

/** The released letter as it was rendered; the one mail that speaks of the manuscript. */
export function composeVerdict(given: {
  recipient: string
  manuscriptId: string
  subject: string
  html: string
  text: string
}): Mail {
  const { recipient, manuscriptId, subject } = given
  const link = `${getSettings().url}/manuscripts/${manuscriptId}/answer`
  const end = renderLetter(`You can answer point by point here: <${link}>`)
  return {
    template: 'verdict',
    recipient,
    manuscriptId,
    subject,
    text: `${given.text}\n${end.text}`,
    html: `${given.html}${end.html}`,
  }
}

function compose(
  { to, manuscriptId }: About,
  template: string,
  subject: string,
  paragraphs: string[],
  path = `/manuscripts/${manuscriptId}`,
): Mail {
  // A name is shown as it is: no mark-up of its own.
  const name = escapeMarkdown(to.name)
  const { url, house } = getSettings()
  const link = `<${url}${path}>`
  const body = [`Dear ${name},`, ...paragraphs, link, `With kind regards\\\n${house}`].join('\n\n')
  return { template, recipient: to.email, manuscriptId, subject, ...renderLetter(body) }
}

function nameOf({ reference }: { reference: string | null }): string {
  return reference ?? 'the manuscript'
}

/** 15 December 2026, in UTC as due dates are. */
function sayDate(at: number): string {
  return new Intl.DateTimeFormat('en-GB', { dateStyle: 'long', timeZone: 'UTC' }).format(at)
}
