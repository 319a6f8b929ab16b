import type { Request } from 'express'

/**
 * Where a request comes from, for counting attempts: an IPv4 address, or the /64 of an IPv6 address,
 * since one sender has a whole /64 to choose from.
 */
export function senderOf(req: Request): string {
  const address = (req.ip ?? '').replace(/^::ffff:(?=\d+\.)/i, '')
  return address.includes(':') ? firstGroups(address) : address
}

function firstGroups(address: string): string {
  const [head = '', tail = ''] = address.split('%')[0]!.split('::')
  const before = head.split(':').filter(Boolean)
  const after = tail.split(':').filter(Boolean)
  const zeros = Array<string>(Math.max(0, 8 - before.length - after.length)).fill('0')
  const groups = address.includes('::') ? [...before, ...zeros, ...after] : before
  return groups.slice(0, 4).join(':')
}
