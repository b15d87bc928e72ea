import { PDFDocument } from '@cantoo/pdf-lib'
import { beforeAll, describe, expect, it } from 'vitest'
import type { Authority } from '@/lib/seal/authority'
import { issueSigner } from '@/lib/seal/issue-signer'
import { readRevisions } from '@/lib/seal/pdf-revisions'
import { sha256Hex } from '@/lib/seal/sha256'
import { signOffFields } from '@/lib/seal/sign-off-fields'
import { addSignatureFields } from '@/lib/seal/signature-fields'
import type { FindingKind, ReportVerdict } from '@/lib/seal/verdict'
import type { ListedCertificate, VerificationContext } from '@/lib/seal/verification-context'
import { verifySignedReport } from '@/lib/seal/verify-signed-report'
import { makeKey, makeSigner, makeTestAuthority, organisation, type Signer, year } from './support/people'
import { renderTestReport, reportToSign, signField, signInTurn, sourceSans } from './support/report'

const names = ['Marit Solberg', 'Tomas Ek', 'Aoife Byrne']
const expected = signOffFields.map((field) => field.name)
const now = new Date('2026-06-01T00:00:00Z')
const listedAt = new Date('2026-03-01T00:00:00Z')

let authority: Authority
let signers: Signer[]
let listed: ListedCertificate[]
let unsigned: Uint8Array
let states: Uint8Array[]
let issued: Uint8Array

beforeAll(async () => {
  authority = await makeTestAuthority()
  signers = await Promise.all(names.map((name, index) => makeSigner(authority, name, `2${index}`)))
  listed = signers.map(({ certificate }) => ({ certificate, listedAt }))
  unsigned = await reportToSign()
  states = await signInTurn(unsigned, authority, signers)
  issued = states[2]!
})

const check = (pdf: Uint8Array, change: Partial<VerificationContext> = {}): ReportVerdict =>
  verifySignedReport(pdf, { registered: [sha256Hex(issued)], listed, expected, now, ...change })
const kinds = (verdict: ReportVerdict): FindingKind[] =>
  [...new Set(verdict.findings.map((finding) => finding.kind))].sort()
const stands = (verdict: ReportVerdict) => verdict.signatures.map((signature) => signature.stands)

/** Where the contents of each signature lie, in the order of signing. */
function contentsOf(pdf: Uint8Array) {
  const text = Buffer.from(pdf).toString('latin1')
  return [...text.matchAll(/\/Contents <([0-9a-f]+)>/g)].map((match) => {
    const start = match.index + '/Contents <'.length
    return { start, end: start + match[1]!.length, used: match[1]!.replace(/(?:00)+$/, '').length }
  })
}

const flip = (pdf: Uint8Array, at: number, bit = 1) => {
  const copy = new Uint8Array(pdf)
  copy[at]! ^= bit
  return copy
}
const join = (...pieces: (Uint8Array | string)[]) =>
  new Uint8Array(Buffer.concat(pieces.map((piece) => Buffer.from(piece as Uint8Array))))

describe('a report as issued', () => {
  it('is valid, with its three signers and what each covers', () => {
    const verdict = check(issued)
    expect(verdict).toMatchObject({ overall: 'valid', registered: true, findings: [], sha256: sha256Hex(issued) })
    expect(verdict.signatures.map(({ role, signer, trust, signedAt }) => [role, signer.name, trust, signedAt])).toEqual(
      [
        ['Prepared by', 'Marit Solberg', 'trusted', '2026-04-02T09:30:00.000Z'],
        ['Checked by', 'Tomas Ek', 'trusted', '2026-04-03T09:30:00.000Z'],
        ['Approved by', 'Aoife Byrne', 'trusted', '2026-04-04T09:30:00.000Z'],
      ],
    )
    expect(verdict.signatures.map(({ covers }) => [covers.bytes, covers.revision])).toEqual(
      states.map((state, index) => [state.length, index + 2]),
    )
    expect(stands(verdict)).toEqual([true, true, true])
    expect(verdict.signatures[0]).toMatchObject({
      reason: 'Signed as Prepared',
      fingerprint: sha256Hex(signers[0]!.certificate),
      signer: { organisation, email: 'marit.solberg@example.org' },
    })
  })

  it('stands by its certificates when it is not in the register, and says so', () => {
    const verdict = check(issued, { registered: [] })
    expect(verdict).toMatchObject({ overall: 'valid', registered: false })
    expect(verdict.sentence).toContain('not in the register of issued reports')
  })
})

