/**
 * Whether this Node.js is new enough. Written for any Node.js that knows modules at all: it must be able to
 * say its sentence where the rest of the program can't even be parsed.
 */
export const oldestNode = [20, 19]

/** @returns {string | undefined} the sentence to say, or undefined when the version will do */
export const nodeTooOld = (version) => {
  const [major, minor] = version.replace(/^v/, '').split('.').map(Number)
  const enough = major > oldestNode[0] || (major === oldestNode[0] && minor >= oldestNode[1])
  if (enough) return undefined
  return `Ledgerline needs Node.js ${oldestNode.join('.')} or newer; this is ${version}. Install a newer one and start again.`
}

/** Says the sentence and ends when the version is too old. */
export const requireNode = () => {
  const sentence = nodeTooOld(process.version)
  if (sentence === undefined) return
  process.stderr.write(`${sentence}\n`)
  process.exit(1)
}
