import { readFileSync } from 'node:fs'
import path from 'node:path'
import { describe, expect, it } from 'vitest'
import { decodeCms } from '@/lib/seal/cms'
import { readRevisions } from '@/lib/seal/pdf-revisions'
import { PdfView } from '@/lib/seal/pdf-view'
import { readAttachment } from '@/lib/seal/read-attachment'
import { signatureEntries } from '@/lib/seal/signature-entries'
import { verifySignedReport } from '@/lib/seal/verify-signed-report'
import { study } from './support/report'

const report = new Uint8Array(readFileSync(path.resolve('test/seal/golden/three-signatures.pdf')))

/** The certificates inside a report, in the order of its fields. */
function certificatesIn(pdf: Uint8Array): Uint8Array[] {
  return signatureEntries(new PdfView(readRevisions(pdf))).flatMap(({ signature }) => {
    const hex = /\/Contents <([0-9a-f]+)>/.exec(signature?.dict.toString() ?? '')?.[1]
    if (!hex) return []
    const octets = Buffer.from(hex, 'hex')
    return [decodeCms(octets.subarray(0, octets.readUInt16BE(2) + 4))!.certificate]
  })
}

describe('a report signed by an earlier version of this code', () => {
  it('stays valid, since reports are filed for ten years and more', () => {
    const listed = certificatesIn(report).map((certificate) => ({
      certificate,
      listedAt: new Date('2026-03-01T00:00:00Z'),
    }))
    const expected = ['Prepared', 'Checked', 'Approved']
    const now = new Date('2026-06-01T00:00:00Z')
    const verdict = verifySignedReport(report, { registered: [], listed, expected, now })
    expect(verdict).toMatchObject({ overall: 'valid', findings: [] })
    expect(verdict.signatures.map(({ signer }) => signer.name)).toEqual(['Marit Solberg', 'Tomas Ek', 'Aoife Byrne'])
    expect(Buffer.from(readAttachment(report, 'study.json')!).toString()).toBe(study)
  })
})
