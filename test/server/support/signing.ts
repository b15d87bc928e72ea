import { fromBase64, toBase64 } from '@/app/(account)/_signing/base64'
import { signAttributes } from '@/app/(account)/_signing/signing-key'
import type { Actor } from '@/lib/server/actor'
import { perform } from '@/lib/server/perform'
import { completeSignature, prepareSignature } from '@/lib/server/signoff/commands'
import type { SignOffRole } from '@/lib/study/states'

/** Signs as a browser does: asks what to sign, signs it with the person's own key, hands in the value. */
export async function signAs(actor: Actor, revisionId: string, role: SignOffRole, key: CryptoKey) {
  const { attributes, token } = await perform(prepareSignature, actor, { revisionId, role })
  const value = await signAttributes(key, fromBase64(attributes)!)
  return perform(completeSignature, actor, { revisionId, token, value: toBase64(value) })
}
