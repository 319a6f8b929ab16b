import {
  MARK_NEEDS,
  type LineEnd,
  type LineEnds,
  type LineMark,
  type MarkKind,
} from '@shared/schemas/mark'
import type { QuantityKind } from '@shared/units'

/** Figures of a mark, and how they are shown. */
export const MARK_FIGURES = {
  offset: 'length',
  angle: 'angle',
  diameter: 'length',
  width: 'length',
  level: 'length',
  fromLevel: 'length',
  flow: 'flowRate',
} as const satisfies Record<string, QuantityKind>
export type MarkFigure = keyof typeof MARK_FIGURES

/** Figures that a kind is asked for: what it needs, and where it lies beside the line. */
export function figuresOf(kind: MarkKind): readonly MarkFigure[] {
  const needed = MARK_NEEDS[kind]
  return kind === 'turn' ? needed : ['offset', ...needed]
}

/** Kinds that lead water, and so can be plugged or shut. */
export function canBeShut(kind: MarkKind): boolean {
  return ['well', 'gully', 'outfall', 'pipe', 'gate'].includes(kind)
}

/** A mark of another kind; figures that the kind does not use are dropped. */
export function withKind(mark: LineMark, kind: MarkKind): LineMark {
  const kept = figuresOf(kind)
  const figures = Object.fromEntries(
    (Object.keys(MARK_FIGURES) as MarkFigure[]).map((figure) => [
      figure,
      kept.includes(figure) ? mark[figure] : null,
    ]),
  ) as Pick<LineMark, MarkFigure>
  return { ...mark, ...figures, kind, state: canBeShut(kind) ? mark.state : 'open' }
}

export function newMark(chainage: number): LineMark {
  return {
    kind: 'gully',
    chainage,
    offset: null,
    angle: null,
    diameter: null,
    width: null,
    level: null,
    fromLevel: null,
    flow: null,
    state: 'open',
    note: '',
  }
}

/** An end of another kind; a top belongs to a wall, a gap to an open end. */
export function withEndKind(end: LineEnd, kind: LineEnd['kind']): LineEnd {
  return {
    ...end,
    kind,
    level: kind === 'wall' ? end.level : null,
    width: kind === 'open' ? end.width : null,
  }
}

/** The marks with one of them plugged or shut. */
export function withPlugged(marks: readonly LineMark[], index: number): LineMark[] {
  return marks.map((mark, i) => (i === index ? { ...mark, state: 'closed' } : mark))
}

export interface MarksDraft {
  readonly marks: readonly LineMark[]
  readonly ends: LineEnds
}
