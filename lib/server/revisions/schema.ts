import * as z from 'zod'
import { idInput } from '../identity'

const words = (most: number) => z.string().trim().max(most, `Keep this within ${most} characters.`)

export const note = words(2000).default('')

export const reason = words(2000).min(1, 'Give the reason in a sentence.')

/** Purposes of issue that are offered; any other may be typed. */
export const purposes = [
  'For information',
  'For review',
  'For approval by the utility',
  'For construction',
  'As built',
] as const

export const purpose = words(80).min(1, 'Say for what the revision is issued.')

export const ofRevision = z.object({ revisionId: idInput })
