/**
 * What the server knows of a caller. `npm start` and `npm run dev` settle the forwarding headers before the
 * app sees a request: they hold the socket's address and protocol, or a proxy's word when TRUST_PROXY is set.
 */
const first = (value: string | null): string => (value ?? '').split(',')[0]?.trim() ?? ''

/** The caller's address; `unknown` where nothing settled the headers. */
export const clientAddress = (headers: Headers): string => first(headers.get('x-forwarded-for')) || 'unknown'

/** Whether the browser spoke https, so that cookies may be kept from plain http. */
export const isHttps = (headers: Headers): boolean => first(headers.get('x-forwarded-proto')) === 'https'

/** Whether a host name or address, with or without port, means this computer itself. */
export const isLoopback = (host: string): boolean => {
  const bare = host.replace(/^\[([^\]]*)\](?::\d+)?$/, '$1').replace(/^([^:]*):\d+$/, '$1')
  return bare === 'localhost' || bare === '::1' || /^127(?:\.\d{1,3}){3}$/.test(bare)
}

/**
 * Whether the browser asked for this computer by a name of its own. A page elsewhere that resolves its own
 * name to 127.0.0.1 does not pass.
 */
export const askedOnLoopback = (headers: Headers): boolean =>
  isLoopback(first(headers.get('x-forwarded-host')) || first(headers.get('host')))
