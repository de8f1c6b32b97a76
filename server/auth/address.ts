import { isIPv6 } from 'node:net'

/** What attempts are counted by: an IPv4 address, or the 64 bits of an IPv6 one that a site is given. */
export function addressKey(address: string | undefined): string {
  if (!address) return 'unknown'
  const plain = address.replace(/^::ffff:(?=\d+\.)/, '').replace(/%.*$/, '')
  return isIPv6(plain) ? `${groupsOf(plain).slice(0, 4).join(':')}::/64` : plain
}

function groupsOf(address: string): string[] {
  const [head, tail] = address.split('::')
  const front = head ? head.split(':') : []
  const back = tail ? tail.split(':') : []
  const missing = tail === undefined ? 0 : 8 - front.length - back.length
  return [...front, ...Array<string>(missing).fill('0'), ...back].map((group) =>
    group.replace(/^0+(?=.)/, ''),
  )
}
