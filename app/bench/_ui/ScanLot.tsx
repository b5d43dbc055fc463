import { goToLotAction } from '../actions'

/** A scanner types the code and Enter: the lot opens. Works without script, too. */
export function ScanLot() {
  return (
    <form action={goToLotAction} className="bench-scan">
      <label htmlFor="bench-scan-code">Scan or type a lot</label>
      <input
        id="bench-scan-code"
        name="code"
        className="input"
        autoComplete="off"
        autoCapitalize="characters"
        spellCheck={false}
        maxLength={40}
        required
      />
    </form>
  )
}
