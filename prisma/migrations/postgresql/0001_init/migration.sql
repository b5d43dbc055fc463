-- CreateSchema
CREATE SCHEMA IF NOT EXISTS "public";

-- CreateTable
CREATE TABLE "Material" (
    "id" SERIAL NOT NULL,
    "code" TEXT NOT NULL,
    "name" TEXT NOT NULL,
    "searchKey" TEXT NOT NULL,
    "kind" TEXT NOT NULL,
    "body" TEXT NOT NULL,
    "standing" TEXT NOT NULL,
    "source" TEXT NOT NULL,
    "builtIn" BOOLEAN NOT NULL DEFAULT false,
    "version" INTEGER NOT NULL DEFAULT 1,
    "createdAt" TIMESTAMP(3) NOT NULL,

    CONSTRAINT "Material_pkey" PRIMARY KEY ("id")
);

-- CreateTable
CREATE TABLE "Product" (
    "id" SERIAL NOT NULL,
    "code" TEXT NOT NULL,
    "name" TEXT NOT NULL,
    "family" TEXT NOT NULL,
    "searchKey" TEXT NOT NULL,
    "construction" TEXT NOT NULL DEFAULT 'plain',
    "active" BOOLEAN NOT NULL DEFAULT true,
    "createdAt" TIMESTAMP(3) NOT NULL,

    CONSTRAINT "Product_pkey" PRIMARY KEY ("id")
);

-- CreateTable
CREATE TABLE "SpecificationRevision" (
    "id" SERIAL NOT NULL,
    "productId" INTEGER NOT NULL,
    "number" INTEGER NOT NULL,
    "effectiveFrom" TIMESTAMP(3) NOT NULL,
    "materialId" INTEGER NOT NULL,
    "body" TEXT NOT NULL,
    "hash" TEXT NOT NULL,
    "note" TEXT NOT NULL DEFAULT '',
    "issuedAt" TIMESTAMP(3) NOT NULL,
    "issuedById" INTEGER,

    CONSTRAINT "SpecificationRevision_pkey" PRIMARY KEY ("id")
);

-- CreateTable
CREATE TABLE "LimitSet" (
    "id" SERIAL NOT NULL,
    "productId" INTEGER NOT NULL,
    "characteristic" TEXT NOT NULL,
    "statistic" TEXT NOT NULL,
    "number" INTEGER NOT NULL,
    "centre" DOUBLE PRECISION NOT NULL,
    "sigma" DOUBLE PRECISION NOT NULL,
    "lower" DOUBLE PRECISION,
    "upper" DOUBLE PRECISION,
    "sigmaEstimator" TEXT NOT NULL,
    "lotCount" INTEGER NOT NULL,
    "provisional" BOOLEAN NOT NULL,
    "baseline" TEXT NOT NULL,
    "effectiveFrom" TIMESTAMP(3) NOT NULL,
    "frozenAt" TIMESTAMP(3) NOT NULL,
    "frozenById" INTEGER,
    "reason" TEXT NOT NULL DEFAULT '',
    "supersededAt" TIMESTAMP(3),

    CONSTRAINT "LimitSet_pkey" PRIMARY KEY ("id")
);

-- CreateTable
CREATE TABLE "Signal" (
    "id" SERIAL NOT NULL,
    "lotId" INTEGER NOT NULL,
    "productId" INTEGER NOT NULL,
    "characteristic" TEXT NOT NULL,
    "statistic" TEXT NOT NULL,
    "limitSetId" INTEGER NOT NULL,
    "rule" TEXT NOT NULL,
    "side" TEXT NOT NULL,
    "members" TEXT NOT NULL,
    "departure" DOUBLE PRECISION NOT NULL,
    "state" TEXT NOT NULL,
    "evidenceChanged" BOOLEAN NOT NULL DEFAULT false,
    "raisedAt" TIMESTAMP(3) NOT NULL,
    "answeredAt" TIMESTAMP(3),
    "answeredById" INTEGER,
    "cause" TEXT NOT NULL DEFAULT '',
    "answer" TEXT NOT NULL DEFAULT '',
    "version" INTEGER NOT NULL DEFAULT 1,

    CONSTRAINT "Signal_pkey" PRIMARY KEY ("id")
);

