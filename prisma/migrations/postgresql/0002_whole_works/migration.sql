-- AlterTable
ALTER TABLE "LimitSet" ADD COLUMN     "rules" TEXT,
ADD COLUMN     "target" DOUBLE PRECISION;

-- AlterTable
ALTER TABLE "Signal" ADD COLUMN     "machineId" INTEGER;

-- AlterTable
ALTER TABLE "Lot" ADD COLUMN     "measuredAt" TIMESTAMP(3);

-- CreateTable
CREATE TABLE "ImportMapping" (
    "id" SERIAL NOT NULL,
    "name" TEXT NOT NULL,
    "body" TEXT NOT NULL,
    "version" INTEGER NOT NULL DEFAULT 1,
    "createdAt" TIMESTAMP(3) NOT NULL,
    "createdById" INTEGER,

    CONSTRAINT "ImportMapping_pkey" PRIMARY KEY ("id")
);

-- CreateTable
CREATE TABLE "Import" (
    "id" SERIAL NOT NULL,
    "fileName" TEXT NOT NULL,
    "sha256" TEXT NOT NULL,
    "bytes" INTEGER NOT NULL,
    "format" TEXT NOT NULL,
    "state" TEXT NOT NULL,
    "options" TEXT NOT NULL,
    "rowCount" INTEGER,
    "rowsDone" INTEGER NOT NULL DEFAULT 0,
    "stored" INTEGER NOT NULL DEFAULT 0,
    "alreadyThere" INTEGER NOT NULL DEFAULT 0,
    "differing" INTEGER NOT NULL DEFAULT 0,
    "refused" INTEGER NOT NULL DEFAULT 0,
    "lotsOpened" INTEGER NOT NULL DEFAULT 0,
    "cancelAsked" BOOLEAN NOT NULL DEFAULT false,
    "message" TEXT NOT NULL DEFAULT '',
    "createdAt" TIMESTAMP(3) NOT NULL,
    "createdById" INTEGER NOT NULL,
    "startedAt" TIMESTAMP(3),
    "endedAt" TIMESTAMP(3),
    "version" INTEGER NOT NULL DEFAULT 1,

    CONSTRAINT "Import_pkey" PRIMARY KEY ("id")
);

-- CreateTable
CREATE TABLE "ImportRow" (
    "id" SERIAL NOT NULL,
    "importId" INTEGER NOT NULL,
    "row" INTEGER NOT NULL,
    "line" INTEGER NOT NULL,
    "kind" TEXT NOT NULL,
    "lotCode" TEXT NOT NULL DEFAULT '',
    "specimen" INTEGER,
    "problems" TEXT NOT NULL,
    "cells" TEXT NOT NULL,
    "entry" TEXT NOT NULL DEFAULT '',
    "state" TEXT NOT NULL DEFAULT 'open',
    "reason" TEXT NOT NULL DEFAULT '',
    "decidedAt" TIMESTAMP(3),
    "decidedById" INTEGER,

    CONSTRAINT "ImportRow_pkey" PRIMARY KEY ("id")
);

-- CreateTable
CREATE TABLE "MaterialIn" (
    "id" SERIAL NOT NULL,
    "code" TEXT NOT NULL,
    "name" TEXT NOT NULL,
    "searchKey" TEXT NOT NULL,
    "kind" TEXT NOT NULL,
    "materialId" INTEGER,
    "heat" TEXT NOT NULL DEFAULT '',
    "supplier" TEXT NOT NULL DEFAULT '',
    "parentId" INTEGER,
    "sizeMetres" DOUBLE PRECISION,
    "lengthMetres" DOUBLE PRECISION,
    "massKilograms" DOUBLE PRECISION,
    "receivedAt" TIMESTAMP(3),
    "active" BOOLEAN NOT NULL DEFAULT true,
    "note" TEXT NOT NULL DEFAULT '',
    "version" INTEGER NOT NULL DEFAULT 1,
    "createdAt" TIMESTAMP(3) NOT NULL,

    CONSTRAINT "MaterialIn_pkey" PRIMARY KEY ("id")
);

