import { DomainError, httpStatus } from '@/lib/errors'
import { env } from '@/lib/server/env'
import { downloadShared } from '@/lib/server/share/download-shared'
import { refusalWord } from '../refusals'

export const dynamic = 'force-dynamic'

const quiet = { 'cache-control': 'private, no-store', 'referrer-policy': 'no-referrer', 'x-robots-tag': 'noindex' }

/** Another site's page must not use up the downloads of a link that it was told. */
const isForeign = (request: Request): boolean => {
  const from = request.headers.get('sec-fetch-site')
  return from !== null && from !== 'same-origin' && from !== 'none'
}

const passphraseIn = async (request: Request): Promise<string> => {
  const type = request.headers.get('content-type')?.split(';')[0]
  if (type !== 'application/x-www-form-urlencoded') return ''
  if (Number(request.headers.get('content-length') ?? 0) > 4096) return ''
  const given = (await request.formData()).get('passphrase')
  return typeof given === 'string' ? given : ''
}

/** Hands the report out. Only the button of the page comes here: opening a link, as mail scanners do, is answered by the page. */
export async function POST(request: Request, { params }: RouteContext<'/share/[token]/file'>): Promise<Response> {
  const { token } = await params
  if (isForeign(request))
    return new Response('Open the link itself and use its button.', { status: 403, headers: quiet })
  const header = env().TRUSTED_IP_HEADER
  const visitor = {
    ipAddress: (header && request.headers.get(header)?.slice(0, 64)) || null,
    userAgent: request.headers.get('user-agent'),
  }
  try {
    const { name, bytes } = await downloadShared(token, await passphraseIn(request), visitor)
    return new Response(bytes, {
      headers: {
        ...quiet,
        'content-type': 'application/pdf',
        'content-disposition': `attachment; filename="${name}"`,
      },
    })
  } catch (error) {
    if (!(error instanceof DomainError)) throw error
    const word = refusalWord(error.code)
    if (word === null) return new Response(error.message, { status: httpStatus[error.code], headers: quiet })
    return new Response(null, { status: 303, headers: { ...quiet, location: `/share/${token}?refused=${word}` } })
  }
}
