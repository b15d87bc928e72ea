import 'server-only'
import { cache } from 'react'
import { ask } from '@/app/_action/ask'
import { studyView } from '@/lib/server/studies/queries'

/** The study of the page, read once a request for frame and page alike. */
export const studyOf = cache((studyId: string) => ask(studyView, { studyId }))
