import { format } from 'node:util'

/** Keeps what was printed and what was announced, and says where they differ. */
export class NoiseMeter {
  private heard: string[] = []
  private announced: RegExp[] = []

  announce(pattern: RegExp): void {
    this.announced.push(pattern)
  }

  hear(method: string, parts: readonly unknown[]): void {
    this.heard.push(`console.${method}: ${format(...parts)}`)
  }

  reset(): void {
    this.heard = []
    this.announced = []
  }

  /** The sentence that fails the test, or undefined when all that was printed was announced, and came. */
  complaint(): string | undefined {
    const unexpected = this.heard.filter((text) => !this.announced.some((pattern) => pattern.test(text)))
    if (unexpected.length > 0) return `Unexpected output:\n${unexpected.join('\n')}`
    const missing = this.announced.filter((pattern) => !this.heard.some((text) => pattern.test(text)))
    if (missing.length > 0) return `Announced output never came: ${missing.map(String).join(', ')}`
    return undefined
  }
}
