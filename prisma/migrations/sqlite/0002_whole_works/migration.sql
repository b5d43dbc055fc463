-- AlterTable
ALTER TABLE "LimitSet" ADD COLUMN "rules" TEXT;
ALTER TABLE "LimitSet" ADD COLUMN "target" REAL;

-- AlterTable
ALTER TABLE "Signal" ADD COLUMN "machineId" INTEGER;

-- AlterTable
ALTER TABLE "Lot" ADD COLUMN "measuredAt" DATETIME;

-- CreateTable
CREATE TABLE "ImportMapping" (
    "id" INTEGER NOT NULL PRIMARY KEY AUTOINCREMENT,
    "name" TEXT NOT NULL,
    "body" TEXT NOT NULL,
    "version" INTEGER NOT NULL DEFAULT 1,
    "createdAt" DATETIME NOT NULL,
    "createdById" INTEGER
);

-- CreateTable
CREATE TABLE "Import" (
    "id" INTEGER NOT NULL PRIMARY KEY AUTOINCREMENT,
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
    "createdAt" DATETIME NOT NULL,
    "createdById" INTEGER NOT NULL,
    "startedAt" DATETIME,
    "endedAt" DATETIME,
    "version" INTEGER NOT NULL DEFAULT 1
);

-- CreateTable
CREATE TABLE "ImportRow" (
    "id" INTEGER NOT NULL PRIMARY KEY AUTOINCREMENT,
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
    "decidedAt" DATETIME,
    "decidedById" INTEGER,
    CONSTRAINT "ImportRow_importId_fkey" FOREIGN KEY ("importId") REFERENCES "Import" ("id") ON DELETE RESTRICT ON UPDATE CASCADE
);

-- CreateTable
CREATE TABLE "MaterialIn" (
    "id" INTEGER NOT NULL PRIMARY KEY AUTOINCREMENT,
    "code" TEXT NOT NULL,
    "name" TEXT NOT NULL,
    "searchKey" TEXT NOT NULL,
    "kind" TEXT NOT NULL,
    "materialId" INTEGER,
    "heat" TEXT NOT NULL DEFAULT '',
    "supplier" TEXT NOT NULL DEFAULT '',
    "parentId" INTEGER,
    "sizeMetres" REAL,
    "lengthMetres" REAL,
    "massKilograms" REAL,
    "receivedAt" DATETIME,
    "active" BOOLEAN NOT NULL DEFAULT true,
    "note" TEXT NOT NULL DEFAULT '',
    "version" INTEGER NOT NULL DEFAULT 1,
    "createdAt" DATETIME NOT NULL,
    CONSTRAINT "MaterialIn_materialId_fkey" FOREIGN KEY ("materialId") REFERENCES "Material" ("id") ON DELETE SET NULL ON UPDATE CASCADE,
    CONSTRAINT "MaterialIn_parentId_fkey" FOREIGN KEY ("parentId") REFERENCES "MaterialIn" ("id") ON DELETE SET NULL ON UPDATE CASCADE
);

-- CreateTable
CREATE TABLE "LotMaterial" (
    "id" INTEGER NOT NULL PRIMARY KEY AUTOINCREMENT,
    "lotId" INTEGER NOT NULL,
    "role" TEXT NOT NULL,
    "place" INTEGER NOT NULL DEFAULT 1,
    "materialInId" INTEGER NOT NULL,
    "fromMetre" REAL,
    "toMetre" REAL,
    CONSTRAINT "LotMaterial_lotId_fkey" FOREIGN KEY ("lotId") REFERENCES "Lot" ("id") ON DELETE RESTRICT ON UPDATE CASCADE,
    CONSTRAINT "LotMaterial_materialInId_fkey" FOREIGN KEY ("materialInId") REFERENCES "MaterialIn" ("id") ON DELETE RESTRICT ON UPDATE CASCADE
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
