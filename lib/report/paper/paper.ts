import type { Pdf } from '../type/paint-text'

/** Where something stands once the report is laid out: page from 1, points from its top left. */
export interface Place {
  page: number
  left: number
  top: number
  width: number
  height: number
}

export interface Heading {
  id: string
  level: 1 | 2
  number: string
  title: string
}

/**
 * What one rendering shares between building, layout and painting: the headings in their order, the places found by the
 * layout, and the PDF being written. Elements are built before any place is known; they look it up when they are painted.
 */
export class Paper {
  readonly headings: Heading[] = []
  places: ReadonlyMap<string, Place> = new Map()
  #pdf: Pdf | null = null
  #outline: PDFKit.PDFOutline | null = null

  /** Hands over the PDF that the laid-out pages are painted into. */
  open(pdf: Pdf, places: ReadonlyMap<string, Place>): void {
    this.#pdf = pdf
    this.places = places
  }

  get pdf(): Pdf {
    if (!this.#pdf) throw new Error('The report is painted before its PDF is open.')
    return this.#pdf
  }

  pageOf(id: string): number | null {
    return this.places.get(id)?.page ?? null
  }

  /** Marks the place of a heading in the file: a destination for links and an entry of the outline. */
  mark(heading: Heading): void {
    const place = this.places.get(heading.id)
    if (!place) throw new Error(`The heading ${heading.id} was not laid out.`)
    this.pdf.addNamedDestination(heading.id, 'XYZ', 0, Math.max(0, place.top - 6), null)
    const title = heading.number === '' ? heading.title : `${heading.number} ${heading.title}`
    if (heading.level === 1) this.#outline = this.pdf.outline.addItem(title)
    else this.#outline?.addItem(title)
  }
}
