-- CreateTable
CREATE TABLE "Material" (
    "id" INTEGER NOT NULL PRIMARY KEY AUTOINCREMENT,
    "code" TEXT NOT NULL,
    "name" TEXT NOT NULL,
    "searchKey" TEXT NOT NULL,
    "kind" TEXT NOT NULL,
    "body" TEXT NOT NULL,
    "standing" TEXT NOT NULL,
    "source" TEXT NOT NULL,
    "builtIn" BOOLEAN NOT NULL DEFAULT false,
    "version" INTEGER NOT NULL DEFAULT 1,
    "createdAt" DATETIME NOT NULL
);

-- CreateTable
CREATE TABLE "Product" (
    "id" INTEGER NOT NULL PRIMARY KEY AUTOINCREMENT,
    "code" TEXT NOT NULL,
    "name" TEXT NOT NULL,
    "family" TEXT NOT NULL,
    "searchKey" TEXT NOT NULL,
    "construction" TEXT NOT NULL DEFAULT 'plain',
    "active" BOOLEAN NOT NULL DEFAULT true,
    "createdAt" DATETIME NOT NULL
);

-- CreateTable
CREATE TABLE "SpecificationRevision" (
    "id" INTEGER NOT NULL PRIMARY KEY AUTOINCREMENT,
    "productId" INTEGER NOT NULL,
    "number" INTEGER NOT NULL,
    "effectiveFrom" DATETIME NOT NULL,
    "materialId" INTEGER NOT NULL,
    "body" TEXT NOT NULL,
    "hash" TEXT NOT NULL,
    "note" TEXT NOT NULL DEFAULT '',
    "issuedAt" DATETIME NOT NULL,
    "issuedById" INTEGER,
    CONSTRAINT "SpecificationRevision_productId_fkey" FOREIGN KEY ("productId") REFERENCES "Product" ("id") ON DELETE RESTRICT ON UPDATE CASCADE,
    CONSTRAINT "SpecificationRevision_materialId_fkey" FOREIGN KEY ("materialId") REFERENCES "Material" ("id") ON DELETE RESTRICT ON UPDATE CASCADE
);

-- CreateTable
CREATE TABLE "LimitSet" (
    "id" INTEGER NOT NULL PRIMARY KEY AUTOINCREMENT,
    "productId" INTEGER NOT NULL,
    "characteristic" TEXT NOT NULL,
    "statistic" TEXT NOT NULL,
    "number" INTEGER NOT NULL,
    "centre" REAL NOT NULL,
    "sigma" REAL NOT NULL,
    "lower" REAL,
    "upper" REAL,
    "sigmaEstimator" TEXT NOT NULL,
    "lotCount" INTEGER NOT NULL,
    "provisional" BOOLEAN NOT NULL,
    "baseline" TEXT NOT NULL,
    "effectiveFrom" DATETIME NOT NULL,
    "frozenAt" DATETIME NOT NULL,
    "frozenById" INTEGER,
    "reason" TEXT NOT NULL DEFAULT '',
    "supersededAt" DATETIME,
    CONSTRAINT "LimitSet_productId_fkey" FOREIGN KEY ("productId") REFERENCES "Product" ("id") ON DELETE RESTRICT ON UPDATE CASCADE
);

-- CreateTable
CREATE TABLE "Signal" (
    "id" INTEGER NOT NULL PRIMARY KEY AUTOINCREMENT,
    "lotId" INTEGER NOT NULL,
    "productId" INTEGER NOT NULL,
    "characteristic" TEXT NOT NULL,
    "statistic" TEXT NOT NULL,
    "limitSetId" INTEGER NOT NULL,
    "rule" TEXT NOT NULL,
    "side" TEXT NOT NULL,
    "members" TEXT NOT NULL,
    "departure" REAL NOT NULL,
    "state" TEXT NOT NULL,
    "evidenceChanged" BOOLEAN NOT NULL DEFAULT false,
    "raisedAt" DATETIME NOT NULL,
    "answeredAt" DATETIME,
    "answeredById" INTEGER,
    "cause" TEXT NOT NULL DEFAULT '',
    "answer" TEXT NOT NULL DEFAULT '',
    "version" INTEGER NOT NULL DEFAULT 1,
    CONSTRAINT "Signal_lotId_fkey" FOREIGN KEY ("lotId") REFERENCES "Lot" ("id") ON DELETE RESTRICT ON UPDATE CASCADE,
    CONSTRAINT "Signal_productId_fkey" FOREIGN KEY ("productId") REFERENCES "Product" ("id") ON DELETE RESTRICT ON UPDATE CASCADE,
    CONSTRAINT "Signal_limitSetId_fkey" FOREIGN KEY ("limitSetId") REFERENCES "LimitSet" ("id") ON DELETE RESTRICT ON UPDATE CASCADE
);

