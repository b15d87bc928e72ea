import * as asn1js from 'asn1js'

/** A P-256 signature as browsers make it (r then s, 32 octets each) in the form that CMS holds: SEQUENCE { r INTEGER, s INTEGER }, DER. */
export function ecdsaToDer(value: Uint8Array): Uint8Array {
  return new Uint8Array(
    new asn1js.Sequence({ value: [integer(value.subarray(0, 32)), integer(value.subarray(32))] }).toBER(),
  )
}

/** The way back; undefined for anything that is not such a SEQUENCE with two numbers of at most 32 octets. */
export function ecdsaFromDer(der: Uint8Array): Uint8Array | undefined {
  const parsed = asn1js.fromBER(new Uint8Array(der))
  if (parsed.offset !== der.length || !(parsed.result instanceof asn1js.Sequence)) return undefined
  const numbers = parsed.result.valueBlock.value
  const raw = new Uint8Array(64)
  if (numbers.length !== 2) return undefined
  for (const [index, number] of numbers.entries()) {
    if (!(number instanceof asn1js.Integer)) return undefined
    const octets = stripZeros(number.valueBlock.valueHexView)
    if (octets.length > 32) return undefined
    raw.set(octets, 32 * (index + 1) - octets.length)
  }
  return raw
}

/** INTEGER is signed and shortest: no needless zeros, and one zero where the highest bit is set. */
function integer(unsigned: Uint8Array): asn1js.Integer {
  const octets = stripZeros(unsigned)
  const sign = octets.length === 0 || octets[0]! & 0x80 ? [0] : []
  return new asn1js.Integer({ valueHex: new Uint8Array([...sign, ...octets]) })
}

function stripZeros(octets: Uint8Array): Uint8Array {
  const first = octets.findIndex((octet) => octet !== 0)
  return first < 0 ? new Uint8Array() : octets.subarray(first)
}
