/**
 * A client seen through guards: each call first asks whether it is allowed now, and is remembered until it has
 * ended. Prisma's calls do nothing until they are awaited, so a forgotten `await` is a lost write that no
 * error tells of; remembered calls make it one.
 */
import type { Engine, Tx } from './database'
import { sharedState } from './shared-state'

/** A call on a client: `lot.create`, or `$queryRaw` for one that belongs to no model. */
export interface Call {
  readonly model: string | undefined
  readonly operation: string
}

export interface Guards {
  readonly engine: Engine
  /** Throws when the call is not allowed. Asked when the call is made and again when it is awaited. */
  readonly allow: (call: Call) => void
  /** Turns a failure into the error that the caller gets. */
  readonly failure?: (error: unknown) => unknown
  /** Calls that were made and have not ended. */
  readonly pending?: Set<Call>
}

/** The engine behind a guarded client. */
export const engineOf = (tx: Tx): Engine => {
  const engine = sharedState().engineOf.get(tx)
  if (engine === undefined) throw new Error('Use the client that database().write or .read gives.')
  return engine
}

const reading = new Set([
  'findFirst',
  'findFirstOrThrow',
  'findMany',
  'findUnique',
  'findUniqueOrThrow',
  'count',
  'aggregate',
  'groupBy',
  '$queryRaw',
  '$queryRawUnsafe',
])

/** Raw queries count as reading: `query_only` or a read-only session stops those that are not. */
export const isReading = (call: Call): boolean => reading.has(call.operation)

export const nameOf = (call: Call): string =>
  call.model === undefined ? call.operation : `${call.model}.${call.operation}`

type Callable = (...args: unknown[]) => unknown
const isCallable = (value: unknown): value is Callable => typeof value === 'function'
const isObject = (value: unknown): value is object => typeof value === 'object' && value !== null

const outer = new Set(['$transaction', '$connect', '$disconnect', '$extends', '$on', '$use'])

/** Wraps a Prisma client, or the client of a transaction, in `guards`. */
export const guardClient = (client: object, guards: Guards): Tx => {
  const models = new Map<string, object>()

  const start = (call: Call, run: () => unknown): unknown => {
    guards.allow(call)
    const entry = { ...call }
    guards.pending?.add(entry)
    return follow(run(), entry)
  }

  /** The promise of a call, with the guards around its awaiting. */
  const follow = (promised: unknown, entry: Call): unknown => {
    if (!isObject(promised)) return promised
    const settled = (method: 'then' | 'catch' | 'finally', args: unknown[]): unknown => {
      guards.allow(entry)
      const ended = Promise.resolve(promised as PromiseLike<unknown>).then(
        (value) => {
          guards.pending?.delete(entry)
          return value
        },
        (error: unknown) => {
          guards.pending?.delete(entry)
          throw guards.failure ? guards.failure(error) : error
        },
      )
      return (ended[method] as Callable).apply(ended, args)
    }
    return new Proxy(promised, {
      get: (target, property) => {
        if (property === 'then' || property === 'catch' || property === 'finally')
          return (...args: unknown[]) => settled(property, args)
        const value: unknown = Reflect.get(target, property)
        if (!isCallable(value)) return value
        // A relation asked for through the promise: that call replaces this one.
        return (...args: unknown[]) => {
          guards.pending?.delete(entry)
          return start({ model: entry.model, operation: entry.operation }, () => value.apply(target, args))
        }
      },
    })
  }

  const guardModel = (name: string, model: object): object =>
    new Proxy(model, {
      get: (target, property) => {
        const value: unknown = Reflect.get(target, property)
        if (typeof property === 'symbol' || !isCallable(value)) return value
        return (...args: unknown[]) =>
          start({ model: name, operation: property }, () => value.apply(target, args))
      },
    })

  const guarded = new Proxy(client, {
    get: (target, property) => {
      const value: unknown = Reflect.get(target, property)
      if (typeof property === 'symbol') return value
      if (outer.has(property))
        throw new Error(`${property} is not for use here: database().write opens, commits and ends.`)
      if (isCallable(value))
        return (...args: unknown[]) =>
          start({ model: undefined, operation: property }, () => value.apply(target, args))
      if (!isObject(value)) return value
      const known = models.get(property)
      if (known) return known
      const model = guardModel(property, value)
      models.set(property, model)
      return model
    },
  })
  sharedState().engineOf.set(guarded, guards.engine)
  return guarded as Tx
}