-- CreateTable
CREATE TABLE "Disposition" (
    "id" SERIAL NOT NULL,
    "lotId" INTEGER NOT NULL,
    "number" INTEGER NOT NULL,
    "verb" TEXT NOT NULL,
    "reason" TEXT NOT NULL,
    "decidedAt" TIMESTAMP(3) NOT NULL,
    "decidedById" INTEGER,
    "proposal" TEXT NOT NULL,
    "evidence" TEXT NOT NULL,
    "evidenceHash" TEXT NOT NULL,
    "evidenceChanged" BOOLEAN NOT NULL DEFAULT false,
    "current" BOOLEAN NOT NULL DEFAULT true,

    CONSTRAINT "Disposition_pkey" PRIMARY KEY ("id")
);

-- CreateTable
CREATE TABLE "Datasheet" (
    "id" SERIAL NOT NULL,
    "code" TEXT NOT NULL,
    "productId" INTEGER NOT NULL,
    "createdAt" TIMESTAMP(3) NOT NULL,

    CONSTRAINT "Datasheet_pkey" PRIMARY KEY ("id")
);

-- CreateTable
CREATE TABLE "DatasheetRevision" (
    "id" SERIAL NOT NULL,
    "datasheetId" INTEGER NOT NULL,
    "number" INTEGER NOT NULL,
    "basis" TEXT NOT NULL,
    "modelVersion" TEXT NOT NULL,
    "body" TEXT NOT NULL,
    "hash" TEXT NOT NULL,
    "ledgerCount" INTEGER NOT NULL,
    "ledgerHash" TEXT NOT NULL,
    "publishedAt" TIMESTAMP(3) NOT NULL,
    "publishedById" INTEGER,
    "supersededAt" TIMESTAMP(3),
    "evidenceChanged" BOOLEAN NOT NULL DEFAULT false,

    CONSTRAINT "DatasheetRevision_pkey" PRIMARY KEY ("id")
);

-- CreateTable
CREATE TABLE "DatasheetLot" (
    "revisionId" INTEGER NOT NULL,
    "lotId" INTEGER NOT NULL,

    CONSTRAINT "DatasheetLot_pkey" PRIMARY KEY ("revisionId","lotId")
);

-- CreateTable
CREATE TABLE "Gauge" (
    "id" SERIAL NOT NULL,
    "code" TEXT NOT NULL,
    "name" TEXT NOT NULL,
    "searchKey" TEXT NOT NULL,
    "kind" TEXT NOT NULL,
    "resolution" DOUBLE PRECISION NOT NULL,
    "uAbsolute" DOUBLE PRECISION NOT NULL,
    "uRelative" DOUBLE PRECISION NOT NULL DEFAULT 0,
    "error" DOUBLE PRECISION NOT NULL DEFAULT 0,
    "mode" TEXT NOT NULL DEFAULT 'direct',
    "calibrationDueAt" TIMESTAMP(3),
    "active" BOOLEAN NOT NULL DEFAULT true,
    "note" TEXT NOT NULL DEFAULT '',
    "version" INTEGER NOT NULL DEFAULT 1,
    "createdAt" TIMESTAMP(3) NOT NULL,

    CONSTRAINT "Gauge_pkey" PRIMARY KEY ("id")
);

-- CreateTable
CREATE TABLE "Weight" (
    "id" SERIAL NOT NULL,
    "code" TEXT NOT NULL,
    "kind" TEXT NOT NULL,
    "searchKey" TEXT NOT NULL,
    "conventionalMass" DOUBLE PRECISION NOT NULL,
    "uMass" DOUBLE PRECISION NOT NULL,
    "active" BOOLEAN NOT NULL DEFAULT true,
    "note" TEXT NOT NULL DEFAULT '',
    "version" INTEGER NOT NULL DEFAULT 1,
    "createdAt" TIMESTAMP(3) NOT NULL,

    CONSTRAINT "Weight_pkey" PRIMARY KEY ("id")
);

