import 'server-only'
import { DomainError } from '@/lib/errors'
import { env } from '../env'
import { trustedOrigins } from '../origins'

/**
 * Refuses a change that another site's page asks a visitor's browser for. Route handlers are not guarded by the framework. A request
 * without either header comes from no browser and carries nobody's cookie by itself.
 */
export function requireSameOrigin(request: Request, origins: readonly string[] = trustedOrigins(env())): void {
  const origin = request.headers.get('origin')
  const site = request.headers.get('sec-fetch-site')
  const foreign =
    (origin !== null && !origins.includes(origin)) || (site !== null && site !== 'same-origin' && site !== 'none')
  if (foreign || (origin === null && site === null && request.headers.has('cookie'))) {
    throw new DomainError(
      'forbidden',
      'This request came from another site: open Breakaway itself and repeat it there.',
    )
  }
}