describe('a report that was tampered with', () => {
  it('is caught when one byte of a page is flipped', () => {
    const verdict = check(flip(issued, Buffer.from(issued).indexOf('stream\n', 0, 'latin1') + 20))
    expect(verdict).toMatchObject({ overall: 'changed', registered: false })
    expect(kinds(verdict)).toEqual(['content-altered'])
    expect(stands(verdict)).toEqual([false, false, false])
  })

  it('is caught when bytes or a revision are appended', () => {
    for (const tail of ['x', '\n%%EOF appended', ' '.repeat(4000)]) {
      const verdict = check(join(issued, tail))
      expect(verdict.overall).toBe('changed')
      expect(kinds(verdict)).toEqual(['trailing-bytes'])
      expect(verdict.signatures.map((signature) => signature.intact)).toEqual([true, true, true])
      expect(stands(verdict)).toEqual([false, false, false])
    }
  })

  it('is caught when an appended revision paints over a page, and the page is named', async () => {
    const document = await PDFDocument.load(issued, { forIncrementalUpdate: true, updateMetadata: false })
    document.getPage(1).drawRectangle({ x: 50, y: 700, width: 400, height: 90 })
    const verdict = check(await document.commit({ useObjectStreams: false }))
    expect(verdict.overall).toBe('changed')
    expect(verdict.findings.find((finding) => finding.kind === 'changed-page')).toMatchObject({
      pages: [2],
      sentence: 'Revision 5 changes the look of page 2.',
    })
    expect(kinds(verdict)).toContain('unsigned-revision')
    expect(verdict.signatures.map((signature) => signature.intact)).toEqual([true, true, true])
    expect(stands(verdict)).toEqual([false, false, false])
  })

  it('is caught when a page is painted over between two signatures by somebody who then signs', async () => {
    const document = await PDFDocument.load(states[0]!, { forIncrementalUpdate: true, updateMetadata: false })
    document.getPage(2).drawRectangle({ x: 50, y: 700, width: 400, height: 90 })
    const painted = await document.commit({ useObjectStreams: false })
    const signed = await signField(painted, authority, signers[1]!, 'Checked', new Date('2026-04-03T09:30:00Z'))
    const verdict = check(signed)
    expect(verdict.overall).toBe('changed')
    expect(verdict.findings.find((finding) => finding.kind === 'changed-page')?.pages).toEqual([3])
    expect(stands(verdict)).toEqual([false, true])
  })

  it('is caught when a page is taken out by an appended revision', async () => {
    const document = await PDFDocument.load(issued, { forIncrementalUpdate: true, updateMetadata: false })
    document.removePage(1)
    const verdict = check(await document.commit({ useObjectStreams: false }))
    expect(verdict.overall).toBe('changed')
    expect(kinds(verdict)).toContain('unsigned-revision')
  })

  it('is incomplete when it is cut back to an earlier signature, though nothing in it is altered', () => {
    const verdict = check(states[0]!)
    expect(verdict.overall).toBe('incomplete')
    expect(stands(verdict)).toEqual([true])
    expect(verdict.findings.map((finding) => [finding.kind, finding.field])).toEqual([
      ['missing-signer', 'Checked'],
      ['missing-signer', 'Approved'],
    ])
    expect(check(issued.slice(0, states[1]!.length)).overall).toBe('incomplete')
  })

  it('is caught when one byte within the second signature is altered, and when its padding is not zero', () => {
    const [, second] = contentsOf(issued)
    const swap = (at: number, to: string) => join(issued.subarray(0, at), to, issued.subarray(at + 1))
    for (const at of [second!.start, second!.start + 7, second!.start + 301, second!.start + second!.used - 40]) {
      const digit = String.fromCharCode(issued[at]!)
      const verdict = check(swap(at, digit === '5' ? '6' : '5'))
      expect(verdict.overall).toBe('changed')
      expect(verdict.signatures[0]?.intact).toBe(true)
      expect(stands(verdict).slice(1)).toEqual([false, false])
    }
    const padded = check(swap(second!.end - 1, '1'))
    expect(padded.overall).toBe('changed')
    expect(kinds(padded)).toContain('padding')
  })

  it('is caught when padding behind the last signature is not zero, which no other signature covers', () => {
    const last = contentsOf(issued)[2]!
    const verdict = check(flip(issued, last.end - 1))
    expect(verdict.overall).toBe('changed')
    expect(kinds(verdict)).toEqual(['padding'])
  })

  it('is caught when another program writes it anew, in either form of object tables', async () => {
    const document = await PDFDocument.load(issued, { updateMetadata: false })
    const plain = check(await document.save({ useObjectStreams: false }))
    expect(plain.overall).toBe('changed')
    expect(kinds(plain)).toContain('byte-range')
    const packed = check(await document.save({ useObjectStreams: true }))
    expect(packed.overall).toBe('changed')
    expect(packed.findings[0]?.sentence).toContain('another program wrote it anew')
  })

  it('is caught wherever a single bit is flipped', () => {
    const last = contentsOf(issued)[2]!
    const survivors: number[] = []
    const tryFlip = (at: number, bit: number) => {
      const verdict = check(flip(issued, at, bit))
      if (verdict.overall === 'valid' || verdict.overall === 'incomplete') survivors.push(at)
    }
    // Spread over the whole file, then closely over what only the last signature itself protects.
    for (let at = 7; at < issued.length; at += 2503) tryFlip(at, 1 << (at % 8))
    for (let at = last.start; at < last.start + last.used; at += 53) tryFlip(at, 1 << (at % 7))
    expect(survivors).toEqual([])
  })
})

