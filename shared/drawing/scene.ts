import type { Message } from '../texts/format-text'

/** A point: in metres in the axes of the section, in CSS pixels in a scene. */
export interface Point {
  readonly x: number
  readonly y: number
}

/** What an area or a line means. A theme decides how it looks; a scene never holds a colour. */
export const SHAPE_ROLES = [
  'water',
  'waterLine',
  'waterDetail',
  'levelMark',
  'levelLine',
  'wave',
  'flow',
  'debris',
  'ground',
  'groundLine',
  'groundHatch',
  'barrierFill',
  'barrier',
  'skirt',
  'weld',
  'contact',
  'unloaded',
  'ghostFill',
  'ghost',
  'pressure',
  'envelope',
  'upliftArea',
  'upliftLine',
  'uplift',
  'force',
  'friction',
  'demand',
  'dimension',
  'witness',
  'staff',
  'staffFrame',
  'forecast',
  'holdsTo',
  'holdsToLine',
  'leave',
  'cutGap',
  'cutLine',
  'axis',
  'grid',
  'shortfall',
  'curve',
  'curveAlternative',
  'required',
  'now',
  'nowDot',
  'waterOverlay',
  'tubeEdge',
  'joint',
  'sectionHolds',
  'sectionNarrow',
  'sectionFails',
  'sectionUnchecked',
  'weakest',
  'placeLine',
  'guess',
  'workFill',
] as const
export type ShapeRole = (typeof SHAPE_ROLES)[number]

/** What a text speaks about. */
export const TEXT_ROLES = [
  'label',
  'labelQuiet',
  'labelWater',
  'labelDry',
  'labelGround',
  'labelBarrier',
  'labelUplift',
  'labelForce',
  'labelHolds',
  'labelNarrow',
  'labelFails',
] as const
export type TextRole = (typeof TEXT_ROLES)[number]

/** A line or an area, as SVG path data. */
export interface PathItem {
  readonly kind: 'path'
  readonly id: string
  readonly role: ShapeRole
  readonly d: string
}

export interface CircleItem {
  readonly kind: 'circle'
  readonly id: string
  readonly role: ShapeRole
  readonly cx: number
  readonly cy: number
  readonly r: number
}

/** One arrow: its head touches `to`. Its length is the quantity times the stated scale. */
export interface Arrow {
  readonly from: Point
  readonly to: Point
}

export interface ArrowStyle {
  /** Width of the shaft [px]. */
  readonly shaft: number
  /** Length of the head [px]. */
  readonly head: number
  /** Width of the head [px]. */
  readonly spread: number
}

/** Arrows of one diagram, painted as one shape. */
export interface ArrowsItem {
  readonly kind: 'arrows'
  readonly id: string
  readonly role: ShapeRole
  readonly arrows: readonly Arrow[]
  readonly style: ArrowStyle
}

export type TextAnchor = 'start' | 'middle' | 'end'
export type TextWeight = 400 | 600

/** A message at a place; it becomes words only where it is painted. */
export interface TextItem {
  readonly kind: 'text'
  readonly id: string
  readonly role: TextRole
  readonly x: number
  /** Of the base line. */
  readonly y: number
  readonly anchor: TextAnchor
  /** CSS pixels, whatever the scale of the drawing. */
  readonly size: number
  readonly weight: TextWeight
  readonly message: Message
  /** The text crosses lines and is painted with an edge of the background. */
  readonly hasHalo?: true
}

/** Everything but texts. */
export type ShapeItem = PathItem | CircleItem | ArrowsItem

export type SceneItem = ShapeItem | TextItem

/**
 * A drawing without a medium: page, SVG file and PDF all paint it. One drawing unit is one CSS pixel
 * of the size for which the scene was composed; y runs down.
 */
export interface Scene {
  readonly width: number
  readonly height: number
  readonly title: Message
  /** The drawing in sentences, for those who do not see it. */
  readonly description: readonly Message[]
  /** In the order in which they are painted. */
  readonly items: readonly SceneItem[]
}

/** The room that a scene is composed for [CSS px]. */
export interface View {
  readonly width: number
  readonly height: number
}
