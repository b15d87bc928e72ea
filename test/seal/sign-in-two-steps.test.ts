import { mkdtempSync, rmSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import path from 'node:path'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { Authority } from '@/lib/seal/authority'
import { completeSignature } from '@/lib/seal/complete-signature'
import { readRevisions } from '@/lib/seal/pdf-revisions'
import { PdfView } from '@/lib/seal/pdf-view'
import { prepareSignature } from '@/lib/seal/prepare-signature'
import { signatureEntries } from '@/lib/seal/signature-entries'
import { runTool, toPem } from './support/debian-tool'
import { makeSigner, makeTestAuthority, type Signer } from './support/people'
import { reportToSign, signField, signInTurn } from './support/report'

let authority: Authority
let signers: Signer[]
let unsigned: Uint8Array
let states: Uint8Array[]
let folder: string
const at = new Date('2026-04-02T09:30:00Z')
const save = (name: string, contents: Uint8Array | string) => {
  writeFileSync(path.join(folder, name), contents)
  return path.join(folder, name)
}

beforeAll(async () => {
  folder = mkdtempSync(path.join(tmpdir(), 'seal-signing-'))
  authority = await makeTestAuthority()
  signers = await Promise.all([
    makeSigner(authority, 'Marit Solberg', '11'),
    makeSigner(authority, 'Дмитро Ковальчук', '12'),
    makeSigner(authority, 'Nguyễn Thị Hương', '13'),
  ])
  unsigned = await reportToSign()
  states = await signInTurn(unsigned, authority, signers)
})
afterAll(() => rmSync(folder, { recursive: true }))

describe('three people signing one report', () => {
  it('leaves three signatures that an outside reader finds valid and trusted under the organisation’s root', () => {
    const database = `sql:${folder}`
    const pdf = save('signed.pdf', states[2]!)
    runTool('certutil', ['-d', database, '-N', '--empty-password'])
    const root = save('root.pem', toPem(authority.certificate, 'CERTIFICATE'))
    expect(runTool('certutil', ['-d', database, '-A', '-n', 'Root', '-t', 'CT,C,C', '-i', root]).status).toBe(0)
    const { output } = runTool('pdfsig', ['-nssdir', database, pdf])
    expect(output.match(/Signature is Valid\./g)).toHaveLength(3)
    expect(output.match(/Certificate is Trusted\./g)).toHaveLength(3)
    expect(output.match(/Signature Type: ETSI.CAdES.detached/g)).toHaveLength(3)
    expect(output.match(/Total document signed/g)).toHaveLength(1)
    for (const name of ['Marit Solberg', 'Дмитро Ковальчук', 'Nguyễn Thị Hương'])
      expect(output).toContain(`Common Name: ${name}`)
  })

  it('is a sound file to an outside checker at every step', () => {
    for (const [index, state] of [unsigned, ...states].entries()) {
      const checked = runTool('qpdf', ['--check', save(`step-${index}.pdf`, state)])
      expect(checked.output).toContain('No syntax or stream encoding errors found')
      expect(checked.status).toBe(0)
    }
  })

  it('is CAdES to an independent implementation: the signing certificate is bound in', () => {
    const root = save('root.pem', toPem(authority.certificate, 'CERTIFICATE'))
    const last = states[2]!
    const dict = signatureEntries(new PdfView(readRevisions(last)))[2]!.signature!.dict
    const [, start, end] = dict
      .toString()
      .match(/ByteRange \[ 0 (\d+) (\d+)/)!
      .map(Number)
    const hex = Buffer.from(last.subarray(start! + 1, end! - 1)).toString('latin1')
    const cms = save('last.der', Buffer.from(hex, 'hex'))
    const content = save('last.bin', Buffer.concat([last.subarray(0, start), last.subarray(end)]))
    const common = [
      '-inform',
      'DER',
      '-in',
      cms,
      '-content',
      content,
      '-binary',
      '-CAfile',
      root,
      '-attime',
      '1780000000',
      '-out',
      path.join(folder, 'out'),
    ]
    expect(runTool('openssl', ['cms', '-verify', '-cades', ...common]).output).toContain(
      'CAdES Verification successful',
    )
  })

  it('only appends: each state begins with the bytes of the one before', () => {
    const all = [unsigned, ...states]
    for (const [index, state] of states.entries()) {
      expect(Buffer.compare(state.subarray(0, all[index]!.length), all[index]!)).toBe(0)
    }
    expect(readRevisions(states[2]!).revisions).toHaveLength(4)
  })

  it('adds less than 20 kB a signature', () => {
    expect(states[2]!.length - states[1]!.length).toBeLessThan(20_000)
  })
})

describe('the first step', () => {
  const order = () => ({ field: 'Prepared', certificate: signers[0]!.certificate, chain: [authority.certificate], at })

  it('gives equal bytes for equal input', async () => {
    expect(Buffer.compare(await reportToSign(), unsigned)).toBe(0)
    const [one, two] = [prepareSignature(unsigned, order()), prepareSignature(unsigned, order())]
    expect(Buffer.compare(one.pdf, two.pdf)).toBe(0)
    expect(Buffer.compare(one.attributes, two.attributes)).toBe(0)
  })

  it('refuses a field that is signed, one that is not there, and a certificate that is not in force', () => {
    expect(() => prepareSignature(states[0]!, order())).toThrow(/"Prepared by" has already been signed/)
    expect(() => prepareSignature(unsigned, { ...order(), field: 'Sealed' })).toThrow(
      /no place for the signature "Sealed"/,
    )
    expect(() => prepareSignature(unsigned, { ...order(), at: new Date('2031-01-01') })).toThrow(/not in force/)
  })

  it('refuses what is no report', () => {
    expect(() => prepareSignature(new TextEncoder().encode('hello'), order())).toThrow(/not a PDF file/)
    expect(() => prepareSignature(unsigned.subarray(0, unsigned.length - 40), order())).toThrow(/damaged/)
  })

  it('certifies with the first signature only, so that nothing but signatures may follow', () => {
    const references = states.map((state) =>
      signatureEntries(new PdfView(readRevisions(state)))
        .filter((entry) => entry.signature?.dict.toString().includes('/DocMDP'))
        .map((entry) => entry.name),
    )
    expect(references).toEqual([['Prepared'], ['Prepared'], ['Prepared']])
  })

  it('prints the address instead of a name whose letters the font lacks', async () => {
    const signer = await makeSigner(authority, '山田 an', '14')
    const pdf = save('fallback.pdf', await signField(unsigned, authority, signer, 'Prepared', at))
    const { output } = runTool('pdftotext', [pdf, '-'])
    expect(output).toContain('Prepared by')
    expect(output).toContain('.an@example.org')
    expect(output).toContain('2026-04-02 09:30 UTC')
  })
})

describe('the second step', () => {
  it('refuses a value by another key, of another length, or over other octets', async () => {
    const prepared = prepareSignature(unsigned, {
      field: 'Prepared',
      certificate: signers[0]!.certificate,
      chain: [authority.certificate],
      at,
    })
    const [mine, other] = signers
    for (const value of [
      await other!.sign(prepared.attributes),
      (await mine!.sign(prepared.attributes)).subarray(1),
      await mine!.sign(prepared.attributes.subarray(1)),
    ]) {
      expect(() => completeSignature(prepared, value)).toThrow(/not made with the key of Marit Solberg's certificate/)
    }
    expect(completeSignature(prepared, await mine!.sign(prepared.attributes)).length).toBe(prepared.pdf.length)
  })
})
