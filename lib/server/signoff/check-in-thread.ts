import 'server-only'
import path from 'node:path'
import type { CheckedUpload } from '@/lib/seal/checked-upload'
import type { VerificationContext } from '@/lib/seal/verification-context'
import { verifyInThread } from '@/lib/seal/verify-in-thread'
import { env } from '../env'

/** Checks an uploaded file in the thread that was bundled for it. */
export const checkInThread = (bytes: Uint8Array, context: VerificationContext): Promise<CheckedUpload> =>
  verifyInThread(bytes, context, { entry: path.resolve(env().JOBS_DIR, 'verify.js') })
