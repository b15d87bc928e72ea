import * as z from 'zod'

/** Bytes in base64, up to so many once decoded. */
export const base64Bytes = (most: number) =>
  z
    .base64('This is not in base64.')
    .max(Math.ceil(most / 3) * 4, 'This is too long.')
    .transform((text) => new Uint8Array(Buffer.from(text, 'base64')))

export const toBase64 = (bytes: Uint8Array): string => Buffer.from(bytes).toString('base64')
