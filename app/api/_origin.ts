import { isHttps } from '@/lib/access/client-address'

const first = (value: string | null): string => (value ?? '').split(',')[0]?.trim() ?? ''

/**
 * Whether a request was sent by a page of this server: browsers name the page's origin with every request that
 * may change something, and no page can name another. A request without one does not come from a page.
 */
export function isFromOurPages(headers: Headers): boolean {
  const origin = headers.get('origin')
  const host = first(headers.get('x-forwarded-host')) || first(headers.get('host'))
  return origin !== null && host !== '' && origin === `${isHttps(headers) ? 'https' : 'http'}://${host}`
}
