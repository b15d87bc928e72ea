import { NextResponse } from 'next/server'
import { DomainError, httpStatus } from '@/lib/errors'
import { read } from '@/lib/server/read'
import { currentActor } from '@/lib/server/session'
import { authorityCertificate } from '@/lib/server/signoff/queries'

/** The root certificate of an organisation, for readers who want to trust its signatures in their own viewer. */
export async function GET(_request: Request, { params }: RouteContext<'/authority/[organisationId]'>) {
  const { organisationId } = await params
  const actor = await currentActor()
  if (!actor) return new NextResponse('Sign in first, then download the certificate again.', { status: 401 })
  try {
    const { certificate, organisation } = await read(authorityCertificate, actor, { organisationId })
    const name = organisation.replace(/[^A-Za-z0-9]+/g, '-').toLowerCase()
    return new NextResponse(Buffer.from(certificate, 'base64'), {
      headers: {
        'content-type': 'application/pkix-cert',
        'content-disposition': `attachment; filename="${name}-root.cer"`,
      },
    })
  } catch (error) {
    if (!(error instanceof DomainError)) throw error
    return new NextResponse(error.message, { status: httpStatus[error.code] })
  }
}
