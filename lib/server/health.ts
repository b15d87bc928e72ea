import 'server-only'
import { database } from './db'

/** Whether the database answers a trivial question. */
export async function databaseAnswers(): Promise<boolean> {
  try {
    await database().$queryRaw`select 1`
    return true
  } catch {
    return false
  }
}