-- CreateTable
CREATE TABLE "Disposition" (
    "id" INTEGER NOT NULL PRIMARY KEY AUTOINCREMENT,
    "lotId" INTEGER NOT NULL,
    "number" INTEGER NOT NULL,
    "verb" TEXT NOT NULL,
    "reason" TEXT NOT NULL,
    "decidedAt" DATETIME NOT NULL,
    "decidedById" INTEGER,
    "proposal" TEXT NOT NULL,
    "evidence" TEXT NOT NULL,
    "evidenceHash" TEXT NOT NULL,
    "evidenceChanged" BOOLEAN NOT NULL DEFAULT false,
    "current" BOOLEAN NOT NULL DEFAULT true,
    CONSTRAINT "Disposition_lotId_fkey" FOREIGN KEY ("lotId") REFERENCES "Lot" ("id") ON DELETE RESTRICT ON UPDATE CASCADE
);

-- CreateTable
CREATE TABLE "Datasheet" (
    "id" INTEGER NOT NULL PRIMARY KEY AUTOINCREMENT,
    "code" TEXT NOT NULL,
    "productId" INTEGER NOT NULL,
    "createdAt" DATETIME NOT NULL,
    CONSTRAINT "Datasheet_productId_fkey" FOREIGN KEY ("productId") REFERENCES "Product" ("id") ON DELETE RESTRICT ON UPDATE CASCADE
);

-- CreateTable
CREATE TABLE "DatasheetRevision" (
    "id" INTEGER NOT NULL PRIMARY KEY AUTOINCREMENT,
    "datasheetId" INTEGER NOT NULL,
    "number" INTEGER NOT NULL,
    "basis" TEXT NOT NULL,
    "modelVersion" TEXT NOT NULL,
    "body" TEXT NOT NULL,
    "hash" TEXT NOT NULL,
    "ledgerCount" INTEGER NOT NULL,
    "ledgerHash" TEXT NOT NULL,
    "publishedAt" DATETIME NOT NULL,
    "publishedById" INTEGER,
    "supersededAt" DATETIME,
    "evidenceChanged" BOOLEAN NOT NULL DEFAULT false,
    CONSTRAINT "DatasheetRevision_datasheetId_fkey" FOREIGN KEY ("datasheetId") REFERENCES "Datasheet" ("id") ON DELETE RESTRICT ON UPDATE CASCADE
);

-- CreateTable
CREATE TABLE "DatasheetLot" (
    "revisionId" INTEGER NOT NULL,
    "lotId" INTEGER NOT NULL,

    PRIMARY KEY ("revisionId", "lotId"),
    CONSTRAINT "DatasheetLot_revisionId_fkey" FOREIGN KEY ("revisionId") REFERENCES "DatasheetRevision" ("id") ON DELETE RESTRICT ON UPDATE CASCADE,
    CONSTRAINT "DatasheetLot_lotId_fkey" FOREIGN KEY ("lotId") REFERENCES "Lot" ("id") ON DELETE RESTRICT ON UPDATE CASCADE
);

-- CreateTable
CREATE TABLE "Gauge" (
    "id" INTEGER NOT NULL PRIMARY KEY AUTOINCREMENT,
    "code" TEXT NOT NULL,
    "name" TEXT NOT NULL,
    "searchKey" TEXT NOT NULL,
    "kind" TEXT NOT NULL,
    "resolution" REAL NOT NULL,
    "uAbsolute" REAL NOT NULL,
    "uRelative" REAL NOT NULL DEFAULT 0,
    "error" REAL NOT NULL DEFAULT 0,
    "mode" TEXT NOT NULL DEFAULT 'direct',
    "calibrationDueAt" DATETIME,
    "active" BOOLEAN NOT NULL DEFAULT true,
    "note" TEXT NOT NULL DEFAULT '',
    "version" INTEGER NOT NULL DEFAULT 1,
    "createdAt" DATETIME NOT NULL
);

