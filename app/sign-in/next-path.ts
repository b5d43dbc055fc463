/**
 * Where to go after signing in: a path of our own pages, never another site. `//host` and `/\host` are other
 * sites to a browser.
 */
export const nextPath = (asked: string | undefined): string =>
  asked !== undefined && /^\/(?![/\\])[^\\\p{Cc}]*$/u.test(asked) && !asked.startsWith('/sign-in')
    ? asked
    : '/today'
