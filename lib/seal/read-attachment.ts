import type { PDFDict, PDFObject } from '@cantoo/pdf-lib'
import { inflateStream } from './inflate-stream'
import { readRevisions } from './pdf-revisions'
import { entry, PdfView } from './pdf-view'
import { textOf } from './signature-entries'
import { verificationLimits } from './verification-limits'

/**
 * The bytes of the file attached to a report under a name, as the last revision has them; undefined if there is none. A damaged or foreign
 * file and an attachment beyond the limit are refused. Source: ISO 32000-1, sections 7.9.6 (name trees) and 7.11.4 (embedded files).
 */
export function readAttachment(pdf: Uint8Array, name: string): Uint8Array | undefined {
  const view = new PdfView(readRevisions(pdf))
  const names = view.dict(entry(view.catalog, 'Names'))
  const specification = findByName(view, entry(names, 'EmbeddedFiles'), name, new Set())
  const stream = view.stream(entry(view.dict(entry(specification, 'EF')), 'F'))
  return stream && inflateStream(stream, verificationLimits.attachment)
}

function findByName(view: PdfView, node: PDFObject | undefined, name: string, seen: Set<PDFDict>): PDFDict | undefined {
  const dict = view.dict(node)
  if (!dict || seen.has(dict)) return undefined
  seen.add(dict)
  const pairs = view.items(entry(dict, 'Names'))
  for (let index = 0; index + 1 < pairs.length; index += 2) {
    if (textOf(view.resolve(pairs[index])) === name) return view.dict(pairs[index + 1])
  }
  for (const kid of view.items(entry(dict, 'Kids'))) {
    const found = findByName(view, kid, name, seen)
    if (found) return found
  }
  return undefined
}
