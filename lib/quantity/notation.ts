const superscripts: Record<string, string> = {
  '⁻': '-',
  '¹': '1',
  '²': '2',
  '³': '3',
  '⁴': '4',
  '⁵': '5',
  '⁶': '6',
  '⁷': '7',
  '⁸': '8',
  '⁹': '9',
  '⁰': '0',
}

/**
 * Typed text with every spelling of minus, space, dot, micro, ohm and power brought to one: superscripts become `^n`,
 * all spaces (thin, no-break) become one plain space, all minus signs a hyphen, all raised dots `·`.
 */
export const plainNotation = (text: string): string =>
  text
    .replace(/[⁻⁰¹²³⁴-⁹]+/g, (run) => `^${[...run].map((c) => superscripts[c]).join('')}`)
    .normalize('NFKC')
    .replace(/[\u2010-\u2015\u2212]/g, '-')
    .replace(/[·∙⋅•‧]/g, '·')
    .replace(/[’‘ʼ`´]/g, "'")
    .replace(/[\s\u200b\u2060\ufeff]+/g, ' ')
    .trim()
