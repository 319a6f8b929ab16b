import type { ResolveText } from '../texts/format-text'
import {
  HALO,
  SHAPE_PAINTS,
  TEXT_TONES,
  THEMES,
  type Paint,
  type Theme,
  type ThemeName,
} from './paints'
import { coordinate, shapePath } from './path-data'
import type { Scene, SceneItem, ShapeRole, TextItem } from './scene'

/** What a file needs beside the scene. */
export interface SvgOptions {
  /** Turns messages into words, in the language and the units of the reader. */
  readonly resolve: ResolveText
  readonly theme: ThemeName
  /** Rules of `@font-face`, where the file shall bring its own font. */
  readonly fontFaces?: string | undefined
}

/** Characters that XML 1.0 does not allow, even escaped. */
// eslint-disable-next-line no-control-regex -- control characters are what it is to find
const NOT_XML = /[\u0000-\u0008\u000b\u000c\u000e-\u001f\ufffe\uffff]/g

function escapeXml(text: string): string {
  return text
    .replace(NOT_XML, '')
    .replace(/&/g, '&amp;')
    .replace(/</g, '&lt;')
    .replace(/>/g, '&gt;')
    .replace(/"/g, '&quot;')
}

/**
 * The scene as one SVG file that needs nothing else: same scene, same options, same bytes. It adds no
 * date, no program name and no script of its own; a caption is part of the scene.
 */
export function sceneToSvg(scene: Scene, options: SvgOptions): string {
  const { resolve } = options
  const theme: Theme = THEMES[options.theme]
  const { width, height } = scene
  const description = scene.description.map((message) => resolve(message)).join(' ')
  return [
    `<svg xmlns="http://www.w3.org/2000/svg" width="${width}" height="${height}" ` +
      `viewBox="0 0 ${width} ${height}" role="img" aria-labelledby="title desc" ` +
      `font-family="'IBM Plex Sans', sans-serif">`,
    `<title id="title">${escapeXml(resolve(scene.title))}</title>`,
    `<desc id="desc">${escapeXml(description)}</desc>`,
    `<defs>${fontStyle(options.fontFaces)}${gradients(scene, theme)}</defs>`,
    `<rect width="${width}" height="${height}" fill="${theme.surface}"/>`,
    ...scene.items.map((item) => itemToSvg(item, theme, resolve)),
    '</svg>',
    '',
  ].join('\n')
}

function fontStyle(fontFaces: string | undefined): string {
  return fontFaces === undefined ? '' : `<style>${escapeXml(fontFaces)}</style>`
}

function gradients(scene: Scene, theme: Theme): string {
  const used = new Set<ShapeRole>()
  for (const item of scene.items) if (item.kind !== 'text') used.add(item.role)
  let defs = ''
  for (const role of used) {
    const { fade } = SHAPE_PAINTS[role]
    if (!fade) continue
    defs +=
      `<linearGradient id="fade-${role}" x1="0" y1="0" x2="0" y2="1">` +
      `<stop stop-color="${theme[fade[0]]}"/>` +
      `<stop offset="1" stop-color="${theme[fade[1]]}"/></linearGradient>`
  }
  return defs
}

function itemToSvg(item: SceneItem, theme: Theme, resolve: ResolveText): string {
  if (item.kind === 'text') return textToSvg(item, theme, resolve)
  return `<path d="${shapePath(item)}"${paintAttributes(item.role, theme)}/>`
}

function textToSvg(item: TextItem, theme: Theme, resolve: ResolveText): string {
  const anchor = item.anchor === 'start' ? '' : ` text-anchor="${item.anchor}"`
  const weight = item.weight === 400 ? '' : ` font-weight="${item.weight}"`
  return (
    `<text x="${coordinate(item.x)}" y="${coordinate(item.y)}" font-size="${item.size}"${weight}${anchor} ` +
    `fill="${theme[TEXT_TONES[item.role]]}"${item.hasHalo ? halo(theme) : ''}>${escapeXml(resolve(item.message))}</text>`
  )
}

function halo(theme: Theme): string {
  const width = `stroke-width="${HALO.width}" stroke-opacity="${HALO.opacity}"`
  return ` paint-order="stroke" stroke="${theme.surface}" ${width} stroke-linejoin="round"`
}

function paintAttributes(role: ShapeRole, theme: Theme): string {
  const paint: Paint = SHAPE_PAINTS[role]
  const fill = paint.fade ? `url(#fade-${role})` : paint.fill ? theme[paint.fill] : 'none'
  const attributes: [string, string | number | undefined][] = [
    ['fill', fill],
    ['fill-opacity', paint.fillOpacity],
    ['stroke', paint.stroke && theme[paint.stroke]],
    ['stroke-width', paint.width],
    ['stroke-opacity', paint.strokeOpacity],
    ['stroke-dasharray', paint.dash],
    ['stroke-linecap', paint.cap],
    ['stroke-linejoin', paint.stroke && 'round'],
  ]
  return attributes
    .filter(([, value]) => value !== undefined)
    .map(([name, value]) => ` ${name}="${value}"`)
    .join('')
}
