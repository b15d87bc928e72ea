import 'server-only'
import { NextResponse } from 'next/server'
import { DomainError, httpStatus } from '@/lib/errors'
import { reportFile } from '@/lib/server/revisions/report-file'
import { currentActor } from '@/lib/server/session'

/** The report of a revision for saving, or one sentence about why not. */
export const reportResponse = async (revisionId: string): Promise<Response> => {
  const actor = await currentActor()
  if (!actor) return new NextResponse('Sign in first, then download the report again.', { status: 401 })
  try {
    const { name, bytes } = await reportFile(actor, revisionId)
    return new NextResponse(bytes, {
      headers: {
        'content-type': 'application/pdf',
        'content-disposition': `attachment; filename="${name}"`,
        'cache-control': 'private, no-store',
      },
    })
  } catch (error) {
    if (!(error instanceof DomainError)) throw error
    return new NextResponse(error.message, { status: httpStatus[error.code] })
  }
}
