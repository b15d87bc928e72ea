import 'server-only'
import { DomainError, httpStatus } from '@/lib/errors'

/** Runs what a route is there for; a refusal becomes its problem document, a bug is logged and said in one sentence without details. */
export async function answer(run: () => Promise<Response>): Promise<Response> {
  try {
    return await run()
  } catch (error) {
    if (error instanceof DomainError) return problem(error)
    process.stderr.write(`${error instanceof Error ? (error.stack ?? error.message) : String(error)}\n`)
    return Response.json(
      { title: 'Something went wrong here; nothing was changed. Try again in a moment.', status: 500 },
      { status: 500, headers: problemHeaders },
    )
  }
}

const problemHeaders = { 'content-type': 'application/problem+json', 'cache-control': 'no-store' }

/** A refusal as a problem document (RFC 9457). */
function problem({ code, message, issues, detail }: DomainError): Response {
  const status = httpStatus[code]
  return Response.json(
    { title: message, status, code, issues, detail: detail ?? null },
    { status, headers: problemHeaders },
  )
}
