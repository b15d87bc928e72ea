import type { Field } from '@/lib/ui/form/field'
import { column, type KindDescription } from '../kind-description'
import { noteField, tagField } from './fields-for-all'

const changeOver: Field = {
  kind: 'variants',
  name: 'changeOver',
  label: 'Change-over',
  tag: 'kind',
  options: [
    {
      value: 'speed',
      label: 'at a speed',
      fields: [{ kind: 'quantity', name: 'at', label: 'Speed at the change-over', quantity: 'speed' }],
    },
    {
      value: 'time',
      label: 'after a time',
      fields: [{ kind: 'quantity', name: 'at', label: 'Time from switching on', quantity: 'time' }],
    },
  ],
}

const gap: Field = {
  kind: 'quantity',
  name: 'gap',
  label: 'Time without voltage',
  quantity: 'time',
  initial: '0 s',
  hint: '0 s for a closed transition.',
}

const duty: Field = {
  kind: 'text',
  name: 'duty',
  label: 'Permissible duty',
  optional: true,
  hint: 'From the maker, for example 3 starts of 20 s an hour.',
}

const own: Field = {
  kind: 'group',
  name: 'own',
  label: 'Own impedance',
  absent: 'taken as ideal',
  fields: [
    { kind: 'quantity', name: 'impedance', label: 'Impedance', quantity: 'ratio' },
    { kind: 'quantity', name: 'rating', label: 'On rating', quantity: 'apparent-power' },
    { kind: 'quantity', name: 'xOverR', label: 'X/R', quantity: 'ratio' },
  ],
}

export const starter: KindDescription = {
  kind: 'starter',
  one: 'starting method',
  many: 'Starting methods',
  empty: 'Add direct-on-line first, then the methods to be compared with it.',
  sourced: true,
  fields: [
    tagField(),
    {
      kind: 'variants',
      name: '',
      label: 'Method',
      tag: 'kind',
      options: [
        { value: 'direct', label: 'direct-on-line', fields: [] },
        {
          value: 'autotransformer',
          label: 'autotransformer',
          fields: [
            {
              kind: 'quantity',
              name: 'tap',
              label: 'Tap',
              quantity: 'ratio',
              hint: 'Motor voltage in parts of the line’s.',
            },
            own,
            changeOver,
            gap,
            duty,
          ],
        },
        { value: 'star-delta', label: 'star-delta', fields: [changeOver, gap, duty] },
      ],
    },
    noteField,
  ],
  columns: [
    column('Method', '', 'kind'),
    column('Tap', '', 'tap'),
    column('Own impedance', '', 'own'),
    column('Change-over', '', 'changeOver'),
    column('Gap', '', 'gap'),
    column('Duty', '', 'duty'),
    column('Note', 'note'),
  ],
}
