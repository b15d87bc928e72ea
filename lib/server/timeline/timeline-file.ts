import 'server-only'
import { timelineCsv } from '@/lib/exchange/timeline-sheet'
import type { Actor } from '../actor'
import { read } from '../read'
import { projectTimeline } from './queries'

/** Every event of a project as a file for spreadsheets. */
export async function timelineFile(actor: Actor, projectId: string): Promise<string> {
  return timelineCsv((await read(projectTimeline, actor, { projectId, all: true })).lines)
}
