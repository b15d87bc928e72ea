import { Canvas, View } from '@react-pdf/renderer'
import { createElement, type ReactElement } from 'react'
import type { Pdf } from '../type/paint-text'
import type { Paper } from './paper'

export interface BlockOptions {
  /** Name by which its place is found after layout. */
  id?: string
  width: number
  height: number
  above?: number
  below?: number
  /** No page ends within this many points after the block. */
  keep?: number
  /** Repeats at the head of each page that its parent goes on to. */
  repeats?: boolean
}

/** A rectangle of paper that is painted as a whole and never split; its origin is at its top left. */
export const block = (paper: Paper, options: BlockOptions, paint: (pdf: Pdf) => void): ReactElement => {
  const { id, width, height, above = 0, below = 0, keep, repeats } = options
  const canvas = (
    <Canvas
      id={id}
      style={{ width, height, marginTop: above, marginBottom: below }}
      minPresenceAhead={keep}
      fixed={repeats}
      paint={() => {
        paint(paper.pdf)
        return null
      }}
    />
  )
  return canvas
}

/** Elements one below the other; children need no keys because their order never changes. */
export const stack = (
  children: readonly ReactElement[],
  options: { id?: string; keep?: number; together?: boolean; breakBefore?: boolean } = {},
): ReactElement =>
  createElement(
    View,
    {
      id: options.id,
      minPresenceAhead: options.keep,
      wrap: options.together !== true,
      break: options.breakBefore,
    },
    ...children,
  )

/** Elements side by side. */
export const row = (children: readonly ReactElement[], gap: number): ReactElement =>
  createElement(View, { style: { flexDirection: 'row', gap } }, ...children)
