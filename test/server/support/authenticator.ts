import { createHmac } from 'node:crypto'

const alphabet = 'ABCDEFGHIJKLMNOPQRSTUVWXYZ234567'

const fromBase32 = (text: string): Buffer => {
  const bits = [...text.replace(/=+$/, '')].map((one) => alphabet.indexOf(one).toString(2).padStart(5, '0')).join('')
  return Buffer.from((bits.match(/.{8}/g) ?? []).map((octet) => Number.parseInt(octet, 2)))
}

/** The code that an authenticator app shows for the address that was scanned (RFC 6238: SHA-1, 6 digits, 30 s), `steps` ahead of now. */
export function codeOf(address: string, steps = 0): string {
  const secret = fromBase32(new URL(address).searchParams.get('secret') ?? '')
  const counter = Buffer.alloc(8)
  counter.writeBigUInt64BE(BigInt(Math.floor(Date.now() / 30_000) + steps))
  const mac = createHmac('sha1', secret).update(counter).digest()
  const at = mac[mac.length - 1]! & 15
  return String((mac.readUInt32BE(at) & 0x7fffffff) % 1_000_000).padStart(6, '0')
}
