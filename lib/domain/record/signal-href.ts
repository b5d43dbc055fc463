/**
 * Where a signal stands: on the chart of its product, or of the machine when it runs over products, the pointer on the
 * lot that completed it.
 */
export function signalHref(signal: {
  readonly id: number
  readonly productCode: string
  readonly machineCode?: string | undefined
  readonly lotCode?: string | undefined
}): string {
  const { id, lotCode, machineCode, productCode } = signal
  const parameters = new URLSearchParams({
    ...(machineCode === undefined ? { product: productCode } : { machine: machineCode }),
    ...(lotCode === undefined ? {} : { lot: lotCode }),
  })
  return `/drift?${parameters}#signal-${id}`
}
