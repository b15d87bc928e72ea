import { deflateSync } from 'node:zlib'
import { PDFDocument, PDFName, PDFRawStream } from '@cantoo/pdf-lib'
import { describe, expect, it } from 'vitest'
import { checkUpload } from '@/lib/seal/checked-upload'
import { readAttachment } from '@/lib/seal/read-attachment'
import { renderTestReport, reportToSign, study } from './support/report'

const context = { registered: [], listed: [], expected: [], now: new Date('2026-06-01T00:00:00Z') }

describe('the study attached to a report', () => {
  it('comes out as it went in, among other attachments', async () => {
    expect(Buffer.from(readAttachment(await reportToSign(), 'study.json')!).toString()).toBe(study)
    const document = await PDFDocument.load(await renderTestReport())
    await document.attach(Buffer.from('a letter'), 'letter.txt')
    const both = await document.save({ useObjectStreams: false })
    expect(Buffer.from(readAttachment(both, 'letter.txt')!).toString()).toBe('a letter')
    expect(Buffer.from(readAttachment(both, 'study.json')!).toString()).toBe(study)
    expect(readAttachment(both, 'other.json')).toBeUndefined()
  })

  it('is null when there is none, when it is no text, or when it unpacks to more than it may', async () => {
    const bare = await PDFDocument.create()
    bare.addPage()
    expect(checkUpload(await bare.save({ useObjectStreams: false }), context).study).toBeNull()
    expect(checkUpload(new Uint8Array([1, 2, 3]), context).study).toBeNull()
    for (const contents of [Buffer.from([0xff, 0xfe, 0xfd]), Buffer.alloc(33 * 2 ** 20)]) {
      expect(checkUpload(await withStudy(contents), context).study).toBeNull()
    }
  })
})

/** A report whose attached study is replaced by other contents. */
async function withStudy(contents: Uint8Array): Promise<Uint8Array> {
  const document = await PDFDocument.load(await renderTestReport())
  for (const [reference, object] of document.context.enumerateIndirectObjects()) {
    if (object instanceof PDFRawStream && object.dict.get(PDFName.of('Type')) === PDFName.of('EmbeddedFile')) {
      document.context.assign(reference, PDFRawStream.of(object.dict, deflateSync(contents)))
    }
  }
  return document.save({ useObjectStreams: false })
}