-- CreateTable
CREATE TABLE "Weight" (
    "id" INTEGER NOT NULL PRIMARY KEY AUTOINCREMENT,
    "code" TEXT NOT NULL,
    "kind" TEXT NOT NULL,
    "searchKey" TEXT NOT NULL,
    "conventionalMass" REAL NOT NULL,
    "uMass" REAL NOT NULL,
    "active" BOOLEAN NOT NULL DEFAULT true,
    "note" TEXT NOT NULL DEFAULT '',
    "version" INTEGER NOT NULL DEFAULT 1,
    "createdAt" DATETIME NOT NULL
);

-- CreateTable
CREATE TABLE "Rig" (
    "id" INTEGER NOT NULL PRIMARY KEY AUTOINCREMENT,
    "code" TEXT NOT NULL,
    "name" TEXT NOT NULL,
    "searchKey" TEXT NOT NULL,
    "arrangement" TEXT NOT NULL DEFAULT 'vertical',
    "spanMetres" REAL NOT NULL,
    "uSpanMetres" REAL NOT NULL,
    "endCondition" TEXT NOT NULL DEFAULT 'knife',
    "uEndRelative" REAL,
    "frictionHalfWidth" REAL NOT NULL DEFAULT 0.0005,
    "hangingLengthMetres" REAL NOT NULL DEFAULT 0.3,
    "hangerCode" TEXT NOT NULL DEFAULT '',
    "weightCodes" TEXT NOT NULL DEFAULT '',
    "micrometerCode" TEXT NOT NULL DEFAULT '',
    "balanceCode" TEXT NOT NULL DEFAULT '',
    "ruleCode" TEXT NOT NULL DEFAULT '',
    "counterCode" TEXT NOT NULL DEFAULT '',
    "active" BOOLEAN NOT NULL DEFAULT true,
    "note" TEXT NOT NULL DEFAULT '',
    "version" INTEGER NOT NULL DEFAULT 1,
    "createdAt" DATETIME NOT NULL
);

-- CreateTable
CREATE TABLE "Machine" (
    "id" INTEGER NOT NULL PRIMARY KEY AUTOINCREMENT,
    "code" TEXT NOT NULL,
    "name" TEXT NOT NULL,
    "searchKey" TEXT NOT NULL,
    "kind" TEXT NOT NULL,
    "active" BOOLEAN NOT NULL DEFAULT true,
    "version" INTEGER NOT NULL DEFAULT 1,
    "createdAt" DATETIME NOT NULL
);

-- CreateTable
CREATE TABLE "Die" (
    "id" INTEGER NOT NULL PRIMARY KEY AUTOINCREMENT,
    "code" TEXT NOT NULL,
    "name" TEXT NOT NULL,
    "searchKey" TEXT NOT NULL,
    "sizeMetres" REAL NOT NULL,
    "active" BOOLEAN NOT NULL DEFAULT true,
    "version" INTEGER NOT NULL DEFAULT 1,
    "createdAt" DATETIME NOT NULL
);

-- CreateTable
CREATE TABLE "LedgerEntry" (
    "sequence" INTEGER NOT NULL PRIMARY KEY AUTOINCREMENT,
    "at" DATETIME NOT NULL,
    "personId" INTEGER,
    "verb" TEXT NOT NULL,
    "subject" TEXT NOT NULL,
    "body" TEXT NOT NULL,
    "previousHash" TEXT NOT NULL,
    "hash" TEXT NOT NULL
);

-- CreateTable
CREATE TABLE "LedgerHead" (
    "id" INTEGER NOT NULL PRIMARY KEY AUTOINCREMENT,
    "count" INTEGER NOT NULL,
    "hash" TEXT NOT NULL
);

-- CreateTable
CREATE TABLE "Request" (
    "id" INTEGER NOT NULL PRIMARY KEY AUTOINCREMENT,
    "clientId" TEXT NOT NULL,
    "personId" INTEGER NOT NULL,
    "bodyHash" TEXT NOT NULL,
    "status" INTEGER NOT NULL,
    "response" TEXT NOT NULL,
    "at" DATETIME NOT NULL
);

