export interface Place {
  label: string
  href: string
  /** Also stands for the pages below it. */
  within?: string
  /** How many records stand there. */
  count?: number
}

/** The places of a study in the order of the work. */
export const studyPlaces = (projectId: string, studyId: string): readonly Place[] => {
  const study = `/studies/${studyId}`
  const plant = `/projects/${projectId}/plant`
  return [
    { label: 'Records', href: `${plant}/bus?study=${studyId}`, within: plant },
    { label: 'Cases', href: `${study}/cases`, within: `${study}/cases` },
    { label: 'Results', href: `${study}/results`, within: `${study}/results` },
    { label: 'Review', href: `${study}/review`, within: `${study}/review` },
    { label: 'Issue', href: `${study}/issue`, within: `${study}/issue` },
  ]
}
