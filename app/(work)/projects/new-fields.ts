import type { Field } from '@/lib/ui/form/field'

export const projectFields: readonly Field[] = [
  { kind: 'text', name: 'name', label: 'Name of the project' },
  { kind: 'text', name: 'client', label: 'Client', optional: true },
]

export const studyStartFields: readonly Field[] = [
  { kind: 'text', name: 'title', label: 'Title of the study' },
  { kind: 'text', name: 'documentNumber', label: 'Document number' },
  { kind: 'text', name: 'utility', label: 'Utility', optional: true },
  { kind: 'quantity', name: 'frequency', label: 'Frequency', quantity: 'frequency', initial: '50 Hz' },
  {
    kind: 'choice',
    name: 'numberStyle',
    label: 'How numbers are typed',
    initial: 'point',
    options: [
      { value: 'point', label: '1,250.5' },
      { value: 'comma', label: '1.250,5' },
    ],
  },
]
