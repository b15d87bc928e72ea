import { readFileSync } from 'node:fs'
import path from 'node:path'
import { AFRelationship, PDFDocument } from '@cantoo/pdf-lib'
import * as fontkit from 'fontkit'
import type { Authority } from '@/lib/seal/authority'
import { completeSignature } from '@/lib/seal/complete-signature'
import { prepareSignature } from '@/lib/seal/prepare-signature'
import { archiveFieldName, signOffFields, studyAttachmentName } from '@/lib/seal/sign-off-fields'
import { addSignatureFields } from '@/lib/seal/signature-fields'
import type { Signer } from './people'

export const sourceSans = readFileSync(path.resolve('node_modules/source-sans/TTF/SourceSans3-Regular.ttf'))
export const study = JSON.stringify({ title: 'Raw-water pump, invented', motors: ['P-101'], note: 'Ω ≤ ² Δ φ' })
const rendered = new Date('2026-04-01T08:00:00Z')

/** Three pages with the study attached, before any signature field. */
export async function renderTestReport(): Promise<Uint8Array> {
  const document = await PDFDocument.create({ updateMetadata: false })
  document.registerFontkit(fontkit)
  const font = await document.embedFont(sourceSans, { subset: true, customName: 'TESTED+SourceSans3-Regular' })
  for (const title of ['Cover', 'Results: the voltage at the PCC falls to 0.91 pu', 'Limits']) {
    document.addPage([595, 842]).drawText(title, { x: 60, y: 760, size: 14, font })
  }
  await document.attach(Buffer.from(study), studyAttachmentName, {
    mimeType: 'application/json',
    afRelationship: AFRelationship.Source,
    creationDate: rendered,
    modificationDate: rendered,
  })
  const id = document.context.obj(['c0ffee', 'c0ffee'].map((text) => Buffer.from(text)))
  document.context.trailerInfo.ID = id
  return document.save({ useObjectStreams: false })
}

/** The same, ready to be signed by three people on its cover. */
export async function reportToSign(): Promise<Uint8Array> {
  const fields = signOffFields.map((field, index) => {
    const left = 60 + 165 * index
    return { ...field, page: 0, rectangle: [left, 100, left + 155, 160] as const }
  })
  return addSignatureFields(await renderTestReport(), { fields, archiveField: archiveFieldName, font: sourceSans })
}

/** Both steps of one signature. */
export async function signField(
  pdf: Uint8Array,
  authority: Authority,
  signer: Signer,
  field: string,
  at: Date,
): Promise<Uint8Array> {
  const order = {
    field,
    certificate: signer.certificate,
    chain: [authority.certificate],
    at,
    reason: `Signed as ${field}`,
  }
  const prepared = prepareSignature(pdf, order)
  return completeSignature(prepared, await signer.sign(prepared.attributes))
}

/** The report after each of its three signatures. */
export async function signInTurn(
  pdf: Uint8Array,
  authority: Authority,
  signers: readonly Signer[],
): Promise<Uint8Array[]> {
  const states: Uint8Array[] = []
  let current = pdf
  for (const [index, { name }] of signOffFields.entries()) {
    const signer = signers[index]
    if (!signer) break
    current = await signField(current, authority, signer, name, new Date(Date.UTC(2026, 3, 2 + index, 9, 30)))
    states.push(current)
  }
  return states
}
