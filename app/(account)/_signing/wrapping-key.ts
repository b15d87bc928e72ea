/** The key that wraps a signing key, from the passphrase; letters are brought to one form, since keyboards write accents differently. */
export async function wrappingKey(
  passphrase: string,
  salt: Uint8Array<ArrayBuffer>,
  iterations: number,
): Promise<CryptoKey> {
  const typed = new TextEncoder().encode(passphrase.normalize('NFKC'))
  const material = await crypto.subtle.importKey('raw', typed, 'PBKDF2', false, ['deriveKey'])
  const derivation = { name: 'PBKDF2', hash: 'SHA-256', salt, iterations }
  return crypto.subtle.deriveKey(derivation, material, { name: 'AES-GCM', length: 256 }, false, [
    'wrapKey',
    'unwrapKey',
  ])
}
