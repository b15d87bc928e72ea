import { PDFArray, PDFDict, PDFName, type PDFObject, PDFRawStream, PDFRef } from '@cantoo/pdf-lib'
import { broken } from './pdf-revisions'
import { entry, type PdfView } from './pdf-view'

/** The object numbers of the pages in reading order. */
export function pageNumbers(view: PdfView): number[] {
  const pages: number[] = []
  const seen = new Set<number>()
  const walk = (node: PDFObject | undefined) => {
    const dict = view.dict(node)
    if (!(node instanceof PDFRef) || !dict || seen.has(node.objectNumber)) throw broken('its pages are not in order')
    seen.add(node.objectNumber)
    if (entry(dict, 'Type') === PDFName.of('Page')) pages.push(node.objectNumber)
    else for (const kid of view.items(entry(dict, 'Kids'))) walk(kid)
  }
  walk(entry(view.catalog, 'Pages'))
  return pages
}

/** The pages, counted from 1, whose look depends on any of the given objects. */
export function pagesShowing(view: PdfView, objects: ReadonlySet<number>): number[] {
  const pages = pageNumbers(view)
  const boundary = new Set(pages)
  return pages.flatMap((page, index) => (reaches(view, page, objects, boundary) ? [index + 1] : []))
}

/** Follows references downwards from a page, never up to its parent nor across to another page. */
function reaches(view: PdfView, page: number, wanted: ReadonlySet<number>, boundary: ReadonlySet<number>): boolean {
  const seen = new Set<number>()
  const open: PDFObject[] = [PDFRef.of(page)]
  for (let next = open.pop(); next; next = open.pop()) {
    if (next instanceof PDFRef) {
      const number = next.objectNumber
      if (seen.has(number) || (number !== page && boundary.has(number))) continue
      if (wanted.has(number)) return true
      seen.add(number)
      const object = view.object(number)
      if (object) open.push(object)
    } else if (next instanceof PDFArray) open.push(...next.asArray())
    else if (next instanceof PDFRawStream) open.push(next.dict)
    else if (next instanceof PDFDict) {
      for (const [key, value] of next.entries()) if (!upward.has(key)) open.push(value)
    }
  }
  return false
}

/** Entries that lead from a page's parts back up or sideways, and change nothing of its look. */
const upward = new Set(
  ['Parent', 'P', 'Dest', 'A', 'StructParent', 'StructParents', 'Prev', 'Next'].map((key) => PDFName.of(key)),
)
