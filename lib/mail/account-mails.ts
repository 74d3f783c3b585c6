import { getSettings } from '@/lib/settings'
import type { Mail } from './queue-mail'

/** Mails whose body holds a link that opens an account; the link is taken out of the outbox once sent. */
export const linkTemplates: readonly string[] = ['invitation', 'password']

type Recipient = { email: string; name: string }

export function composeInvitation(to: Recipient, token: string): Mail {
  const { url, house } = getSettings()
  return compose('invitation', to, `Your account at ${house}`, [
    `An account has been made for you at ${house}, where manuscripts are looked at for how they handle multiple comparisons.`,
    'Please open this link within seven days and choose a password:',
    `${url}/invitation/${token}`,
    'The link works once. If you did not expect this, you need do nothing.',
  ])
}

export function composePasswordReset(to: Recipient, token: string): Mail {
  const { url, house } = getSettings()
  return compose('password', to, `Choose a new password at ${house}`, [
    `Somebody asked for a new password for your account at ${house}.`,
    'If it was you, please open this link within one hour:',
    `${url}/reset/${token}`,
    'The link works once. If it was not you, you need do nothing: your password stays as it is.',
  ])
}

function compose(template: string, to: Recipient, subject: string, paragraphs: string[]): Mail {
  const lines = [`Dear ${to.name},`, ...paragraphs, `With kind regards\n${getSettings().house}`]
  return {
    template,
    recipient: to.email,
    subject,
    text: `${lines.join('\n\n')}\n`,
    html: lines.map((line) => `<p>${toHtml(line)}</p>`).join('\n'),
  }
}

function toHtml(line: string): string {
  const safe = escapeHtml(line)
  if (/^https?:\/\/\S+$/.test(line)) return `<a href="${safe}">${safe}</a>`
  return safe.replaceAll('\n', '<br>')
}

export function escapeHtml(text: string): string {
  const names: Record<string, string> = {
    '&': '&amp;',
    '<': '&lt;',
    '>': '&gt;',
    '"': '&quot;',
    "'": '&#39;',
  }
  return text.replace(/[&<>"']/g, (c) => names[c] ?? c)
}