-- CreateTable
CREATE TABLE "Lot" (
    "id" INTEGER NOT NULL PRIMARY KEY AUTOINCREMENT,
    "code" TEXT NOT NULL,
    "searchKey" TEXT NOT NULL,
    "productId" INTEGER NOT NULL,
    "specificationRevisionId" INTEGER NOT NULL,
    "machineId" INTEGER,
    "dieId" INTEGER,
    "makerId" INTEGER,
    "madeAt" DATETIME NOT NULL,
    "lengthMetres" REAL,
    "setting" TEXT NOT NULL DEFAULT '',
    "state" TEXT NOT NULL,
    "evidenceChanged" BOOLEAN NOT NULL DEFAULT false,
    "version" INTEGER NOT NULL DEFAULT 1,
    "createdAt" DATETIME NOT NULL,
    "createdById" INTEGER,
    CONSTRAINT "Lot_productId_fkey" FOREIGN KEY ("productId") REFERENCES "Product" ("id") ON DELETE RESTRICT ON UPDATE CASCADE,
    CONSTRAINT "Lot_specificationRevisionId_fkey" FOREIGN KEY ("specificationRevisionId") REFERENCES "SpecificationRevision" ("id") ON DELETE RESTRICT ON UPDATE CASCADE,
    CONSTRAINT "Lot_machineId_fkey" FOREIGN KEY ("machineId") REFERENCES "Machine" ("id") ON DELETE SET NULL ON UPDATE CASCADE,
    CONSTRAINT "Lot_dieId_fkey" FOREIGN KEY ("dieId") REFERENCES "Die" ("id") ON DELETE SET NULL ON UPDATE CASCADE
);

-- CreateTable
CREATE TABLE "Specimen" (
    "id" INTEGER NOT NULL PRIMARY KEY AUTOINCREMENT,
    "clientId" TEXT NOT NULL,
    "lotId" INTEGER NOT NULL,
    "number" INTEGER NOT NULL,
    "takenAt" TEXT NOT NULL DEFAULT '',
    "currentEvaluationId" INTEGER,
    "createdAt" DATETIME NOT NULL,
    CONSTRAINT "Specimen_lotId_fkey" FOREIGN KEY ("lotId") REFERENCES "Lot" ("id") ON DELETE RESTRICT ON UPDATE CASCADE
);

-- CreateTable
CREATE TABLE "Reading" (
    "id" INTEGER NOT NULL PRIMARY KEY AUTOINCREMENT,
    "clientId" TEXT NOT NULL,
    "specimenId" INTEGER NOT NULL,
    "kind" TEXT NOT NULL,
    "body" TEXT NOT NULL,
    "hash" TEXT NOT NULL,
    "personId" INTEGER,
    "measuredAt" DATETIME NOT NULL,
    "recordedAt" DATETIME NOT NULL,
    "rigId" INTEGER,
    "micrometerId" INTEGER,
    "balanceId" INTEGER,
    "ruleId" INTEGER,
    "counterId" INTEGER,
    "supersedesId" INTEGER,
    "reason" TEXT NOT NULL DEFAULT '',
    CONSTRAINT "Reading_specimenId_fkey" FOREIGN KEY ("specimenId") REFERENCES "Specimen" ("id") ON DELETE RESTRICT ON UPDATE CASCADE,
    CONSTRAINT "Reading_supersedesId_fkey" FOREIGN KEY ("supersedesId") REFERENCES "Reading" ("id") ON DELETE SET NULL ON UPDATE CASCADE
);

-- CreateTable
CREATE TABLE "InputSnapshot" (
    "id" INTEGER NOT NULL PRIMARY KEY AUTOINCREMENT,
    "hash" TEXT NOT NULL,
    "body" TEXT NOT NULL,
    "createdAt" DATETIME NOT NULL
);

-- CreateTable
CREATE TABLE "Evaluation" (
    "id" INTEGER NOT NULL PRIMARY KEY AUTOINCREMENT,
    "specimenId" INTEGER NOT NULL,
    "number" INTEGER NOT NULL,
    "modelVersion" TEXT NOT NULL,
    "snapshotId" INTEGER NOT NULL,
    "inputHash" TEXT NOT NULL,
    "cause" TEXT NOT NULL,
    "at" DATETIME NOT NULL,
    CONSTRAINT "Evaluation_specimenId_fkey" FOREIGN KEY ("specimenId") REFERENCES "Specimen" ("id") ON DELETE RESTRICT ON UPDATE CASCADE,
    CONSTRAINT "Evaluation_snapshotId_fkey" FOREIGN KEY ("snapshotId") REFERENCES "InputSnapshot" ("id") ON DELETE RESTRICT ON UPDATE CASCADE
);

