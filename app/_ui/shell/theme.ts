export type Theme = 'light' | 'dark' | 'system'

export const themeCookie = 'ledgerline-theme'

/** Whatever a cookie says that is no theme counts as the system's. */
export const themeOf = (cookie: string | undefined): Theme =>
  cookie === 'light' || cookie === 'dark' ? cookie : 'system'
