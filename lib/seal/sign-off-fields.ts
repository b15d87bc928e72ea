/** One signature field of a report: its name in the file and the words printed in its block. */
export interface SignOffField {
  readonly name: string
  readonly role: string
}

/** The three sign-offs in the order in which they are given; the names are those of the fields in the file. */
export const signOffFields = [
  { name: 'Prepared', role: 'Prepared by' },
  { name: 'Checked', role: 'Checked by' },
  { name: 'Approved', role: 'Approved by' },
] as const satisfies readonly SignOffField[]

export type SignOffFieldName = (typeof signOffFields)[number]['name']

/** The invisible field that stays empty until a document time stamp is put into the file. */
export const archiveFieldName = 'ArchiveTimestamp'

/** The name of the study document attached to each report. */
export const studyAttachmentName = 'study.json'

/** The name of the results attached beside it: the summary of the study's result, without curves. */
export const resultsAttachmentName = 'results.json'
