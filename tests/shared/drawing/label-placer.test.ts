import { describe, expect, it } from 'vitest'
import { LabelPlacer, spreadColumn } from '../../../shared/drawing/label-placer'
import { textWidth } from '../../../shared/drawing/text-width'

const label = (id: string) => ({ id, role: 'label', message: { key: id }, size: 10 }) as const
const placer = () => new LabelPlacer({ width: 200, height: 100 }, () => 50)
const spot = (x: number, y: number) => ({ x, y, anchor: 'start' }) as const

describe('placing labels', () => {
  it('gives a later label the next free spot', () => {
    const sheet = placer()
    sheet.place(label('first'), [spot(20, 50)])
    sheet.place(label('second'), [spot(30, 52), spot(30, 80)])
    expect(sheet.placed.map(({ y }) => y)).toEqual([50, 80])
  })

  it('leaves a label out that has no free spot', () => {
    const sheet = placer()
    sheet.reserve({ left: 0, top: 0, right: 200, bottom: 100 })
    expect(sheet.place(label('lost'), [spot(20, 50)])).toBe(false)
    expect(sheet.placeSurely(label('lost'), [spot(20, 50)])).toBe(false)
    expect(sheet.placed).toEqual([])
  })

  it('crosses a line only when it must, and then with a halo', () => {
    const sheet = placer()
    sheet.avoid({ left: 0, top: 45, right: 200, bottom: 47 })
    expect(sheet.place(label('line'), [spot(20, 50)])).toBe(false)
    expect(sheet.placeSurely(label('line'), [spot(20, 50)])).toBe(true)
    expect(sheet.placed[0]).toMatchObject({ y: 50, hasHalo: true })
  })

  it('pulls a label inside that would leave the view', () => {
    const sheet = placer()
    sheet.placeSurely(label('edge'), [spot(180, 50)])
    expect(sheet.placed[0]!.x).toBe(200 - 4 - 50)
  })
})

describe('a column of marks', () => {
  const ends = { top: 0, bottom: 100 }

  it('keeps marks that are apart where they are', () => {
    expect(spreadColumn([10, 40, 90], 15, ends)).toEqual([10, 40, 90])
  })

  it('spreads marks that are close, in their order', () => {
    expect(spreadColumn([40, 42, 44], 15, ends)).toEqual([40, 55, 70])
  })

  it('moves them up where the column ends', () => {
    expect(spreadColumn([92, 95, 98], 15, ends)).toEqual([70, 85, 100])
  })
})

it('knows the widths of the font', () => {
  // Advance widths of IBM Plex Sans as a browser measures them at 100 px.
  expect(textWidth('0.420', 100, 400)).toBe(4 * 60 + 29 - 2)
  expect(textWidth('Wet side', 100, 600)).toBeGreaterThan(textWidth('Wet side', 100, 400))
})
