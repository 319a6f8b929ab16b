import { expect, it } from 'vitest'
import {
  CLASS_SIGNS,
  classCodeFrom,
  readClassCode,
  spacedCode,
} from '../../../shared/class/class-code'
import { columnsOf, isOnScale, middleGuess, onStep } from '../../../shared/class/room'

const SCALE = { min: 0, max: 0.7, step: 0.01 }

it('a code has no signs that look alike, and none is likelier than another', () => {
  expect(CLASS_SIGNS).not.toMatch(/[0O1IL5S2Z8BUVAE]/)
  expect(new Set(CLASS_SIGNS).size).toBe(CLASS_SIGNS.length)
  // 252 = 12 × 21: bytes from there on are left out.
  expect(classCodeFrom(Uint8Array.of(252, 0, 1, 255, 20, 21, 41, 251))).toBe('CD9C99')
  expect(classCodeFrom(Uint8Array.of(252, 253, 1, 2, 3, 4, 5))).toBeNull()
})

it('a code is read however it is typed', () => {
  expect(readClassCode(' c7k-4mn ')).toBe('C7K4MN')
  expect(readClassCode(spacedCode('C7K4MN'))).toBe('C7K4MN')
  expect(readClassCode('C7K4M')).toBeNull()
  expect(readClassCode('C7K4M0')).toBeNull()
})

it('figures beside the scale are refused, noise of binary arithmetic is forgiven', () => {
  expect(isOnScale(70 * 0.01, SCALE)).toBe(true)
  expect(isOnScale(0.7001, SCALE)).toBe(false)
  expect(isOnScale(-1e-6, SCALE)).toBe(false)
  expect(onStep(70 * 0.01, SCALE)).toBe(0.7)
  expect(onStep(3 * 0.1, SCALE)).toBe(0.3)
  expect(onStep(0.294, SCALE)).toBe(0.29)
})

it('the room’s guess is its median, and one joker does not move it', () => {
  expect(middleGuess([])).toBeNull()
  const three = [1, 2, 9].map((value) => ({ value, count: 1 }))
  expect(middleGuess(three)).toBe(2)
  expect(middleGuess([...three, { value: 1e6, count: 1 }])).toBe(2)
  expect(
    middleGuess([
      { value: 5, count: 4 },
      { value: 1, count: 2 },
    ]),
  ).toBe(5)
})

it('guesses stand in columns, the ends of the scale in the first and the last', () => {
  const dots = [0, 0.34, 0.36, 0.7].map((value) => ({ value, count: 2 }))
  expect(columnsOf(dots, SCALE, 10)).toEqual([
    { index: 0, count: 2 },
    { index: 4, count: 2 },
    { index: 5, count: 2 },
    { index: 9, count: 2 },
  ])
})
