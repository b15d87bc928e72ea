import 'server-only'
import type { Database } from '../db'
import { linkTo } from '../link-token'
import { sendMail } from '../mail/send-mail'
import { recordOfPerson } from './record-of-person'
import { forgetAttempts } from './sign-in-delay'

/** How long the link of a mail may be used. */
export const resetMinutes = 30

/**
 * Sends the link by which a new password is chosen. The request does not wait for it: whether there is an account must not be read
 * off the time that the answer takes.
 */
export function sendResetLink({ user, token }: { user: { email: string; name: string }; token: string }): void {
  const text = [
    `${user.name},`,
    '',
    'somebody, probably you, asked for a new password for Breakaway. Choose it here:',
    '',
    linkTo('new-password', token),
    '',
    `The link works once, for ${resetMinutes} minutes. If it was not you, do nothing: your password stays as it is.`,
  ].join('\n')
  sendMail({ to: user.email, subject: 'Choose a new password', text }).catch((error: unknown) => {
    console.error(`A mail was not sent: ${error instanceof Error ? error.message : 'unknown reason'}`)
  })
}

/** What follows when a new password was chosen: it is the person's own, and earlier failures no longer count. */
export async function afterReset(db: Database, user: { id: string; email: string }): Promise<void> {
  await db.user.update({ where: { id: user.id }, data: { initialPassword: false } })
  await forgetAttempts(db, user.email)
  await recordOfPerson(db, user.id, 'password-reset')
}