describe('a byte range that does not say what it should', () => {
  it('is caught when it leaves out more than the signature', async () => {
    const [first] = contentsOf(states[0]!)
    const text = Buffer.from(states[0]!).toString('latin1')
    const range = /\/ByteRange \[ 0 (\d+) (\d+) (\d+) \]/.exec(text)!
    const wider = `/ByteRange [ 0 ${Number(range[1]) - 1} ${range[2]} ${range[3]} ]`
    const moved = join(states[0]!.subarray(0, range.index), wider, states[0]!.subarray(range.index + range[0].length))
    expect(first!.start).toBe(Number(range[1]) + 1)
    expect(kinds(check(moved))).toContain('byte-range')
    expect(check(moved).overall).toBe('changed')
  })
})

describe('certificates', () => {
  it('of a look-alike do not count: same names, another key', async () => {
    const impostors = await Promise.all(names.map((name, index) => makeSigner(authority, name, `2${index}`)))
    const forged = (await signInTurn(unsigned, authority, impostors))[2]!
    const verdict = check(forged)
    expect(verdict.overall).toBe('unknown-signer')
    expect(verdict.findings.map((finding) => finding.kind)).toEqual(['look-alike', 'look-alike', 'look-alike'])
    expect(verdict.signatures.map(({ trust, stands: holds }) => [trust, holds])).toEqual(
      Array(3).fill(['unknown', true]),
    )
  })

  it('of a look-alike authority do not count either', async () => {
    const other = await makeTestAuthority()
    const impostor = await makeSigner(other, names[2]!, '22')
    const forged = await signField(states[1]!, other, impostor, 'Approved', new Date('2026-04-04T09:30:00Z'))
    const verdict = check(forged)
    expect(verdict.overall).toBe('unknown-signer')
    expect(kinds(verdict)).toEqual(['look-alike'])
    expect(verdict.findings[0]?.sentence).toContain('Aoife Byrne')
  })

  it('carried with an authority that did not issue them are refused', async () => {
    const other = await makeTestAuthority()
    const verdict = check(await signField(unsigned, other, signers[0]!, 'Prepared', new Date('2026-04-02T09:30:00Z')))
    expect(verdict.overall).toBe('changed')
    expect(kinds(verdict)).toContain('certificate-form')
  })

  it('listed after the signature, expired then, or revoked before it, do not count', () => {
    const since = (change: Partial<ListedCertificate>) => [{ ...listed[0]!, ...change }, ...listed.slice(1)]
    const late = check(issued, { listed: since({ listedAt: new Date('2026-04-05T00:00:00Z') }) })
    expect([late.overall, late.signatures[0]?.trust]).toEqual(['unknown-signer', 'unknown'])
    const revoked = check(issued, { listed: since({ revokedAt: new Date('2026-04-01T00:00:00Z') }) })
    expect([revoked.overall, revoked.signatures[0]?.trust]).toEqual(['unknown-signer', 'revoked'])
  })

  it('revoked or expired since leave a registered report standing, and no other', () => {
    const revoked = listed.map((entry) => ({ ...entry, revokedAt: new Date('2026-05-01T00:00:00Z') }))
    expect(check(issued, { listed: revoked }).overall).toBe('valid')
    expect(check(issued, { listed: revoked }).signatures[0]?.trustSentence).toContain(
      'revoked on 2026-05-01, after this signature',
    )
    expect(check(issued, { listed: revoked, registered: [] }).signatures[0]?.trust).toBe('revoked')
    const later = new Date('2033-01-01T00:00:00Z')
    expect(check(issued, { now: later }).overall).toBe('valid')
    expect(check(issued, { now: later, registered: [] }).signatures[0]?.trust).toBe('expired')
  })

  it('of one person cannot stand for two roles', async () => {
    const twice = await signInTurn(unsigned, authority, [signers[0]!, signers[0]!, signers[2]!])
    const verdict = check(twice[2]!)
    expect(verdict.overall).toBe('incomplete')
    expect(kinds(verdict)).toEqual(['same-signer'])
  })

  it('must sign in the order of the sign-offs', async () => {
    const at = (day: number) => new Date(Date.UTC(2026, 3, day, 9, 30))
    const first = await signField(unsigned, authority, signers[1]!, 'Checked', at(2))
    const second = await signField(first, authority, signers[0]!, 'Prepared', at(3))
    const third = await signField(second, authority, signers[2]!, 'Approved', at(4))
    expect(check(third).overall).toBe('incomplete')
    expect(kinds(check(third))).toEqual(['order'])
  })

  it('with hostile names change nothing but what is shown', async () => {
    const { proof, sign } = await makeKey()
    const person = { name: 'x) /Contents <00> (', email: 'x@example.org', organisation }
    const certificate = await issueSigner(authority, person, proof, '31', year)
    const signed = await signInTurn(unsigned, authority, [{ certificate, sign }, signers[1]!, signers[2]!])
    const verdict = check(signed[2]!, { listed: [...listed, { certificate, listedAt }] })
    expect([verdict.overall, verdict.signatures[0]?.signer.name]).toEqual(['valid', person.name])
  })
})

