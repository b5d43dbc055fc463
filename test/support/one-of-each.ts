/** One row of every table that a guard protects, with a ledger entry: something to try to spoil. */
import { database } from '@/lib/data/database'
import { appendLedger } from '@/lib/data/ledger'

const at = new Date('2026-03-02T08:00:00.000Z')

export const storeOneOfEach = () =>
  database().write(async (tx) => {
    const person = await tx.person.create({
      data: { name: 'Ada Voss', username: 'ada', searchKey: 'ada voss', createdAt: at },
    })
    await tx.personRole.create({ data: { personId: person.id, role: 'quality' } })
    const material = await tx.material.create({
      data: {
        code: 'steel',
        name: 'Steel',
        searchKey: 'steel',
        kind: 'metal',
        body: '{}',
        standing: 'invented',
        source: 'invented',
        createdAt: at,
      },
    })
    const product = await tx.product.create({
      data: { code: 'LA-254', name: 'Larch 254', family: 'Larch', searchKey: 'larch 254', createdAt: at },
    })
    const specification = await tx.specificationRevision.create({
      data: {
        productId: product.id,
        number: 1,
        effectiveFrom: at,
        materialId: material.id,
        body: '{}',
        hash: 'a',
        issuedAt: at,
      },
    })
    const lot = await tx.lot.create({
      data: {
        code: 'LA-0001',
        searchKey: 'la-0001',
        productId: product.id,
        specificationRevisionId: specification.id,
        madeAt: at,
        lengthMetres: 1200,
        state: 'to-decide',
        createdAt: at,
      },
    })
    const specimen = await tx.specimen.create({
      data: { clientId: 'specimen-1', lotId: lot.id, number: 1, createdAt: at },
    })
    const reading = await tx.reading.create({
      data: {
        clientId: 'reading-1',
        specimenId: specimen.id,
        kind: 'sheet',
        body: '{"diameters":[0.000254]}',
        hash: 'b',
        personId: person.id,
        measuredAt: at,
        recordedAt: at,
      },
    })
    const snapshot = await tx.inputSnapshot.create({ data: { hash: 'c', body: '{}', createdAt: at } })
    const evaluation = await tx.evaluation.create({
      data: {
        specimenId: specimen.id,
        number: 1,
        modelVersion: '1',
        snapshotId: snapshot.id,
        inputHash: 'd',
        cause: 'first',
        at,
      },
    })
    await tx.specimenResult.create({
      data: { evaluationId: evaluation.id, diameter: 0.000254, diameterU: 1e-6, diameterUc: 5e-7 },
    })
    await tx.specimen.update({ where: { id: specimen.id }, data: { currentEvaluationId: evaluation.id } })
    const limitSet = await tx.limitSet.create({
      data: {
        productId: product.id,
        characteristic: 'diameter',
        statistic: 'mean',
        number: 1,
        centre: 0.000254,
        sigma: 6e-7,
        lower: 0.0002522,
        upper: 0.0002558,
        sigmaEstimator: 'moving-range',
        lotCount: 60,
        provisional: false,
        baseline: '{}',
        effectiveFrom: at,
        frozenAt: at,
      },
    })
    const signal = await tx.signal.create({
      data: {
        lotId: lot.id,
        productId: product.id,
        characteristic: 'diameter',
        statistic: 'mean',
        limitSetId: limitSet.id,
        rule: 'beyond-the-limits',
        side: 'above',
        members: '[1]',
        departure: 3e-6,
        state: 'open',
        raisedAt: at,
      },
    })
    const disposition = await tx.disposition.create({
      data: {
        lotId: lot.id,
        number: 1,
        verb: 'hold',
        reason: 'the gauge is looked at',
        decidedAt: at,
        decidedById: person.id,
        proposal: '{}',
        evidence: '{}',
        evidenceHash: 'e',
      },
    })
    const datasheet = await tx.datasheet.create({
      data: { code: 'DS-0001', productId: product.id, createdAt: at },
    })
    const revision = await tx.datasheetRevision.create({
      data: {
        datasheetId: datasheet.id,
        number: 1,
        basis: 'unloaded-mass',
        modelVersion: '1',
        body: '{}',
        hash: 'f',
        ledgerCount: 0,
        ledgerHash: '0'.repeat(64),
        publishedAt: at,
        lots: { create: { lotId: lot.id } },
      },
    })
    await appendLedger(tx, {
      at: at.getTime(),
      personId: person.id,
      verb: 'record',
      subject: `lot ${lot.code}`,
      body: { specimens: 1 },
    })
    return { person, lot, specimen, reading, evaluation, limitSet, signal, disposition, revision }
  })
