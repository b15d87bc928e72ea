import * as z from 'zod'
import { studyDocument } from './document/study-document'

/** The published description of the study file: JSON Schema of what a file may hold, made from the one zod schema. */
export const studyFileSchema = (): z.core.JSONSchema.BaseSchema => ({
  ...z.toJSONSchema(studyDocument, { io: 'input', target: 'draft-2020-12' }),
  title: 'Breakaway study file, version 1',
  description:
    'Records of a plant, the cases of a motor-starting study and its limits. Values are texts with their unit ("11 kV"), or a text with its source. Records refer to one another by their id.',
})

/** As it is written to a file. */
export const studyFileSchemaText = (): string => `${JSON.stringify(studyFileSchema(), null, 2)}\n`