-- CreateTable
CREATE TABLE "Rig" (
    "id" SERIAL NOT NULL,
    "code" TEXT NOT NULL,
    "name" TEXT NOT NULL,
    "searchKey" TEXT NOT NULL,
    "arrangement" TEXT NOT NULL DEFAULT 'vertical',
    "spanMetres" DOUBLE PRECISION NOT NULL,
    "uSpanMetres" DOUBLE PRECISION NOT NULL,
    "endCondition" TEXT NOT NULL DEFAULT 'knife',
    "uEndRelative" DOUBLE PRECISION,
    "frictionHalfWidth" DOUBLE PRECISION NOT NULL DEFAULT 0.0005,
    "hangingLengthMetres" DOUBLE PRECISION NOT NULL DEFAULT 0.3,
    "hangerCode" TEXT NOT NULL DEFAULT '',
    "weightCodes" TEXT NOT NULL DEFAULT '',
    "micrometerCode" TEXT NOT NULL DEFAULT '',
    "balanceCode" TEXT NOT NULL DEFAULT '',
    "ruleCode" TEXT NOT NULL DEFAULT '',
    "counterCode" TEXT NOT NULL DEFAULT '',
    "active" BOOLEAN NOT NULL DEFAULT true,
    "note" TEXT NOT NULL DEFAULT '',
    "version" INTEGER NOT NULL DEFAULT 1,
    "createdAt" TIMESTAMP(3) NOT NULL,

    CONSTRAINT "Rig_pkey" PRIMARY KEY ("id")
);

-- CreateTable
CREATE TABLE "Machine" (
    "id" SERIAL NOT NULL,
    "code" TEXT NOT NULL,
    "name" TEXT NOT NULL,
    "searchKey" TEXT NOT NULL,
    "kind" TEXT NOT NULL,
    "active" BOOLEAN NOT NULL DEFAULT true,
    "version" INTEGER NOT NULL DEFAULT 1,
    "createdAt" TIMESTAMP(3) NOT NULL,

    CONSTRAINT "Machine_pkey" PRIMARY KEY ("id")
);

-- CreateTable
CREATE TABLE "Die" (
    "id" SERIAL NOT NULL,
    "code" TEXT NOT NULL,
    "name" TEXT NOT NULL,
    "searchKey" TEXT NOT NULL,
    "sizeMetres" DOUBLE PRECISION NOT NULL,
    "active" BOOLEAN NOT NULL DEFAULT true,
    "version" INTEGER NOT NULL DEFAULT 1,
    "createdAt" TIMESTAMP(3) NOT NULL,

    CONSTRAINT "Die_pkey" PRIMARY KEY ("id")
);

-- CreateTable
CREATE TABLE "LedgerEntry" (
    "sequence" INTEGER NOT NULL,
    "at" TIMESTAMP(3) NOT NULL,
    "personId" INTEGER,
    "verb" TEXT NOT NULL,
    "subject" TEXT NOT NULL,
    "body" TEXT NOT NULL,
    "previousHash" TEXT NOT NULL,
    "hash" TEXT NOT NULL,

    CONSTRAINT "LedgerEntry_pkey" PRIMARY KEY ("sequence")
);

-- CreateTable
CREATE TABLE "LedgerHead" (
    "id" INTEGER NOT NULL,
    "count" INTEGER NOT NULL,
    "hash" TEXT NOT NULL,

    CONSTRAINT "LedgerHead_pkey" PRIMARY KEY ("id")
);

-- CreateTable
CREATE TABLE "Request" (
    "id" SERIAL NOT NULL,
    "clientId" TEXT NOT NULL,
    "personId" INTEGER NOT NULL,
    "bodyHash" TEXT NOT NULL,
    "status" INTEGER NOT NULL,
    "response" TEXT NOT NULL,
    "at" TIMESTAMP(3) NOT NULL,

    CONSTRAINT "Request_pkey" PRIMARY KEY ("id")
);

-- CreateTable
CREATE TABLE "Lot" (
    "id" SERIAL NOT NULL,
    "code" TEXT NOT NULL,
    "searchKey" TEXT NOT NULL,
    "productId" INTEGER NOT NULL,
    "specificationRevisionId" INTEGER NOT NULL,
    "machineId" INTEGER,
    "dieId" INTEGER,
    "makerId" INTEGER,
    "madeAt" TIMESTAMP(3) NOT NULL,
    "lengthMetres" DOUBLE PRECISION,
    "setting" TEXT NOT NULL DEFAULT '',
    "state" TEXT NOT NULL,
    "evidenceChanged" BOOLEAN NOT NULL DEFAULT false,
    "version" INTEGER NOT NULL DEFAULT 1,
    "createdAt" TIMESTAMP(3) NOT NULL,
    "createdById" INTEGER,

    CONSTRAINT "Lot_pkey" PRIMARY KEY ("id")
);

