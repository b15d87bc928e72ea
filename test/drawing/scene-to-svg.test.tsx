import { renderToStaticMarkup } from 'react-dom/server'
import { describe, expect, test } from 'vitest'
import { darkInk, inkDeclarations, inks, lightInk } from '@/lib/drawing/ink'
import { path, rect, type Scene, text } from '@/lib/drawing/scene'
import { SceneSvg } from '@/lib/drawing/scene-svg'
import { sceneToSvg } from '@/lib/drawing/scene-to-svg'

const scene: Scene = {
  width: 40,
  height: 20,
  title: 'Voltage at M1 & M2 < 0.9',
  description: 'Lowest "5.6 kV"',
  items: [
    rect({ x: 1, y: 2, width: 3, height: 4 }, { fill: 'shade' }),
    path('M0 0L10 10', { stroke: 'series-2', width: 0.4, dash: [3.2, 1.2] }),
    text(5.123456, 6, 'U < 0.9 & falling', { anchor: 'end', weight: 'semibold' }),
  ],
}

describe('a scene as an SVG file', () => {
  const svg = sceneToSvg(scene)

  test('has its size in millimetres, a title and a description', () => {
    expect(svg).toContain('width="40mm" height="20mm" viewBox="0 0 40 20" role="img"')
    expect(svg).toContain('<title>Voltage at M1 &amp; M2 &lt; 0.9</title>')
    expect(svg).toContain('<desc>Lowest &quot;5.6 kV&quot;</desc>')
  })

  test('escapes what people typed', () => {
    expect(svg).toContain('>U &lt; 0.9 &amp; falling</text>')
    expect(svg).not.toContain('U < 0.9')
  })

  test('writes coordinates to a hundredth of a millimetre, dashes and colours', () => {
    expect(svg).toContain('x="5.12"')
    expect(svg).toContain('stroke-dasharray="3.2 1.2"')
    expect(svg).toContain(`stroke="${lightInk['series-2']}"`)
  })
})

describe('a scene on the screen', () => {
  const markup = renderToStaticMarkup(<SceneSvg scene={scene} />)

  test('is an image that names itself to a reader who cannot see it', () => {
    const id = /<title id="([^"]+)">/.exec(markup)?.[1]
    const described = /<desc id="([^"]+)">/.exec(markup)?.[1]
    expect(markup).toContain('role="img"')
    expect(markup).toContain(`aria-labelledby="${id} ${described}"`)
  })

  test('takes its colours from custom properties, so that a dark theme can change them', () => {
    expect(markup).toContain(`var(--figure-series-2, ${lightInk['series-2']})`)
    for (const ink of inks) expect(inkDeclarations('dark')).toContain(`--figure-${ink}: ${darkInk[ink]};`)
  })

  test('draws the same shapes as the file', () => {
    expect(markup).toContain('d="M0 0L10 10"')
    expect(markup).toContain('font-weight="600"')
  })
})
