import type { Request } from 'express'
import { expect, it } from 'vitest'
import { senderOf } from '../../../server/http/sender'

it.each([
  ['198.51.100.7', '198.51.100.7'],
  ['::ffff:198.51.100.7', '198.51.100.7'],
  ['2001:db8:1:2:3:4:5:6', '2001:db8:1:2'],
  ['2001:db8:1:2::6', '2001:db8:1:2'],
  ['2001:db8::6', '2001:db8:0:0'],
  ['::1', '0:0:0:0'],
  ['fe80::1%eth0', 'fe80:0:0:0'],
  [undefined, ''],
])('the sender of a request from %s is %s', (ip, sender) => {
  expect(senderOf({ ip } as Request)).toBe(sender)
})
