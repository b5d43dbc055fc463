/** How long the rest will take, in words: "40 s", "3 min". Undefined while nobody can tell. */
export function timeLeft(
  rowCount: number | undefined,
  rowsDone: number,
  rowsPerSecond: number | undefined,
): string | undefined {
  if (rowCount === undefined || !rowsPerSecond || rowsDone >= rowCount) return undefined
  const seconds = (rowCount - rowsDone) / rowsPerSecond
  if (seconds < 90) return `${Math.max(1, Math.round(seconds))} s`
  return seconds < 5400 ? `${Math.round(seconds / 60)} min` : `${Math.round(seconds / 3600)} h`
}