-- CreateTable
CREATE TABLE "SpecimenResult" (
    "evaluationId" INTEGER NOT NULL PRIMARY KEY AUTOINCREMENT,
    "diameter" REAL,
    "diameterU" REAL,
    "diameterUc" REAL,
    "ovality" REAL,
    "ovalityU" REAL,
    "ovalityUc" REAL,
    "massPerMetreWeighed" REAL,
    "massPerMetreWeighedU" REAL,
    "massPerMetreWeighedUc" REAL,
    "massPerMetreSounded" REAL,
    "massPerMetreSoundedU" REAL,
    "massPerMetreSoundedUc" REAL,
    "closure" REAL,
    "closureU" REAL,
    "closureUc" REAL,
    "densityCheckWeighed" REAL,
    "densityCheckWeighedU" REAL,
    "densityCheckWeighedUc" REAL,
    "densityCheckSounded" REAL,
    "densityCheckSoundedU" REAL,
    "densityCheckSoundedUc" REAL,
    "effectiveDensity" REAL,
    "effectiveDensityU" REAL,
    "effectiveDensityUc" REAL,
    "tension" REAL,
    "tensionU" REAL,
    "tensionUc" REAL,
    "pitchError" REAL,
    "pitchErrorU" REAL,
    "pitchErrorUc" REAL,
    CONSTRAINT "SpecimenResult_evaluationId_fkey" FOREIGN KEY ("evaluationId") REFERENCES "Evaluation" ("id") ON DELETE RESTRICT ON UPDATE CASCADE
);

-- CreateTable
CREATE TABLE "LotSummary" (
    "id" INTEGER NOT NULL PRIMARY KEY AUTOINCREMENT,
    "lotId" INTEGER NOT NULL,
    "characteristic" TEXT NOT NULL,
    "modelVersion" TEXT NOT NULL,
    "n" INTEGER NOT NULL,
    "mean" REAL NOT NULL,
    "m2" REAL NOT NULL,
    "min" REAL NOT NULL,
    "max" REAL NOT NULL,
    "uCommon" REAL NOT NULL,
    "uMean" REAL NOT NULL,
    "productId" INTEGER NOT NULL,
    "machineId" INTEGER,
    "madeAt" DATETIME NOT NULL,
    CONSTRAINT "LotSummary_lotId_fkey" FOREIGN KEY ("lotId") REFERENCES "Lot" ("id") ON DELETE RESTRICT ON UPDATE CASCADE
);

-- CreateTable
CREATE TABLE "Person" (
    "id" INTEGER NOT NULL PRIMARY KEY AUTOINCREMENT,
    "name" TEXT NOT NULL,
    "username" TEXT NOT NULL,
    "searchKey" TEXT NOT NULL,
    "active" BOOLEAN NOT NULL DEFAULT true,
    "version" INTEGER NOT NULL DEFAULT 1,
    "createdAt" DATETIME NOT NULL,
    "userId" TEXT
);

-- CreateTable
CREATE TABLE "PersonRole" (
    "personId" INTEGER NOT NULL,
    "role" TEXT NOT NULL,

    PRIMARY KEY ("personId", "role"),
    CONSTRAINT "PersonRole_personId_fkey" FOREIGN KEY ("personId") REFERENCES "Person" ("id") ON DELETE RESTRICT ON UPDATE CASCADE
);

-- CreateTable
CREATE TABLE "User" (
    "id" TEXT NOT NULL PRIMARY KEY,
    "name" TEXT NOT NULL,
    "email" TEXT NOT NULL,
    "emailVerified" BOOLEAN NOT NULL DEFAULT false,
    "image" TEXT,
    "username" TEXT,
    "displayUsername" TEXT,
    "createdAt" DATETIME NOT NULL,
    "updatedAt" DATETIME NOT NULL
);

