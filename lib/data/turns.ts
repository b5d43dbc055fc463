/** A few at a time, in the order of asking. */
export interface Turns {
  /** Waits for a turn; the returned function hands it on (calling it again does nothing). */
  take(): Promise<() => void>
  /** Runs `work` in its turn and hands the turn on, whether it succeeds or fails. */
  run<T>(work: () => Promise<T>): Promise<T>
}

/** @param atOnce how many may have their turn at the same time */
export const createTurns = (atOnce = 1): Turns => {
  let free = atOnce
  const waiting: Array<() => void> = []

  const handOn = () => {
    const next = waiting.shift()
    if (next) next()
    else free += 1
  }

  const take = async (): Promise<() => void> => {
    if (free > 0) free -= 1
    else await new Promise<void>((resolve) => waiting.push(resolve))
    let held = true
    return () => {
      if (held) handOn()
      held = false
    }
  }

  return {
    take,
    run: async (work) => {
      const release = await take()
      try {
        return await work()
      } finally {
        release()
      }
    },
  }
}
