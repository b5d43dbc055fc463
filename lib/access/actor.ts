/** Who does it. Every service takes an actor first and asks `permit` itself. */
export const roles = ['bench', 'quality', 'sales', 'administrator'] as const

export type Role = (typeof roles)[number]

export interface Actor {
  readonly personId: number
  readonly name: string
  readonly roles: readonly Role[]
}
