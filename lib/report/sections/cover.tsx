import type { ReactElement } from 'react'
import { signOffRoles } from '@/lib/study/states'
import { block, row, stack } from '../paper/block'
import { dataTable } from '../paper/data-table'
import { paragraph } from '../paper/text-block'
import type { ReportContext } from '../report-context'
import { colour, small } from '../theme'
import { paintLine, paintText } from '../type/paint-text'
import { plain, rich, wrapRuns } from '../type/rich-text'
import { printDate, printInstant } from '../values/dates'

/** Identities under which the places of the signature fields are found after layout. */
export const signatureBoxes = {
  prepared: 'sign-prepared',
  checked: 'sign-checked',
  approved: 'sign-approved',
  seal: 'sign-seal',
}

/** Height of the printed words at the top of a box, above the field. */
export const labelHeights = { person: 34, seal: 17 }

const title = ({ paper, input, words, width }: ReportContext): ReactElement => {
  const { head } = input.document
  const lines = wrapRuns(plain(head.title, 'semibold'), width, 25)
  const height = 96 + lines.length * 30
  return block(paper, { width, height, below: 22 }, (pdf) => {
    pdf.rect(0, 0, width, 2.4).fill(colour('accent'))
    paintText(pdf, head.organisation, 0, 24, { size: 12, weight: 'semibold', colour: colour('ink') })
    paintText(pdf, words.frame.kind, 0, 84, { size: 12, colour: colour('accent'), weight: 'semibold' })
    for (const [i, line] of lines.entries()) paintLine(pdf, line, 0, 114 + i * 30, { size: 25, colour: colour('ink') })
  })
}

/** The title block, as on a drawing: label above value, in ruled boxes. */
const titleBlock = ({ paper, input, words, width }: ReportContext): ReactElement => {
  const { head } = input.document
  const { revision } = input
  const { cover, states } = words.frame
  const rows = [
    [
      [cover.client, head.client],
      [cover.project, head.project],
    ],
    [
      [cover.documentNumber, head.documentNumber],
      [words.frame.revision, revision.number],
      [cover.state, states[revision.state]],
    ],
    [
      [cover.purpose, revision.purpose || cover.noPurpose],
      [cover.frozen, printInstant(revision.frozenAt, words)],
      [cover.utility, head.utility],
    ],
    [[cover.hash, revision.documentHash]],
  ] as const
  const pad = 5
  const laid = rows.map((cells) => {
    const cellWidth = width / cells.length
    const set = cells.map(([label, value]) => ({ label, lines: wrapRuns(plain(value), cellWidth - 2 * pad, 9.5) }))
    return { cellWidth, set, height: 15 + Math.max(...set.map(({ lines }) => lines.length)) * 12.5 + 4 }
  })
  const total = laid.reduce((sum, row) => sum + row.height, 0)
  return block(paper, { width, height: total + 2, below: 16 }, (pdf) => {
    let top = 1
    pdf.lineWidth(0.5).strokeColor(colour('rule'))
    for (const row of laid) {
      for (const [i, { label, lines }] of row.set.entries()) {
        const x = i * row.cellWidth
        pdf.rect(x, top, row.cellWidth, row.height).stroke(colour('rule'))
        paintText(pdf, label, x + pad, top + 10, { size: 7, colour: colour('soft') })
        for (const [k, line] of lines.entries())
          paintLine(pdf, line, x + pad, top + 22.5 + k * 12.5, { size: 9.5, colour: colour('ink') })
      }
      top += row.height
    }
    pdf.lineWidth(1.2).rect(0, 1, width, total).stroke(colour('ink'))
  })
}

const revisions = (context: ReportContext): ReactElement => {
  const { paper, input, words, width } = context
  const { cover } = words.frame
  return stack([
    ...paragraph(paper, `**${cover.revisionTable}**`, { width, below: 3, keep: 40 }),
    dataTable(paper, {
      width,
      columns: [
        { head: cover.revisionHeads.number, width: 34, fixed: true },
        { head: cover.revisionHeads.date, width: 92, fixed: true },
        { head: cover.revisionHeads.purpose, width: 1 },
        { head: cover.revisionHeads.changes, width: 2 },
      ],
      rows: input.revision.table.map((row) => [row.number, printDate(row.date, words), row.purpose, row.changes]),
      below: 14,
    }),
  ])
}

const signOff = (context: ReportContext): ReactElement => {
  const { paper, input, words, width } = context
  const { cover } = words.frame
  const gap = 9
  const boxWidth = (width - 2 * gap) / 3
  const height = 92
  const box = (id: string, role: string, name: string) =>
    block(paper, { id, width: boxWidth, height }, (pdf) => {
      pdf.lineWidth(0.8).rect(0, 0, boxWidth, height).stroke(colour('ink'))
      paintText(pdf, role, 5, 12, { size: 8, weight: 'semibold', colour: colour('ink') })
      paintText(pdf, name, 5, 25, { size: 9.5, colour: colour('ink') })
      pdf
        .lineWidth(0.4)
        .moveTo(5, 31)
        .lineTo(boxWidth - 5, 31)
        .stroke(colour('rule'))
      if (input.draft) paintText(pdf, cover.unsigned, 5, height - 6, { size: 6.5, colour: colour('soft') })
    })
  const boxes = signOffRoles.map((role) =>
    box(signatureBoxes[role], cover.roles[role], input.revision.people[role] ?? cover.nobody),
  )
  return stack([...paragraph(paper, `**${cover.signOff}**`, { width, below: 3 }), row(boxes, gap), seal(context)], {
    together: true,
  })
}

const seal = ({ paper, input, words, width }: ReportContext): ReactElement => {
  const { cover } = words.frame
  const height = 74
  const boxWidth = width / 3
  const lines = wrapRuns(rich(cover.sealNote), width - boxWidth - 14, small.size)
  return block(paper, { id: signatureBoxes.seal, width, height, above: 9 }, (pdf) => {
    pdf.lineWidth(0.8)
    if (!input.draft) pdf.dash([3, 2])
    pdf.rect(0, 0, boxWidth, height).stroke(colour('rule')).undash()
    paintText(pdf, cover.seal, 5, 12, { size: 8, weight: 'semibold', colour: colour('ink') })
    for (const [i, line] of lines.entries())
      paintLine(pdf, line, boxWidth + 10, 9 + i * small.leading, { size: small.size, colour: colour('soft') })
  })
}

export const cover = (context: ReportContext): readonly ReactElement[] => [
  title(context),
  titleBlock(context),
  revisions(context),
  signOff(context),
]
