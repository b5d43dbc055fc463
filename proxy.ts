import { type NextRequest, NextResponse } from 'next/server'

/**
 * Security headers and a nonce for scripts, on every answer. It never decides who may do what: services do.
 * Style attributes are allowed because React writes them into the page; style sheets and scripts are not.
 */
const policy = (nonce: string, development: boolean, https: boolean): string =>
  [
    "default-src 'self'",
    `script-src 'self' 'nonce-${nonce}' 'strict-dynamic'${development ? " 'unsafe-eval'" : ''}`,
    // The development server injects style elements of its own.
    development ? "style-src 'self' 'unsafe-inline'" : `style-src 'self' 'nonce-${nonce}'`,
    "style-src-attr 'unsafe-inline'",
    "img-src 'self' blob: data:",
    "font-src 'self'",
    `connect-src 'self'${development ? ' ws: wss:' : ''}`,
    "object-src 'none'",
    "base-uri 'none'",
    "form-action 'self'",
    "frame-ancestors 'none'",
    ...(https ? ['upgrade-insecure-requests'] : []),
  ].join('; ')

const always: Readonly<Record<string, string>> = {
  'X-Content-Type-Options': 'nosniff',
  'X-Frame-Options': 'DENY',
  'Referrer-Policy': 'same-origin',
  'Cross-Origin-Opener-Policy': 'same-origin',
  'Cross-Origin-Resource-Policy': 'same-origin',
  'Permissions-Policy': 'camera=(), geolocation=(), microphone=(), payment=(), usb=()',
  'X-Robots-Tag': 'noindex, nofollow',
  // Whatever passes here may be of one person only; files with a hash in their name do not pass here.
  'Cache-Control': 'no-store',
}

export function proxy(request: NextRequest) {
  const nonce = Buffer.from(crypto.getRandomValues(new Uint8Array(16))).toString('base64')
  const https = request.headers.get('x-forwarded-proto') === 'https'
  const csp = policy(nonce, process.env.NODE_ENV === 'development', https)

  const headers = new Headers(request.headers)
  headers.set('x-nonce', nonce)
  // The framework finds the nonce here and puts it onto its own scripts.
  headers.set('Content-Security-Policy', csp)
  headers.set('x-ledgerline-path', `${request.nextUrl.pathname}${request.nextUrl.search}`)

  const response = NextResponse.next({ request: { headers } })
  response.headers.set('Content-Security-Policy', csp)
  for (const [name, value] of Object.entries(always)) response.headers.set(name, value)
  if (https) response.headers.set('Strict-Transport-Security', 'max-age=31536000')
  return response
}

export const config = { matcher: ['/((?!_next/static|_next/image|fonts/).*)'] }
