import { afterAll } from 'vitest'
import { pageCount } from '@/lib/report/page-count'
import { renderReport } from '@/lib/report/render-report'
import { database } from '@/lib/server/db'
import { startWork } from '@/lib/server/jobs/work'
import { runDocument } from '@/lib/study/run-document'

/** A worker on the test's own queue that really computes and renders, in this process; started when the test says so. */
export function useWorker(url: () => string): { start(): Promise<void> } {
  let work: Awaited<ReturnType<typeof startWork>> | undefined
  afterAll(async () => work?.stop())
  return {
    start: async () => {
      work = await startWork(url(), database(), {
        compute: async (document, { onProgress }) => runDocument(document, onProgress),
        render: async (input) => {
          const pdf = await renderReport(input)
          return { pdf, pages: await pageCount(pdf) }
        },
      })
    },
  }
}

/** Asks again until the answer will do; a minute is more than any job here takes. */
export async function until<Answer>(ask: () => Promise<Answer>, willDo: (answer: Answer) => boolean): Promise<Answer> {
  const end = Date.now() + 60_000
  for (;;) {
    const answer = await ask()
    if (willDo(answer)) return answer
    if (Date.now() > end) throw new Error('a minute has passed and the answer still will not do')
    await new Promise((resolve) => setTimeout(resolve, 100))
  }
}
