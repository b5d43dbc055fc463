/** One at a time, in the order of asking. */
export interface Turns {
  /** Waits for the turn; the returned function hands it on (calling it again does nothing). */
  take(): Promise<() => void>
  /** Runs `work` in its turn and hands the turn on, whether it succeeds or fails. */
  run<T>(work: () => Promise<T>): Promise<T>
}

export const createTurns = (): Turns => {
  let last: Promise<void> = Promise.resolve()

  const take = async (): Promise<() => void> => {
    const before = last
    let handOn = () => {}
    last = new Promise<void>((resolve) => {
      handOn = resolve
    })
    await before
    return handOn
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