describe('a file that is no signed report', () => {
  it('is said not to be signed', async () => {
    expect(check(await renderTestReport())).toMatchObject({ overall: 'not-signed', signatures: [], findings: [] })
    expect(check(unsigned).overall).toBe('not-signed')
    const ordinary = await PDFDocument.create()
    ordinary.addPage()
    expect(check(await ordinary.save()).overall).toBe('not-signed')
  })

  it('is said to be unreadable, with the reason', async () => {
    const encrypted = await PDFDocument.create()
    encrypted.addPage()
    encrypted.encrypt({ userPassword: 'a', ownerPassword: 'b' })
    const cases: [Uint8Array, RegExp][] = [
      [new Uint8Array(), /not a PDF file/],
      [new TextEncoder().encode('PK\u0003\u0004 a letter'), /not a PDF file/],
      [new TextEncoder().encode('%PDF-1.7\n'), /end is missing/],
      [await encrypted.save({ useObjectStreams: false }), /encrypted/],
      [join('%PDF-1.7\n', new Uint8Array(20 * 2 ** 20)), /larger than 20 MB/],
    ]
    for (const [file, reason] of cases) {
      const verdict = check(file)
      expect(verdict.overall).toBe('unreadable')
      expect(verdict.sentence).toMatch(reason)
    }
  })

  it('is refused when it holds more revisions than a report can', async () => {
    let grown = await renderTestReport()
    for (let round = 0; round < 16; round += 1) {
      const at = readRevisions(grown).revisions.at(-1)!.xrefAt
      const root = Buffer.from(grown)
        .toString('latin1')
        .match(/\/Root \d+ 0 R/)![0]
      grown = join(
        grown,
        '\n',
        `xref\n0 0\ntrailer\n<< /Size 90 ${root} /Prev ${at} >>\nstartxref\n${grown.length + 1}\n%%EOF\n`,
      )
      if (round === 14) expect(check(grown).overall).toBe('changed')
    }
    expect(check(grown)).toMatchObject({ overall: 'unreadable' })
  })

  it('is refused when its tables lead in a circle or its values nest without end', () => {
    const circle = '%PDF-1.7\nxref\n0 0\ntrailer\n<< /Size 1 /Prev 9 >>\nstartxref\n9\n%%EOF\n'
    expect(check(new TextEncoder().encode(circle)).overall).toBe('unreadable')
    const deep = `%PDF-1.7\nxref\n0 0\ntrailer\n<< /Root ${'['.repeat(2_000_000)} >>\nstartxref\n9\n%%EOF\n`
    expect(check(new TextEncoder().encode(deep)).overall).toBe('unreadable')
  })

  it('signed elsewhere, under names that are none of ours, is somebody else’s', async () => {
    const places = { fields: [{ name: 'Seller', role: 'Seller', page: 0, rectangle: [60, 100, 200, 160] as const }] }
    const contract = await addSignatureFields(await renderTestReport(), {
      ...places,
      archiveField: 'Later',
      font: sourceSans,
    })
    const stranger = await makeTestAuthority('Elsewhere')
    const signer = await makeSigner(stranger, 'Somebody Else', '41')
    const signed = await signField(contract, stranger, signer, 'Seller', new Date('2026-04-02T09:30:00Z'))
    expect(check(signed)).toMatchObject({ overall: 'unknown-signer', signatures: [{ role: 'Seller', intact: true }] })
  })
})
