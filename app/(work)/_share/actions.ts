'use server'

import { attempt } from '@/app/_action/attempt'
import { linkTo } from '@/lib/server/link-token'
import { perform } from '@/lib/server/perform'
import { endShare, shareReport } from '@/lib/server/share/commands'

type Wanted = Omit<Parameters<typeof shareReport.run>[1], 'revisionId'>

export async function share(revisionId: string, wanted: Wanted) {
  return attempt(async (actor) => {
    const { token, expiresAt } = await perform(shareReport, actor, { ...wanted, revisionId })
    return { link: linkTo('share', token), expiresAt }
  })
}

export async function end(revisionId: string, shareId: string) {
  return attempt((actor) => perform(endShare, actor, { revisionId, shareId }))
}
