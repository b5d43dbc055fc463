/** Holds the columns that this browser shows lots in, `made,product,state`; without it the usual ones. */
export const columnsCookie = 'ledgerline-lot-columns'
