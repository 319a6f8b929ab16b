import { expect, it } from 'vitest'
import { groundSeepage } from '../../../shared/calc/ground/ground-seepage'
import { pipingScreen } from '../../../shared/calc/ground/piping-screen'
import { resultant } from '../../../shared/calc/section/resultant'
import { seaWaterDensity } from '../../../shared/calc/water/water-properties'
import { windOnEmptyBarrier } from '../../../shared/calc/wind/wind-on-empty-barrier'
import { OutOfRangeError } from '../../../shared/errors'

const barrier = { diameter: 0.7, mass: 4.8, friction: 0.45, gravity: 9.81, required: 1.5 }

it('gives no factor and asks for no ballast without wind', () => {
  const calm = windOnEmptyBarrier({ ...barrier, gust: 0 })
  expect(calm).toMatchObject({ force: 0, factor: null, ballast: 0 })
})

it('takes sea water down to −2 °C, and no colder', () => {
  expect(seaWaterDensity(-2, 35)).toBeGreaterThan(seaWaterDensity(0, 35))
  expect(seaWaterDensity(-1, 35)).toBeGreaterThan(1028)
  expect(() => seaWaterDensity(-2.01, 35)).toThrow(OutOfRangeError)
})

it('has no resultant where nothing presses on the ground, or there is no base', () => {
  expect(resultant(100, 0, 2)).toEqual({ x: null, share: null })
  expect(resultant(100, -5, 2)).toEqual({ x: null, share: null })
  expect(resultant(100, 50, 0)).toEqual({ x: null, share: null })
})

it.each([20, 100, 1000, 1e6])(
  'seeps under a base %s layers wide as its asymptote says',
  (ratio) => {
    // 1/(B/T + 4 ln 2/π): beyond B/T 20 exact to the last digits.
    const q = groundSeepage({ permeability: 1, head: 1, baseWidth: ratio, layerThickness: 1 })
    expect(q * (ratio + (4 * Math.LN2) / Math.PI)).toBeCloseTo(1, 12)
  },
)

it('screens no piping where there is no base or no head', () => {
  expect(pipingScreen(0.5, 0).exitGradient).toBe(0)
  expect(pipingScreen(0, 2)).toEqual({ exitGradient: 0, bligh: null, lane: null })
})