-- CreateTable
CREATE TABLE "Specimen" (
    "id" SERIAL NOT NULL,
    "clientId" TEXT NOT NULL,
    "lotId" INTEGER NOT NULL,
    "number" INTEGER NOT NULL,
    "takenAt" TEXT NOT NULL DEFAULT '',
    "currentEvaluationId" INTEGER,
    "createdAt" TIMESTAMP(3) NOT NULL,

    CONSTRAINT "Specimen_pkey" PRIMARY KEY ("id")
);

-- CreateTable
CREATE TABLE "Reading" (
    "id" SERIAL NOT NULL,
    "clientId" TEXT NOT NULL,
    "specimenId" INTEGER NOT NULL,
    "kind" TEXT NOT NULL,
    "body" TEXT NOT NULL,
    "hash" TEXT NOT NULL,
    "personId" INTEGER,
    "measuredAt" TIMESTAMP(3) NOT NULL,
    "recordedAt" TIMESTAMP(3) NOT NULL,
    "rigId" INTEGER,
    "micrometerId" INTEGER,
    "balanceId" INTEGER,
    "ruleId" INTEGER,
    "counterId" INTEGER,
    "supersedesId" INTEGER,
    "reason" TEXT NOT NULL DEFAULT '',

    CONSTRAINT "Reading_pkey" PRIMARY KEY ("id")
);

-- CreateTable
CREATE TABLE "InputSnapshot" (
    "id" SERIAL NOT NULL,
    "hash" TEXT NOT NULL,
    "body" TEXT NOT NULL,
    "createdAt" TIMESTAMP(3) NOT NULL,

    CONSTRAINT "InputSnapshot_pkey" PRIMARY KEY ("id")
);

-- CreateTable
CREATE TABLE "Evaluation" (
    "id" SERIAL NOT NULL,
    "specimenId" INTEGER NOT NULL,
    "number" INTEGER NOT NULL,
    "modelVersion" TEXT NOT NULL,
    "snapshotId" INTEGER NOT NULL,
    "inputHash" TEXT NOT NULL,
    "cause" TEXT NOT NULL,
    "at" TIMESTAMP(3) NOT NULL,

    CONSTRAINT "Evaluation_pkey" PRIMARY KEY ("id")
);

-- CreateTable
CREATE TABLE "SpecimenResult" (
    "evaluationId" INTEGER NOT NULL,
    "diameter" DOUBLE PRECISION,
    "diameterU" DOUBLE PRECISION,
    "diameterUc" DOUBLE PRECISION,
    "ovality" DOUBLE PRECISION,
    "ovalityU" DOUBLE PRECISION,
    "ovalityUc" DOUBLE PRECISION,
    "massPerMetreWeighed" DOUBLE PRECISION,
    "massPerMetreWeighedU" DOUBLE PRECISION,
    "massPerMetreWeighedUc" DOUBLE PRECISION,
    "massPerMetreSounded" DOUBLE PRECISION,
    "massPerMetreSoundedU" DOUBLE PRECISION,
    "massPerMetreSoundedUc" DOUBLE PRECISION,
    "closure" DOUBLE PRECISION,
    "closureU" DOUBLE PRECISION,
    "closureUc" DOUBLE PRECISION,
    "densityCheckWeighed" DOUBLE PRECISION,
    "densityCheckWeighedU" DOUBLE PRECISION,
    "densityCheckWeighedUc" DOUBLE PRECISION,
    "densityCheckSounded" DOUBLE PRECISION,
    "densityCheckSoundedU" DOUBLE PRECISION,
    "densityCheckSoundedUc" DOUBLE PRECISION,
    "effectiveDensity" DOUBLE PRECISION,
    "effectiveDensityU" DOUBLE PRECISION,
    "effectiveDensityUc" DOUBLE PRECISION,
    "tension" DOUBLE PRECISION,
    "tensionU" DOUBLE PRECISION,
    "tensionUc" DOUBLE PRECISION,
    "pitchError" DOUBLE PRECISION,
    "pitchErrorU" DOUBLE PRECISION,
    "pitchErrorUc" DOUBLE PRECISION,

    CONSTRAINT "SpecimenResult_pkey" PRIMARY KEY ("evaluationId")
);

