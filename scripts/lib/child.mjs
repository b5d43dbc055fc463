/** Child processes of the commands: waited for, stopped with their parent, ended by a sentence when they fail. */
import { spawn } from 'node:child_process'

/** Packages that would ask their makers' servers are told not to. */
export const quiet = {
  NEXT_TELEMETRY_DISABLED: '1',
  CHECKPOINT_DISABLE: '1',
  PRISMA_HIDE_UPDATE_MESSAGE: '1',
}

/** A failure whose message is meant for the person at the keyboard: said without a stack. */
export class CommandFailed extends Error {}

/**
 * Runs a program to its end. A signal that asks this process to stop is passed on.
 * @param {string} program
 * @param {readonly string[]} args
 * @param {import('node:child_process').SpawnOptions} [options]
 * @returns {Promise<number>} its exit code; 128 + n when a signal n ended it
 */
export const run = (program, args, options = {}) =>
  new Promise((resolve, reject) => {
    const child = spawn(program, args, {
      stdio: 'inherit',
      ...options,
      env: { ...process.env, ...quiet, ...options.env },
    })
    const passOn = (signal) => child.kill(signal)
    const signals = ['SIGINT', 'SIGTERM']
    for (const signal of signals) process.on(signal, passOn)
    const settle = (act) => {
      for (const signal of signals) process.off(signal, passOn)
      act()
    }
    child.on('error', (error) => settle(() => reject(error)))
    child.on('close', (code, signal) =>
      settle(() => resolve(code ?? (signal === 'SIGINT' ? 130 : signal === 'SIGTERM' ? 143 : 137))),
    )
  })

/**
 * Runs one of our own programs with this Node.js and ends with `sentence` unless it succeeds.
 * @param {readonly string[]} args
 * @param {string} sentence
 * @param {import('node:child_process').SpawnOptions} [options]
 */
export const runNode = async (args, sentence, options) => {
  const code = await run(process.execPath, args, options)
  if (code === 130 || code === 143) process.exit(code)
  if (code !== 0) throw new CommandFailed(sentence)
}

/** Ends a command: a failure foreseen is said as a sentence, any other with its stack. */
export const fail = (error) => {
  process.stderr.write(`\n${error instanceof CommandFailed ? error.message : (error?.stack ?? error)}\n`)
  process.exit(1)
}
