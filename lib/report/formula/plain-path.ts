interface Pen {
  x: number
  y: number
  /** Control point of the quadratic just drawn; null after anything else. */
  control: readonly [number, number] | null
}

type Step = (pen: Pen, values: readonly number[]) => { pen: Pen; text: string }

const straight =
  (letter: 'M' | 'L', to: (pen: Pen, values: readonly number[]) => readonly [number, number]): Step =>
  (pen, values) => {
    const [x, y] = to(pen, values)
    return { pen: { x, y, control: null }, text: `${letter}${x} ${y}` }
  }

const quadratic = (control: readonly [number, number], x: number, y: number) => ({
  pen: { x, y, control },
  text: `Q${control[0]} ${control[1]} ${x} ${y}`,
})

const steps: Record<string, { size: number; step: Step }> = {
  M: { size: 2, step: straight('M', (_, [x = 0, y = 0]) => [x, y]) },
  L: { size: 2, step: straight('L', (_, [x = 0, y = 0]) => [x, y]) },
  H: { size: 1, step: straight('L', ({ y }, [x = 0]) => [x, y]) },
  V: { size: 1, step: straight('L', ({ x }, [y = 0]) => [x, y]) },
  Q: { size: 4, step: (_, [a = 0, b = 0, x = 0, y = 0]) => quadratic([a, b], x, y) },
  T: {
    size: 2,
    step: (pen, [x = 0, y = 0]) => {
      const [a, b] = pen.control ?? [pen.x, pen.y]
      return quadratic([2 * pen.x - a, 2 * pen.y - b], x, y)
    },
  },
}

/**
 * Path data with every smooth quadratic (T) written out with its control point, the mirror of the one before: the PDF
 * writer loses it over several in a row. Reads the absolute commands M, L, H, V, Q, T and Z, which is all that the
 * typesetter writes; anything else throws.
 */
export const plainPath = (d: string): string => {
  let pen: Pen = { x: 0, y: 0, control: null }
  const out: string[] = []
  for (const [, letter = '', list = ''] of d.matchAll(/([A-Za-z])([^A-Za-z]*)/g)) {
    if (letter === 'Z') {
      out.push('Z')
      continue
    }
    const command = steps[letter]
    if (!command) throw new Error(`A formula uses the path command ${letter}, which is not read.`)
    const values = (list.match(/-?\d*\.?\d+/g) ?? []).map(Number)
    for (let at = 0; at < values.length; at += command.size) {
      const next = command.step(pen, values.slice(at, at + command.size))
      pen = next.pen
      out.push(next.text)
    }
  }
  return out.join('')
}
