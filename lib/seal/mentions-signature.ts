import { constants, inflateSync } from 'node:zlib'

const marks = ['/ByteRange', '/ETSI.CAdES.detached']
const packedLimit = 4 * 2 ** 20
const blocksLimit = 64

/**
 * True when the words of a signature's dictionary are found in a file that cannot be read as a report, also inside packed objects. It only
 * chooses between two wordings of a refusal: it proves nothing and is trusted with nothing.
 */
export function mentionsSignature(bytes: Uint8Array): boolean {
  const file = Buffer.from(bytes.buffer, bytes.byteOffset, bytes.length)
  if (marks.some((mark) => file.includes(mark, 0, 'latin1'))) return true
  let at = 0
  for (let block = 0; block < blocksLimit; block += 1) {
    const head = file.indexOf('/ObjStm', at, 'latin1')
    const start = head < 0 ? -1 : file.indexOf('stream\n', head, 'latin1')
    if (start < 0) return false
    if (marks.some((mark) => unpack(file.subarray(start + 7)).includes(mark, 0, 'latin1'))) return true
    at = start + 7
  }
  return false
}

function unpack(packed: Buffer): Buffer {
  try {
    return inflateSync(packed, { maxOutputLength: packedLimit, finishFlush: constants.Z_SYNC_FLUSH })
  } catch {
    return Buffer.alloc(0)
  }
}
