import { type PDFDict, PDFHexString, PDFName, type PDFObject, PDFRef, PDFString } from '@cantoo/pdf-lib'
import { entry, type PdfView } from './pdf-view'

/** A signature field of the file's form, signed or empty. */
export interface SignatureEntry {
  readonly name: string
  readonly role: string
  /** The object number of the field and its dictionary. */
  readonly number: number
  readonly field: PDFDict
  /** The signature's own object, once the field is signed. */
  readonly signature?: { readonly number: number; readonly dict: PDFDict }
}

/** The signature fields of the form as it stood at a revision, in the form's order. */
export function signatureEntries(view: PdfView): SignatureEntry[] {
  const form = view.dict(entry(view.catalog, 'AcroForm'))
  return view.items(entry(form, 'Fields')).flatMap((reference) => {
    const field = view.dict(reference)
    if (!(reference instanceof PDFRef) || !field || entry(field, 'FT') !== PDFName.of('Sig')) return []
    const value = entry(field, 'V')
    const dict = view.dict(value)
    const signature = value instanceof PDFRef && dict ? { number: value.objectNumber, dict } : undefined
    const name = textOf(view.resolve(entry(field, 'T')))
    const base = { name, role: textOf(view.resolve(entry(field, 'TU'))) || name, number: reference.objectNumber, field }
    return [signature ? { ...base, signature } : base]
  })
}

/** The text of a string object; empty for anything else. */
export function textOf(value: PDFObject | undefined): string {
  return value instanceof PDFHexString || value instanceof PDFString ? value.decodeText() : ''
}