-- CreateTable
CREATE TABLE "LotSummary" (
    "id" SERIAL NOT NULL,
    "lotId" INTEGER NOT NULL,
    "characteristic" TEXT NOT NULL,
    "modelVersion" TEXT NOT NULL,
    "n" INTEGER NOT NULL,
    "mean" DOUBLE PRECISION NOT NULL,
    "m2" DOUBLE PRECISION NOT NULL,
    "min" DOUBLE PRECISION NOT NULL,
    "max" DOUBLE PRECISION NOT NULL,
    "uCommon" DOUBLE PRECISION NOT NULL,
    "uMean" DOUBLE PRECISION NOT NULL,
    "productId" INTEGER NOT NULL,
    "machineId" INTEGER,
    "madeAt" TIMESTAMP(3) NOT NULL,

    CONSTRAINT "LotSummary_pkey" PRIMARY KEY ("id")
);

-- CreateTable
CREATE TABLE "Person" (
    "id" SERIAL NOT NULL,
    "name" TEXT NOT NULL,
    "username" TEXT NOT NULL,
    "searchKey" TEXT NOT NULL,
    "active" BOOLEAN NOT NULL DEFAULT true,
    "version" INTEGER NOT NULL DEFAULT 1,
    "createdAt" TIMESTAMP(3) NOT NULL,
    "userId" TEXT,

    CONSTRAINT "Person_pkey" PRIMARY KEY ("id")
);

-- CreateTable
CREATE TABLE "PersonRole" (
    "personId" INTEGER NOT NULL,
    "role" TEXT NOT NULL,

    CONSTRAINT "PersonRole_pkey" PRIMARY KEY ("personId","role")
);

-- CreateTable
CREATE TABLE "User" (
    "id" TEXT NOT NULL,
    "name" TEXT NOT NULL,
    "email" TEXT NOT NULL,
    "emailVerified" BOOLEAN NOT NULL DEFAULT false,
    "image" TEXT,
    "username" TEXT,
    "displayUsername" TEXT,
    "createdAt" TIMESTAMP(3) NOT NULL,
    "updatedAt" TIMESTAMP(3) NOT NULL,

    CONSTRAINT "User_pkey" PRIMARY KEY ("id")
);

-- CreateTable
CREATE TABLE "Session" (
    "id" TEXT NOT NULL,
    "expiresAt" TIMESTAMP(3) NOT NULL,
    "token" TEXT NOT NULL,
    "createdAt" TIMESTAMP(3) NOT NULL,
    "updatedAt" TIMESTAMP(3) NOT NULL,
    "ipAddress" TEXT,
    "userAgent" TEXT,
    "userId" TEXT NOT NULL,

    CONSTRAINT "Session_pkey" PRIMARY KEY ("id")
);

-- CreateTable
CREATE TABLE "Account" (
    "id" TEXT NOT NULL,
    "accountId" TEXT NOT NULL,
    "providerId" TEXT NOT NULL,
    "userId" TEXT NOT NULL,
    "accessToken" TEXT,
    "refreshToken" TEXT,
    "idToken" TEXT,
    "accessTokenExpiresAt" TIMESTAMP(3),
    "refreshTokenExpiresAt" TIMESTAMP(3),
    "scope" TEXT,
    "password" TEXT,
    "createdAt" TIMESTAMP(3) NOT NULL,
    "updatedAt" TIMESTAMP(3) NOT NULL,

    CONSTRAINT "Account_pkey" PRIMARY KEY ("id")
);

-- CreateTable
CREATE TABLE "Verification" (
    "id" TEXT NOT NULL,
    "identifier" TEXT NOT NULL,
    "value" TEXT NOT NULL,
    "expiresAt" TIMESTAMP(3) NOT NULL,
    "createdAt" TIMESTAMP(3) NOT NULL,
    "updatedAt" TIMESTAMP(3) NOT NULL,

    CONSTRAINT "Verification_pkey" PRIMARY KEY ("id")
);

