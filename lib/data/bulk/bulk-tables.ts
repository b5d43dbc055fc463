import { characteristicIds } from '@/lib/domain/metrology/characteristics'

/** What a column holds, so that each engine can be told. */
export type ColumnKind = 'int' | 'text' | 'float' | 'instant' | 'boolean'

export interface BulkTable {
  readonly name: string
  readonly columns: Readonly<Record<string, ColumnKind>>
  /** Rows with this column's value stored already are passed over. */
  readonly unlessThere?: string
}

const results = Object.fromEntries(
  characteristicIds.flatMap((id) => [id, `${id}U`, `${id}Uc`].map((column) => [column, 'float' as const])),
)

/** The tables that an import fills, with every column it writes. */
export const bulkTables = {
  lot: {
    name: 'Lot',
    columns: {
      id: 'int',
      code: 'text',
      searchKey: 'text',
      productId: 'int',
      specificationRevisionId: 'int',
      machineId: 'int',
      dieId: 'int',
      makerId: 'int',
      madeAt: 'instant',
      measuredAt: 'instant',
      lengthMetres: 'float',
      setting: 'text',
      state: 'text',
      evidenceChanged: 'boolean',
      version: 'int',
      createdAt: 'instant',
      createdById: 'int',
    },
  },
  lotMaterial: {
    name: 'LotMaterial',
    columns: { lotId: 'int', role: 'text', place: 'int', materialInId: 'int' },
  },
  specimen: {
    name: 'Specimen',
    columns: {
      id: 'int',
      clientId: 'text',
      lotId: 'int',
      number: 'int',
      takenAt: 'text',
      currentEvaluationId: 'int',
      createdAt: 'instant',
    },
  },
  reading: {
    name: 'Reading',
    columns: {
      id: 'int',
      clientId: 'text',
      specimenId: 'int',
      kind: 'text',
      body: 'text',
      hash: 'text',
      personId: 'int',
      measuredAt: 'instant',
      recordedAt: 'instant',
      rigId: 'int',
      micrometerId: 'int',
      balanceId: 'int',
      ruleId: 'int',
      counterId: 'int',
      reason: 'text',
    },
  },
  snapshot: {
    name: 'InputSnapshot',
    columns: { hash: 'text', body: 'text', createdAt: 'instant' },
    unlessThere: 'hash',
  },
  evaluation: {
    name: 'Evaluation',
    columns: {
      id: 'int',
      specimenId: 'int',
      number: 'int',
      modelVersion: 'text',
      snapshotId: 'int',
      inputHash: 'text',
      cause: 'text',
      at: 'instant',
    },
  },
  result: { name: 'SpecimenResult', columns: { evaluationId: 'int', ...results } },
  summary: {
    name: 'LotSummary',
    columns: {
      lotId: 'int',
      characteristic: 'text',
      modelVersion: 'text',
      n: 'int',
      mean: 'float',
      m2: 'float',
      min: 'float',
      max: 'float',
      uCommon: 'float',
      uMean: 'float',
      productId: 'int',
      machineId: 'int',
      madeAt: 'instant',
    },
  },
  signal: {
    name: 'Signal',
    columns: {
      id: 'int',
      lotId: 'int',
      productId: 'int',
      characteristic: 'text',
      statistic: 'text',
      limitSetId: 'int',
      machineId: 'int',
      rule: 'text',
      side: 'text',
      members: 'text',
      departure: 'float',
      state: 'text',
      raisedAt: 'instant',
    },
  },
  importRow: {
    name: 'ImportRow',
    columns: {
      importId: 'int',
      row: 'int',
      line: 'int',
      kind: 'text',
      lotCode: 'text',
      specimen: 'int',
      problems: 'text',
      cells: 'text',
      entry: 'text',
    },
  },
  ledgerEntry: {
    name: 'LedgerEntry',
    columns: {
      sequence: 'int',
      at: 'instant',
      personId: 'int',
      verb: 'text',
      subject: 'text',
      body: 'text',
      previousHash: 'text',
      hash: 'text',
    },
  },
} as const satisfies Record<string, BulkTable>
