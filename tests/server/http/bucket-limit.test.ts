import { expect, it } from 'vitest'
import { createBucketLimit } from '../../../server/http/bucket-limit'

it('takes what comes at once, then one more after each refill, of each key for itself', () => {
  const clock = { now: 0 }
  const take = createBucketLimit(() => clock.now, { atOnce: 3, refill: 100, message: 'Wait.' })
  for (let n = 0; n < 3; n++) take('room')
  expect(() => take('room')).toThrow('Wait.')
  expect(() => take('other room')).not.toThrow()
  clock.now = 99
  expect(() => take('room')).toThrow('Wait.')
  clock.now = 100
  expect(() => take('room')).not.toThrow()
  expect(() => take('room')).toThrow('Wait.')
})