-- CreateTable
CREATE TABLE "SignInAttempt" (
    "key" TEXT NOT NULL,
    "failures" INTEGER NOT NULL,
    "windowStart" TIMESTAMP(3) NOT NULL,
    "blockedUntil" TIMESTAMP(3),

    CONSTRAINT "SignInAttempt_pkey" PRIMARY KEY ("key")
);

-- CreateTable
CREATE TABLE "Works" (
    "id" INTEGER NOT NULL,
    "name" TEXT NOT NULL,
    "place" TEXT NOT NULL DEFAULT '',
    "timeZone" TEXT NOT NULL,
    "latitudeDegrees" DOUBLE PRECISION NOT NULL,
    "heightMetres" DOUBLE PRECISION NOT NULL,
    "gravityTyped" DOUBLE PRECISION,
    "airTemperatureCelsius" DOUBLE PRECISION NOT NULL DEFAULT 20,
    "airPressurePascals" DOUBLE PRECISION NOT NULL DEFAULT 101325,
    "airHumidity" DOUBLE PRECISION NOT NULL DEFAULT 0.5,
    "lengthUnit" TEXT NOT NULL DEFAULT 'mm',
    "diameterUnit" TEXT NOT NULL DEFAULT 'mm',
    "forceUnit" TEXT NOT NULL DEFAULT 'N',
    "massUnit" TEXT NOT NULL DEFAULT 'mg',
    "numberFormat" TEXT NOT NULL DEFAULT 'point',
    "a4" DOUBLE PRECISION NOT NULL DEFAULT 440,
    "secondPersonPublishes" BOOLEAN NOT NULL DEFAULT false,
    "demo" BOOLEAN NOT NULL DEFAULT false,
    "version" INTEGER NOT NULL DEFAULT 1,
    "createdAt" TIMESTAMP(3) NOT NULL,

    CONSTRAINT "Works_pkey" PRIMARY KEY ("id")
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

-- AddForeignKey
ALTER TABLE "SpecificationRevision" ADD CONSTRAINT "SpecificationRevision_productId_fkey" FOREIGN KEY ("productId") REFERENCES "Product"("id") ON DELETE RESTRICT ON UPDATE CASCADE;

-- AddForeignKey
ALTER TABLE "SpecificationRevision" ADD CONSTRAINT "SpecificationRevision_materialId_fkey" FOREIGN KEY ("materialId") REFERENCES "Material"("id") ON DELETE RESTRICT ON UPDATE CASCADE;

-- AddForeignKey
ALTER TABLE "LimitSet" ADD CONSTRAINT "LimitSet_productId_fkey" FOREIGN KEY ("productId") REFERENCES "Product"("id") ON DELETE RESTRICT ON UPDATE CASCADE;

-- AddForeignKey
ALTER TABLE "Signal" ADD CONSTRAINT "Signal_lotId_fkey" FOREIGN KEY ("lotId") REFERENCES "Lot"("id") ON DELETE RESTRICT ON UPDATE CASCADE;

-- AddForeignKey
ALTER TABLE "Signal" ADD CONSTRAINT "Signal_productId_fkey" FOREIGN KEY ("productId") REFERENCES "Product"("id") ON DELETE RESTRICT ON UPDATE CASCADE;

-- AddForeignKey
ALTER TABLE "Signal" ADD CONSTRAINT "Signal_limitSetId_fkey" FOREIGN KEY ("limitSetId") REFERENCES "LimitSet"("id") ON DELETE RESTRICT ON UPDATE CASCADE;

-- AddForeignKey
ALTER TABLE "Disposition" ADD CONSTRAINT "Disposition_lotId_fkey" FOREIGN KEY ("lotId") REFERENCES "Lot"("id") ON DELETE RESTRICT ON UPDATE CASCADE;

-- AddForeignKey
ALTER TABLE "Datasheet" ADD CONSTRAINT "Datasheet_productId_fkey" FOREIGN KEY ("productId") REFERENCES "Product"("id") ON DELETE RESTRICT ON UPDATE CASCADE;

-- AddForeignKey
ALTER TABLE "DatasheetRevision" ADD CONSTRAINT "DatasheetRevision_datasheetId_fkey" FOREIGN KEY ("datasheetId") REFERENCES "Datasheet"("id") ON DELETE RESTRICT ON UPDATE CASCADE;

-- AddForeignKey
ALTER TABLE "DatasheetLot" ADD CONSTRAINT "DatasheetLot_revisionId_fkey" FOREIGN KEY ("revisionId") REFERENCES "DatasheetRevision"("id") ON DELETE RESTRICT ON UPDATE CASCADE;

-- AddForeignKey
ALTER TABLE "DatasheetLot" ADD CONSTRAINT "DatasheetLot_lotId_fkey" FOREIGN KEY ("lotId") REFERENCES "Lot"("id") ON DELETE RESTRICT ON UPDATE CASCADE;

-- AddForeignKey
ALTER TABLE "Lot" ADD CONSTRAINT "Lot_productId_fkey" FOREIGN KEY ("productId") REFERENCES "Product"("id") ON DELETE RESTRICT ON UPDATE CASCADE;

-- AddForeignKey
ALTER TABLE "Lot" ADD CONSTRAINT "Lot_specificationRevisionId_fkey" FOREIGN KEY ("specificationRevisionId") REFERENCES "SpecificationRevision"("id") ON DELETE RESTRICT ON UPDATE CASCADE;

-- AddForeignKey
ALTER TABLE "Lot" ADD CONSTRAINT "Lot_machineId_fkey" FOREIGN KEY ("machineId") REFERENCES "Machine"("id") ON DELETE SET NULL ON UPDATE CASCADE;

-- AddForeignKey
ALTER TABLE "Lot" ADD CONSTRAINT "Lot_dieId_fkey" FOREIGN KEY ("dieId") REFERENCES "Die"("id") ON DELETE SET NULL ON UPDATE CASCADE;

-- AddForeignKey
ALTER TABLE "Specimen" ADD CONSTRAINT "Specimen_lotId_fkey" FOREIGN KEY ("lotId") REFERENCES "Lot"("id") ON DELETE RESTRICT ON UPDATE CASCADE;

-- AddForeignKey
ALTER TABLE "Reading" ADD CONSTRAINT "Reading_specimenId_fkey" FOREIGN KEY ("specimenId") REFERENCES "Specimen"("id") ON DELETE RESTRICT ON UPDATE CASCADE;

-- AddForeignKey
ALTER TABLE "Reading" ADD CONSTRAINT "Reading_supersedesId_fkey" FOREIGN KEY ("supersedesId") REFERENCES "Reading"("id") ON DELETE SET NULL ON UPDATE CASCADE;

-- AddForeignKey
ALTER TABLE "Evaluation" ADD CONSTRAINT "Evaluation_specimenId_fkey" FOREIGN KEY ("specimenId") REFERENCES "Specimen"("id") ON DELETE RESTRICT ON UPDATE CASCADE;

-- AddForeignKey
ALTER TABLE "Evaluation" ADD CONSTRAINT "Evaluation_snapshotId_fkey" FOREIGN KEY ("snapshotId") REFERENCES "InputSnapshot"("id") ON DELETE RESTRICT ON UPDATE CASCADE;

-- AddForeignKey
ALTER TABLE "SpecimenResult" ADD CONSTRAINT "SpecimenResult_evaluationId_fkey" FOREIGN KEY ("evaluationId") REFERENCES "Evaluation"("id") ON DELETE RESTRICT ON UPDATE CASCADE;

-- AddForeignKey
ALTER TABLE "LotSummary" ADD CONSTRAINT "LotSummary_lotId_fkey" FOREIGN KEY ("lotId") REFERENCES "Lot"("id") ON DELETE RESTRICT ON UPDATE CASCADE;

-- AddForeignKey
ALTER TABLE "PersonRole" ADD CONSTRAINT "PersonRole_personId_fkey" FOREIGN KEY ("personId") REFERENCES "Person"("id") ON DELETE RESTRICT ON UPDATE CASCADE;

-- AddForeignKey
ALTER TABLE "Session" ADD CONSTRAINT "Session_userId_fkey" FOREIGN KEY ("userId") REFERENCES "User"("id") ON DELETE CASCADE ON UPDATE CASCADE;

-- AddForeignKey
ALTER TABLE "Account" ADD CONSTRAINT "Account_userId_fkey" FOREIGN KEY ("userId") REFERENCES "User"("id") ON DELETE CASCADE ON UPDATE CASCADE;
