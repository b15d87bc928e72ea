import 'server-only'
import { createHash } from 'node:crypto'
import type { Database } from '../db'

/** So many wrong passwords are free; then the wait doubles from a second up to a quarter of an hour. */
const free = 5
const longest = 900

const accountKey = (email: string): string => createHash('sha256').update(email.trim().toLowerCase()).digest('hex')

/**
 * Counts an attempt to sign in before the password is looked at, so that many at once do not slip through. The answer is the number
 * of seconds to wait; 0 lets the attempt go on. An address without an account counts alike. A day without attempts forgets.
 */
export async function countAttempt(db: Database, email: string, at: Date): Promise<number> {
  const account = accountKey(email)
  const rows = await db.$queryRaw<{ failures: number }[]>`
    insert into sign_in_delay as d (account, failures, until) values (${account}, 1, ${at})
    on conflict (account) do update set
      failures = case when d.until < ${at}::timestamptz - interval '1 day' then 1 else d.failures + 1 end,
      until = case
        when d.until < ${at}::timestamptz - interval '1 day' or d.failures + 1 < ${free}::int then ${at}::timestamptz
        else ${at}::timestamptz + make_interval(secs => least(${longest}::float8, power(2::float8, d.failures + 1 - ${free}::int)))
      end
    where d.until <= ${at}::timestamptz
    returning d.failures`
  if (rows.length > 0) return 0
  const held = await db.signInDelay.findUnique({ where: { account } })
  return held ? Math.max(1, Math.ceil((held.until.getTime() - at.getTime()) / 1000)) : 0
}

/** Forgets the attempts of whoever has signed in. */
export async function forgetAttempts(db: Database, email: string): Promise<void> {
  await db.signInDelay.deleteMany({ where: { account: accountKey(email) } })
}
