import { createElement, useId } from 'react'
import { inkVariable } from './ink'
import type { Scene } from './scene'
import { fontFamily, sceneNodes } from './scene-nodes'

/** A scene on the screen: scales to the width of its container and takes its colours from the theme's custom properties. */
export const SceneSvg = ({ scene, className }: { scene: Scene; className?: string }) => {
  const id = useId()
  return (
    <svg
      viewBox={`0 0 ${scene.width} ${scene.height}`}
      role="img"
      aria-labelledby={`${id}-title ${id}-desc`}
      className={className}
      style={{
        width: '100%',
        height: 'auto',
        fontFamily: `var(--font-source-sans, ${fontFamily})`,
        fontVariantNumeric: 'lining-nums tabular-nums',
      }}
    >
      <title id={`${id}-title`}>{scene.title}</title>
      <desc id={`${id}-desc`}>{scene.description}</desc>
      {sceneNodes(scene, inkVariable).map((node, index) =>
        // Items of a scene have no identity of their own; their order is the painting order.
        createElement(node.tag, { key: `${node.tag}${index}`, ...node.properties }, node.text),
      )}
    </svg>
  )
}
