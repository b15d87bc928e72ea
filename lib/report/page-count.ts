import { PDFDocument } from '@cantoo/pdf-lib'

/** Number of pages of a rendered report. */
export const pageCount = async (pdf: Uint8Array): Promise<number> =>
  (await PDFDocument.load(pdf, { updateMetadata: false })).getPageCount()
