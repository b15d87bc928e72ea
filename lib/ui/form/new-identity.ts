/** An identity that no record has yet: 80 random bits. Works on pages that are not served over a secure connection too. */
export const newIdentity = (): string => {
  const bytes = crypto.getRandomValues(new Uint8Array(10))
  return `n${Array.from(bytes, (byte) => byte.toString(16).padStart(2, '0')).join('')}`
}