-- CreateTable
CREATE TABLE "Session" (
    "id" TEXT NOT NULL PRIMARY KEY,
    "expiresAt" DATETIME NOT NULL,
    "token" TEXT NOT NULL,
    "createdAt" DATETIME NOT NULL,
    "updatedAt" DATETIME NOT NULL,
    "ipAddress" TEXT,
    "userAgent" TEXT,
    "userId" TEXT NOT NULL,
    CONSTRAINT "Session_userId_fkey" FOREIGN KEY ("userId") REFERENCES "User" ("id") ON DELETE CASCADE ON UPDATE CASCADE
);

-- CreateTable
CREATE TABLE "Account" (
    "id" TEXT NOT NULL PRIMARY KEY,
    "accountId" TEXT NOT NULL,
    "providerId" TEXT NOT NULL,
    "userId" TEXT NOT NULL,
    "accessToken" TEXT,
    "refreshToken" TEXT,
    "idToken" TEXT,
    "accessTokenExpiresAt" DATETIME,
    "refreshTokenExpiresAt" DATETIME,
    "scope" TEXT,
    "password" TEXT,
    "createdAt" DATETIME NOT NULL,
    "updatedAt" DATETIME NOT NULL,
    CONSTRAINT "Account_userId_fkey" FOREIGN KEY ("userId") REFERENCES "User" ("id") ON DELETE CASCADE ON UPDATE CASCADE
);

-- CreateTable
CREATE TABLE "Verification" (
    "id" TEXT NOT NULL PRIMARY KEY,
    "identifier" TEXT NOT NULL,
    "value" TEXT NOT NULL,
    "expiresAt" DATETIME NOT NULL,
    "createdAt" DATETIME NOT NULL,
    "updatedAt" DATETIME NOT NULL
);

-- CreateTable
CREATE TABLE "SignInAttempt" (
    "key" TEXT NOT NULL PRIMARY KEY,
    "failures" INTEGER NOT NULL,
    "windowStart" DATETIME NOT NULL,
    "blockedUntil" DATETIME
);

-- CreateTable
CREATE TABLE "Works" (
    "id" INTEGER NOT NULL PRIMARY KEY AUTOINCREMENT,
    "name" TEXT NOT NULL,
    "place" TEXT NOT NULL DEFAULT '',
    "timeZone" TEXT NOT NULL,
    "latitudeDegrees" REAL NOT NULL,
    "heightMetres" REAL NOT NULL,
    "gravityTyped" REAL,
    "airTemperatureCelsius" REAL NOT NULL DEFAULT 20,
    "airPressurePascals" REAL NOT NULL DEFAULT 101325,
    "airHumidity" REAL NOT NULL DEFAULT 0.5,
    "lengthUnit" TEXT NOT NULL DEFAULT 'mm',
    "diameterUnit" TEXT NOT NULL DEFAULT 'mm',
    "forceUnit" TEXT NOT NULL DEFAULT 'N',
    "massUnit" TEXT NOT NULL DEFAULT 'mg',
    "numberFormat" TEXT NOT NULL DEFAULT 'point',
    "a4" REAL NOT NULL DEFAULT 440,
    "secondPersonPublishes" BOOLEAN NOT NULL DEFAULT false,
    "demo" BOOLEAN NOT NULL DEFAULT false,
    "version" INTEGER NOT NULL DEFAULT 1,
    "createdAt" DATETIME NOT NULL
);

-- CreateIndex
CREATE UNIQUE INDEX "Material_code_key" ON "Material"("code");

-- CreateIndex
CREATE UNIQUE INDEX "Product_code_key" ON "Product"("code");

-- CreateIndex
CREATE INDEX "SpecificationRevision_productId_effectiveFrom_idx" ON "SpecificationRevision"("productId", "effectiveFrom");

-- CreateIndex
CREATE UNIQUE INDEX "SpecificationRevision_productId_number_key" ON "SpecificationRevision"("productId", "number");

-- CreateIndex
CREATE UNIQUE INDEX "LimitSet_productId_characteristic_statistic_number_key" ON "LimitSet"("productId", "characteristic", "statistic", "number");

-- CreateIndex
CREATE INDEX "Signal_state_raisedAt_idx" ON "Signal"("state", "raisedAt");

-- CreateIndex
CREATE INDEX "Signal_productId_characteristic_idx" ON "Signal"("productId", "characteristic");