-- CreateTable
CREATE TABLE "LotMaterial" (
    "id" SERIAL NOT NULL,
    "lotId" INTEGER NOT NULL,
    "role" TEXT NOT NULL,
    "place" INTEGER NOT NULL DEFAULT 1,
    "materialInId" INTEGER NOT NULL,
    "fromMetre" DOUBLE PRECISION,
    "toMetre" DOUBLE PRECISION,

    CONSTRAINT "LotMaterial_pkey" PRIMARY KEY ("id")
);

-- CreateIndex
CREATE UNIQUE INDEX "ImportMapping_name_key" ON "ImportMapping"("name");

-- CreateIndex
CREATE INDEX "Import_state_createdAt_idx" ON "Import"("state", "createdAt");

-- CreateIndex
CREATE INDEX "Import_sha256_idx" ON "Import"("sha256");

-- CreateIndex
CREATE INDEX "ImportRow_importId_kind_state_idx" ON "ImportRow"("importId", "kind", "state");

-- CreateIndex
CREATE UNIQUE INDEX "ImportRow_importId_row_key" ON "ImportRow"("importId", "row");

-- CreateIndex
CREATE UNIQUE INDEX "MaterialIn_code_key" ON "MaterialIn"("code");

-- CreateIndex
CREATE INDEX "MaterialIn_parentId_idx" ON "MaterialIn"("parentId");

-- CreateIndex
CREATE INDEX "MaterialIn_kind_active_idx" ON "MaterialIn"("kind", "active");

-- CreateIndex
CREATE INDEX "LotMaterial_materialInId_idx" ON "LotMaterial"("materialInId");

-- CreateIndex
CREATE UNIQUE INDEX "LotMaterial_lotId_role_place_key" ON "LotMaterial"("lotId", "role", "place");

-- CreateIndex
CREATE INDEX "Signal_machineId_idx" ON "Signal"("machineId");

-- CreateIndex
CREATE INDEX "Disposition_decidedAt_idx" ON "Disposition"("decidedAt");

-- CreateIndex
CREATE INDEX "LedgerEntry_at_idx" ON "LedgerEntry"("at");

-- CreateIndex
CREATE INDEX "Lot_madeAt_code_idx" ON "Lot"("madeAt", "code");

-- CreateIndex
CREATE INDEX "Lot_dieId_madeAt_idx" ON "Lot"("dieId", "madeAt");

-- CreateIndex
CREATE INDEX "Lot_measuredAt_idx" ON "Lot"("measuredAt");

-- AddForeignKey
ALTER TABLE "ImportRow" ADD CONSTRAINT "ImportRow_importId_fkey" FOREIGN KEY ("importId") REFERENCES "Import"("id") ON DELETE RESTRICT ON UPDATE CASCADE;

-- AddForeignKey
ALTER TABLE "MaterialIn" ADD CONSTRAINT "MaterialIn_materialId_fkey" FOREIGN KEY ("materialId") REFERENCES "Material"("id") ON DELETE SET NULL ON UPDATE CASCADE;

-- AddForeignKey
ALTER TABLE "MaterialIn" ADD CONSTRAINT "MaterialIn_parentId_fkey" FOREIGN KEY ("parentId") REFERENCES "MaterialIn"("id") ON DELETE SET NULL ON UPDATE CASCADE;

-- AddForeignKey
ALTER TABLE "LotMaterial" ADD CONSTRAINT "LotMaterial_lotId_fkey" FOREIGN KEY ("lotId") REFERENCES "Lot"("id") ON DELETE RESTRICT ON UPDATE CASCADE;

-- AddForeignKey
ALTER TABLE "LotMaterial" ADD CONSTRAINT "LotMaterial_materialInId_fkey" FOREIGN KEY ("materialInId") REFERENCES "MaterialIn"("id") ON DELETE RESTRICT ON UPDATE CASCADE;
