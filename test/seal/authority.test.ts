import { mkdtempSync, rmSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import path from 'node:path'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { DomainError } from '@/lib/errors'
import { type Authority, makeAuthority, signingAlgorithm } from '@/lib/seal/authority'
import { parseCertificate, readCertificate } from '@/lib/seal/certificate'
import { issueSigner } from '@/lib/seal/issue-signer'
import { makeRevocationList } from '@/lib/seal/revocation-list'
import { unwrapKey, wrapKey } from '@/lib/seal/wrapped-key'
import { x509 } from '@/lib/seal/x509'
import { runTool, toPem } from './support/debian-tool'
import { makeKey, makeSigner, makeTestAuthority, organisation, year } from './support/people'

let authority: Authority
let folder: string
const file = (name: string, contents: string) => {
  writeFileSync(path.join(folder, name), contents)
  return path.join(folder, name)
}

beforeAll(async () => {
  authority = await makeTestAuthority()
  folder = mkdtempSync(path.join(tmpdir(), 'seal-authority-'))
})
afterAll(() => rmSync(folder, { recursive: true }))

const person = { name: 'Ingrid Åsgård-O’Neill', email: 'ingrid@example.org', organisation }

describe('the certificate authority', () => {
  it('issues a signer whose chain an outside checker accepts under strict rules', async () => {
    const signer = await makeSigner(authority, 'Marit Solberg', '0a11')
    const root = file('root.pem', toPem(authority.certificate, 'CERTIFICATE'))
    const leaf = file('leaf.pem', toPem(signer.certificate, 'CERTIFICATE'))
    const strict = ['verify', '-x509_strict', '-purpose', 'smimesign', '-attime', '1780000000', '-CAfile', root, leaf]
    expect(runTool('openssl', strict)).toEqual({ status: 0, output: `${leaf}: OK\n` })
    const printed = runTool('openssl', ['x509', '-in', leaf, '-noout', '-text']).output
    expect(printed).toMatch(/Basic Constraints: critical\s+CA:FALSE/)
    expect(printed).toMatch(/Key Usage: critical\s+Digital Signature, Non Repudiation/)
    expect(printed).toMatch(/Extended Key Usage:\s+E-mail Protection/)
    expect(printed).toContain('email:marit.solberg@example.org')
  })

  it('can issue leaves only: a checker refuses whatever is issued below them', async () => {
    // Somebody with the authority's key issues a second authority, which issues a signer.
    const keys = await crypto.subtle.generateKey(signingAlgorithm, true, ['sign', 'verify'])
    const middle = await x509.X509CertificateGenerator.create({
      serialNumber: '0b01',
      subject: 'CN=Second authority',
      issuer: parseCertificate(authority.certificate).subjectName,
      ...year,
      publicKey: keys.publicKey,
      signingKey: authority.key,
      signingAlgorithm,
      extensions: [
        new x509.BasicConstraintsExtension(true, undefined, true),
        new x509.KeyUsagesExtension(x509.KeyUsageFlags.keyCertSign, true),
      ],
    })
    const below = await makeSigner(
      { certificate: new Uint8Array(middle.rawData), key: keys.privateKey },
      'Too Deep',
      '0b02',
    )
    const root = file('root.pem', toPem(authority.certificate, 'CERTIFICATE'))
    const second = file('second.pem', toPem(new Uint8Array(middle.rawData), 'CERTIFICATE'))
    const leaf = file('below.pem', toPem(below.certificate, 'CERTIFICATE'))
    const { output } = runTool('openssl', [
      'verify',
      '-attime',
      '1780000000',
      '-CAfile',
      root,
      '-untrusted',
      second,
      leaf,
    ])
    expect(output).toContain('path length constraint exceeded')
  })

  it('writes names with letters of any language and reads them back', async () => {
    const { proof } = await makeKey()
    const certificate = readCertificate(await issueSigner(authority, person, proof, '0c', year))
    expect(certificate.subject).toEqual(person)
    expect(certificate.notBefore).toEqual(year.notBefore)
    expect(certificate.fingerprint).toMatch(/^[0-9a-f]{64}$/)
    expect(Buffer.from(certificate.spki)).toEqual(Buffer.from(proof.spki))
  })

  it('refuses a key whose holder did not prove to have it', async () => {
    const [mine, other] = [await makeKey(), await makeKey()]
    const borrowed = { ...mine.proof, spki: other.proof.spki }
    await expect(issueSigner(authority, person, borrowed, '0d', year)).rejects.toThrow(
      /make the key again in this browser/,
    )
    const replayed = { ...mine.proof, challenge: new Uint8Array([9]) }
    await expect(issueSigner(authority, person, replayed, '0d', year)).rejects.toThrow(DomainError)
  })

  it('names each detail that cannot stand in a certificate', async () => {
    const { proof } = await makeKey()
    const wrong = { name: ' two\nlines', email: 'nobody', organisation: '' }
    const beyond = { notBefore: year.notBefore, notAfter: new Date('2050-01-01T00:00:00Z') }
    const refusal = await issueSigner(authority, wrong, proof, '0e', beyond).catch((error: unknown) => error)
    expect(refusal).toBeInstanceOf(DomainError)
    expect((refusal as DomainError).issues.map((issue) => issue.path[0])).toEqual([
      'name',
      'organisation',
      'email',
      'notAfter',
    ])
  })

  it('makes a revocation list that an outside checker applies', async () => {
    const revoked = await makeSigner(authority, 'Former Colleague', '0f01')
    const kept = await makeSigner(authority, 'Present Colleague', '0f02')
    const list = await makeRevocationList(
      authority,
      [{ serialNumber: '0f01', revokedAt: new Date('2026-03-01T00:00:00Z') }],
      300,
      new Date('2026-03-02T00:00:00Z'),
      new Date('2026-12-02T00:00:00Z'),
    )
    const root = file('root.pem', toPem(authority.certificate, 'CERTIFICATE'))
    const crl = file('root.crl', toPem(list, 'X509 CRL'))
    const check = (name: string, certificate: Uint8Array) =>
      runTool('openssl', [
        'verify',
        '-attime',
        '1780000000',
        '-crl_check',
        '-CRLfile',
        crl,
        '-CAfile',
        root,
        file(name, toPem(certificate, 'CERTIFICATE')),
      ])
    expect(check('revoked.pem', revoked.certificate).output).toContain('certificate revoked')
    expect(check('kept.pem', kept.certificate).output).toContain('OK')
    expect(runTool('openssl', ['crl', '-in', crl, '-noout', '-text']).output).toMatch(/X509v3 CRL Number:\s+300/)
  })
})

describe('the wrapped key of an authority', () => {
  it('issues again after it was stored and opened', async () => {
    const opened = await unwrapKey(await wrapKey(authority, 'a long secret'), authority.certificate, 'a long secret')
    const signer = await makeSigner(opened, 'Later Colleague', '1a')
    const issuer = parseCertificate(authority.certificate)
    await expect(
      parseCertificate(signer.certificate).verify({ publicKey: issuer.publicKey, signatureOnly: true }),
    ).resolves.toBe(true)
    expect(opened.key.extractable).toBe(false)
  })

  it('stays shut under another secret, another organisation, or when a byte is damaged', async () => {
    const wrapped = await wrapKey(authority, 'a long secret')
    const damaged = wrapped.slice()
    damaged[60]! ^= 1
    const other = await makeAuthority('Elsewhere', year.notBefore, year.notAfter)
    for (const attempt of [
      () => unwrapKey(wrapped, authority.certificate, 'a long secrer'),
      () => unwrapKey(wrapped, other.certificate, 'a long secret'),
      () => unwrapKey(damaged, authority.certificate, 'a long secret'),
      () => unwrapKey(new Uint8Array(5), authority.certificate, 'a long secret'),
    ]) {
      await expect(attempt()).rejects.toThrow(/does not open with the configured secret/)
    }
  })
})
