/**
 * Who is calling: the socket's address, or what the proxy in front says when it is trusted. Anybody can send
 * `x-forwarded-*`, so without a trusted proxy those headers are removed before the app sees the request; the
 * app always finds exactly one address in `x-forwarded-for`.
 */
import { isIP } from 'node:net'

const told = [
  'forwarded',
  'x-forwarded-for',
  'x-forwarded-host',
  'x-forwarded-port',
  'x-forwarded-proto',
  'x-real-ip',
]

const bare = (address) => address?.replace(/^::ffff:(?=\d+\.\d+\.\d+\.\d+$)/, '')

/** The last of a list: the one that the proxy nearest to us added; what stands before it, a caller may have written. */
const last = (header) =>
  String(header ?? '')
    .split(',')
    .at(-1)
    ?.trim()

/**
 * Rewrites the headers of one request in place.
 * @param {import('node:http').IncomingMessage} request
 * @param {{ trustProxy: boolean, https: boolean }} server
 */
export const settleAddress = (request, { trustProxy, https }) => {
  const { headers, socket } = request
  const forwarded = trustProxy ? last(headers['x-forwarded-for']) : undefined
  const protocol = trustProxy ? last(headers['x-forwarded-proto']) : undefined
  const host = trustProxy ? last(headers['x-forwarded-host']) : undefined
  for (const name of told) delete headers[name]
  headers['x-forwarded-for'] = forwarded && isIP(forwarded) ? forwarded : (bare(socket.remoteAddress) ?? '')
  headers['x-forwarded-proto'] =
    protocol === 'https' || protocol === 'http' ? protocol : https ? 'https' : 'http'
  headers['x-forwarded-host'] = host || headers.host || ''
}
