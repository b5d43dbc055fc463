/**
 * Prisma's schema engine as WebAssembly: makes and applies migrations without a downloaded program, with the
 * usual bookkeeping (`_prisma_migrations`), so that the ordinary command line can take over any time.
 */
import { readFileSync } from 'node:fs'
import { createRequire } from 'node:module'
import { dirname, join } from 'node:path'
import {
  bindMigrationAwareSqlAdapterFactory,
  type SqlDriverAdapter,
  type SqlMigrationAwareDriverAdapterFactory,
} from '@prisma/driver-adapter-utils'
import * as bindings from '@prisma/schema-engine-wasm/schema_engine_bg'

export type SchemaEngine = bindings.SchemaEngine

/** A schema's files: name and content. */
export type SchemaFiles = ReadonlyArray<readonly [path: string, content: string]>

/** No table and no enumeration belongs to anyone else. */
export const noFilters: bindings.SchemaFilter = { externalTables: [], externalEnums: [] }

let loaded = false

const loadOnce = (): void => {
  if (loaded) return
  const folder = dirname(
    createRequire(import.meta.url).resolve('@prisma/schema-engine-wasm/schema_engine_bg'),
  )
  const module = new WebAssembly.Module(readFileSync(join(folder, 'schema_engine_bg.wasm')))
  const instance = new WebAssembly.Instance(module, {
    './schema_engine_bg.js': bindings as unknown as WebAssembly.ModuleImports,
  })
  bindings.__wbg_set_wasm(instance.exports)
  const start = instance.exports.__wbindgen_start
  if (typeof start === 'function') start()
  loaded = true
}

/**
 * Runs `work` with an engine on connections of `factory`, and ends every connection that the engine opened:
 * it holds SQLite's file exclusively, and PostgreSQL's pool keeps the process alive, until then.
 */
export const withSchemaEngine = async <T>(
  factory: SqlMigrationAwareDriverAdapterFactory,
  work: (engine: SchemaEngine) => Promise<T>,
  schema?: SchemaFiles,
): Promise<T> => {
  loadOnce()
  const opened: SqlDriverAdapter[] = []
  const remember = async (connecting: Promise<SqlDriverAdapter>) => {
    const adapter = await connecting
    opened.push(adapter)
    return adapter
  }
  const watched: SqlMigrationAwareDriverAdapterFactory = {
    provider: factory.provider,
    adapterName: factory.adapterName,
    connect: () => remember(factory.connect()),
    connectToShadowDb: () => remember(factory.connectToShadowDb()),
  }
  const engine = await bindings.SchemaEngine.new(
    { datamodels: schema?.map(([path, content]): [string, string] => [path, content]) },
    () => {},
    bindMigrationAwareSqlAdapterFactory(watched),
  )
  try {
    return await work(engine)
  } finally {
    engine.free()
    for (const adapter of opened) await adapter.dispose().catch(() => undefined)
  }
}

const container = (files: SchemaFiles) => ({
  files: files.map(([path, content]) => ({ path, content })),
})

/** SQL that turns a database of the schema `from` (nothing, when undefined) into one of the schema `to`. */
export const differenceOf = async (
  engine: SchemaEngine,
  from: SchemaFiles | undefined,
  to: SchemaFiles,
): Promise<string> => {
  const { stdout } = await engine.diff({
    from: from === undefined ? { tag: 'empty' } : { tag: 'schemaDatamodel', ...container(from) },
    to: { tag: 'schemaDatamodel', ...container(to) },
    script: true,
    exitCode: null,
    filters: noFilters,
  })
  return stdout ?? ''
}
