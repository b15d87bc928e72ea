import { DomainError, httpStatus } from '@/lib/errors'
import { type VerifiedUpload, verifyUpload } from '@/lib/server/signoff/verify-upload'
import { standingLine } from '../standing-line'
import type { VerifyAnswer, VerifyRefusal } from '../verify-answer'
import { readBody } from './read-body'

export const dynamic = 'force-dynamic'

/** Checks one PDF, sent as the raw body, for anybody; nothing of it is kept. */
export async function POST(request: Request): Promise<Response> {
  try {
    refuseOthers(request)
    return answer(200, answerOf(await verifyUpload(await readBody(request))))
  } catch (error) {
    if (!(error instanceof DomainError)) throw error
    return answer(httpStatus[error.code], { message: error.message })
  }
}

/** Another site must not have its visitors' browsers send us work. */
function refuseOthers(request: Request): void {
  const from = request.headers.get('sec-fetch-site')
  if (from !== null && from !== 'same-origin' && from !== 'none') {
    throw new DomainError('forbidden', 'Files are checked from this service’s own page only.')
  }
  if (request.headers.get('content-type')?.split(';')[0] !== 'application/pdf') {
    throw new DomainError('unsupported', 'Send the PDF itself, as application/pdf.')
  }
}

function answerOf({
  verdict,
  standing,
  organisation,
  study,
  results = null,
}: VerifiedUpload & { results?: string | null }): VerifyAnswer {
  const { overall, sentence, sha256, registered, signatures, findings } = verdict
  return {
    overall,
    sentence,
    sha256,
    registered,
    organisation,
    standing: standingLine(standing),
    signatures,
    findings,
    study,
    results,
  }
}

function answer(status: number, body: VerifyAnswer | VerifyRefusal): Response {
  return Response.json(body, { status, headers: { 'cache-control': 'no-store' } })
}