-- CreateIndex
CREATE INDEX "Signal_lotId_idx" ON "Signal"("lotId");

-- CreateIndex
CREATE UNIQUE INDEX "Disposition_lotId_number_key" ON "Disposition"("lotId", "number");

-- CreateIndex
CREATE UNIQUE INDEX "Datasheet_code_key" ON "Datasheet"("code");

-- CreateIndex
CREATE UNIQUE INDEX "DatasheetRevision_datasheetId_number_key" ON "DatasheetRevision"("datasheetId", "number");

-- CreateIndex
CREATE INDEX "DatasheetLot_lotId_idx" ON "DatasheetLot"("lotId");

-- CreateIndex
CREATE UNIQUE INDEX "Gauge_code_key" ON "Gauge"("code");

-- CreateIndex
CREATE UNIQUE INDEX "Weight_code_key" ON "Weight"("code");

-- CreateIndex
CREATE UNIQUE INDEX "Rig_code_key" ON "Rig"("code");

-- CreateIndex
CREATE UNIQUE INDEX "Machine_code_key" ON "Machine"("code");

-- CreateIndex
CREATE UNIQUE INDEX "Die_code_key" ON "Die"("code");

-- CreateIndex
CREATE UNIQUE INDEX "LedgerEntry_hash_key" ON "LedgerEntry"("hash");

-- CreateIndex
CREATE INDEX "LedgerEntry_subject_idx" ON "LedgerEntry"("subject");

-- CreateIndex
CREATE UNIQUE INDEX "Request_clientId_key" ON "Request"("clientId");

-- CreateIndex
CREATE UNIQUE INDEX "Lot_code_key" ON "Lot"("code");

-- CreateIndex
CREATE INDEX "Lot_productId_madeAt_code_idx" ON "Lot"("productId", "madeAt", "code");

-- CreateIndex
CREATE INDEX "Lot_state_madeAt_idx" ON "Lot"("state", "madeAt");

-- CreateIndex
CREATE INDEX "Lot_searchKey_idx" ON "Lot"("searchKey");

-- CreateIndex
CREATE INDEX "Lot_machineId_madeAt_idx" ON "Lot"("machineId", "madeAt");

-- CreateIndex
CREATE UNIQUE INDEX "Specimen_clientId_key" ON "Specimen"("clientId");

-- CreateIndex
CREATE UNIQUE INDEX "Specimen_currentEvaluationId_key" ON "Specimen"("currentEvaluationId");

-- CreateIndex
CREATE UNIQUE INDEX "Specimen_lotId_number_key" ON "Specimen"("lotId", "number");

-- CreateIndex
CREATE UNIQUE INDEX "Reading_clientId_key" ON "Reading"("clientId");

-- CreateIndex
CREATE UNIQUE INDEX "Reading_supersedesId_key" ON "Reading"("supersedesId");

-- CreateIndex
CREATE INDEX "Reading_specimenId_idx" ON "Reading"("specimenId");

-- CreateIndex
CREATE UNIQUE INDEX "InputSnapshot_hash_key" ON "InputSnapshot"("hash");

-- CreateIndex
CREATE UNIQUE INDEX "Evaluation_specimenId_number_key" ON "Evaluation"("specimenId", "number");

-- CreateIndex
CREATE INDEX "LotSummary_productId_characteristic_madeAt_idx" ON "LotSummary"("productId", "characteristic", "madeAt");

-- CreateIndex
CREATE UNIQUE INDEX "LotSummary_lotId_characteristic_modelVersion_key" ON "LotSummary"("lotId", "characteristic", "modelVersion");

-- CreateIndex
CREATE UNIQUE INDEX "Person_username_key" ON "Person"("username");

-- CreateIndex
CREATE UNIQUE INDEX "Person_userId_key" ON "Person"("userId");

-- CreateIndex
CREATE UNIQUE INDEX "User_email_key" ON "User"("email");

-- CreateIndex
CREATE UNIQUE INDEX "User_username_key" ON "User"("username");

-- CreateIndex
CREATE UNIQUE INDEX "Session_token_key" ON "Session"("token");

-- CreateIndex
CREATE INDEX "Session_userId_idx" ON "Session"("userId");

-- CreateIndex
CREATE INDEX "Account_userId_idx" ON "Account"("userId");
