import { tooLarge, uploadLimit } from './upload-limit'
import type { VerifyAnswer, VerifyRefusal } from './verify-answer'

export type CheckOutcome = { ok: true; answer: VerifyAnswer } | { ok: false; message: string }

const noAnswer = 'The service did not answer: check your connection and try again.'

/** Sends a file to be checked. Whatever goes wrong comes back as one sentence. */
export async function checkFile(file: Blob): Promise<CheckOutcome> {
  if (file.size > uploadLimit) return { ok: false, message: tooLarge }
  try {
    const response = await fetch('/verify/check', {
      method: 'POST',
      headers: { 'content-type': 'application/pdf' },
      body: file,
    })
    if (response.ok) return { ok: true, answer: (await response.json()) as VerifyAnswer }
    const refusal = (await response.json()) as VerifyRefusal
    return { ok: false, message: refusal.message }
  } catch {
    return { ok: false, message: noAnswer }
  }
}
