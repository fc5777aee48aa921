import type { PlotPoint } from '../geometry/point'
import type { Scene, SceneItem } from './build-scene'

/**
 * A scene as the text of an SVG drawing, one unit a millimetre on the stage, painted by class names (`stroke-ink`,
 * `fill-sheet`, `weight-bold`, `dash-chain`, `text-name`), for the reader's style sheet to colour.
 */
export function sceneSvg(scene: Scene): string {
  const { minXM, minYM, maxXM, maxYM } = scene.bounds
  const box = [mm(minXM), mm(-maxYM), mm(maxXM - minXM), mm(maxYM - minYM)].join(' ')
  return `<svg xmlns="http://www.w3.org/2000/svg" viewBox="${box}">${scene.items.map(element).join('')}</svg>`
}

/** The class names that paint an item. */
export function paintClasses(item: SceneItem): string {
  if (item.shape === 'text') return `text-${item.role} fill-${item.ink}`
  return [
    item.stroke ? `stroke-${item.stroke}` : 'stroke-none',
    item.fill ? `fill-${item.fill}` : 'fill-none',
    ...(item.weight ? [`weight-${item.weight}`] : []),
    ...(item.dash ? [`dash-${item.dash}`] : []),
  ].join(' ')
}

function element(item: SceneItem): string {
  const shared = `class="${paintClasses(item)}" data-part="${escaped(item.part)}"${
    item.pieceId === null ? '' : ` data-piece="${escaped(item.pieceId)}"`
  }`
  switch (item.shape) {
    case 'circle':
      return `<circle ${shared} cx="${x(item.centre)}" cy="${y(item.centre)}" r="${mm(item.radiusM)}"/>`
    case 'line':
      return `<line ${shared} x1="${x(item.from)}" y1="${y(item.from)}" x2="${x(item.to)}" y2="${y(item.to)}"/>`
    case 'polygon':
      return `<polygon ${shared} points="${item.points.map((point) => `${x(point)},${y(point)}`).join(' ')}"/>`
    case 'text': {
      const turn = item.rotationDeg === 0 ? '' : ` transform="rotate(${item.rotationDeg} ${x(item.at)} ${y(item.at)})"`
      return `<text ${shared} x="${x(item.at)}" y="${y(item.at)}" font-size="${mm(item.sizeM)}" text-anchor="${item.anchor}"${turn}>${escaped(item.text)}</text>`
    }
  }
}

function x(point: PlotPoint): string {
  return mm(point.xM)
}

/** SVG's y grows downwards, the plot's upstage. */
function y(point: PlotPoint): string {
  return mm(-point.yM)
}

function mm(lengthM: number): string {
  return String(Math.round(lengthM * 1e5) / 100 || 0)
}

function escaped(text: string): string {
  return text.replaceAll('&', '&amp;').replaceAll('<', '&lt;').replaceAll('>', '&gt;').replaceAll('"', '&quot;')
}
