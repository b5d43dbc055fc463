-- What the embedded engine itself refuses, whoever asks: made anew after each run of the migrations, because
-- redefining a table drops its triggers. Each refusal begins with "Ledgerline: " (lib/data/db-errors.ts).

-- Append-only tables.

DROP TRIGGER IF EXISTS "Reading_no_update";
CREATE TRIGGER "Reading_no_update" BEFORE UPDATE ON "Reading"
BEGIN SELECT RAISE(ABORT, 'Ledgerline: A reading is never changed or removed, a correction is a reading that supersedes it.'); END;

DROP TRIGGER IF EXISTS "Reading_no_delete";
CREATE TRIGGER "Reading_no_delete" BEFORE DELETE ON "Reading"
BEGIN SELECT RAISE(ABORT, 'Ledgerline: A reading is never changed or removed, a correction is a reading that supersedes it.'); END;

DROP TRIGGER IF EXISTS "InputSnapshot_no_update";
CREATE TRIGGER "InputSnapshot_no_update" BEFORE UPDATE ON "InputSnapshot"
BEGIN SELECT RAISE(ABORT, 'Ledgerline: What a result was computed from is never changed or removed.'); END;

DROP TRIGGER IF EXISTS "InputSnapshot_no_delete";
CREATE TRIGGER "InputSnapshot_no_delete" BEFORE DELETE ON "InputSnapshot"
BEGIN SELECT RAISE(ABORT, 'Ledgerline: What a result was computed from is never changed or removed.'); END;

DROP TRIGGER IF EXISTS "Evaluation_no_update";
CREATE TRIGGER "Evaluation_no_update" BEFORE UPDATE ON "Evaluation"
BEGIN SELECT RAISE(ABORT, 'Ledgerline: An evaluation is never changed or removed, a new one follows it.'); END;

DROP TRIGGER IF EXISTS "Evaluation_no_delete";
CREATE TRIGGER "Evaluation_no_delete" BEFORE DELETE ON "Evaluation"
BEGIN SELECT RAISE(ABORT, 'Ledgerline: An evaluation is never changed or removed, a new one follows it.'); END;

DROP TRIGGER IF EXISTS "SpecimenResult_no_update";
CREATE TRIGGER "SpecimenResult_no_update" BEFORE UPDATE ON "SpecimenResult"
BEGIN SELECT RAISE(ABORT, 'Ledgerline: A result is never changed or removed, a new evaluation brings a new one.'); END;

DROP TRIGGER IF EXISTS "SpecimenResult_no_delete";
CREATE TRIGGER "SpecimenResult_no_delete" BEFORE DELETE ON "SpecimenResult"
BEGIN SELECT RAISE(ABORT, 'Ledgerline: A result is never changed or removed, a new evaluation brings a new one.'); END;

DROP TRIGGER IF EXISTS "SpecificationRevision_no_update";
CREATE TRIGGER "SpecificationRevision_no_update" BEFORE UPDATE ON "SpecificationRevision"
BEGIN SELECT RAISE(ABORT, 'Ledgerline: An issued specification is never changed or removed, a new revision follows it.'); END;

DROP TRIGGER IF EXISTS "SpecificationRevision_no_delete";
CREATE TRIGGER "SpecificationRevision_no_delete" BEFORE DELETE ON "SpecificationRevision"
BEGIN SELECT RAISE(ABORT, 'Ledgerline: An issued specification is never changed or removed, a new revision follows it.'); END;

DROP TRIGGER IF EXISTS "DatasheetLot_no_update";
CREATE TRIGGER "DatasheetLot_no_update" BEFORE UPDATE ON "DatasheetLot"
BEGIN SELECT RAISE(ABORT, 'Ledgerline: The lots of a published datasheet stay as they are.'); END;

DROP TRIGGER IF EXISTS "DatasheetLot_no_delete";
CREATE TRIGGER "DatasheetLot_no_delete" BEFORE DELETE ON "DatasheetLot"
BEGIN SELECT RAISE(ABORT, 'Ledgerline: The lots of a published datasheet stay as they are.'); END;

DROP TRIGGER IF EXISTS "LedgerEntry_no_update";
CREATE TRIGGER "LedgerEntry_no_update" BEFORE UPDATE ON "LedgerEntry"
BEGIN SELECT RAISE(ABORT, 'Ledgerline: The ledger is never changed, it only grows.'); END;

DROP TRIGGER IF EXISTS "LedgerEntry_no_delete";
CREATE TRIGGER "LedgerEntry_no_delete" BEFORE DELETE ON "LedgerEntry"
BEGIN SELECT RAISE(ABORT, 'Ledgerline: The ledger is never changed, it only grows.'); END;

-- Tables whose rows keep what they say: only marks beside it may change.

DROP TRIGGER IF EXISTS "Disposition_keeps_body";
CREATE TRIGGER "Disposition_keeps_body" BEFORE UPDATE ON "Disposition"
WHEN NEW."id" IS NOT OLD."id" OR NEW."lotId" IS NOT OLD."lotId" OR NEW."number" IS NOT OLD."number" OR NEW."verb" IS NOT OLD."verb" OR NEW."reason" IS NOT OLD."reason" OR NEW."decidedAt" IS NOT OLD."decidedAt" OR NEW."decidedById" IS NOT OLD."decidedById" OR NEW."proposal" IS NOT OLD."proposal" OR NEW."evidence" IS NOT OLD."evidence" OR NEW."evidenceHash" IS NOT OLD."evidenceHash"
BEGIN SELECT RAISE(ABORT, 'Ledgerline: A decision is never changed or removed, another one follows it.'); END;

DROP TRIGGER IF EXISTS "Disposition_no_delete";
CREATE TRIGGER "Disposition_no_delete" BEFORE DELETE ON "Disposition"
BEGIN SELECT RAISE(ABORT, 'Ledgerline: A decision is never changed or removed, another one follows it.'); END;

DROP TRIGGER IF EXISTS "DatasheetRevision_keeps_body";
CREATE TRIGGER "DatasheetRevision_keeps_body" BEFORE UPDATE ON "DatasheetRevision"
WHEN NEW."id" IS NOT OLD."id" OR NEW."datasheetId" IS NOT OLD."datasheetId" OR NEW."number" IS NOT OLD."number" OR NEW."basis" IS NOT OLD."basis" OR NEW."modelVersion" IS NOT OLD."modelVersion" OR NEW."body" IS NOT OLD."body" OR NEW."hash" IS NOT OLD."hash" OR NEW."ledgerCount" IS NOT OLD."ledgerCount" OR NEW."ledgerHash" IS NOT OLD."ledgerHash" OR NEW."publishedAt" IS NOT OLD."publishedAt" OR NEW."publishedById" IS NOT OLD."publishedById"
BEGIN SELECT RAISE(ABORT, 'Ledgerline: A published datasheet is never changed or removed, a new revision follows it.'); END;

DROP TRIGGER IF EXISTS "DatasheetRevision_no_delete";
CREATE TRIGGER "DatasheetRevision_no_delete" BEFORE DELETE ON "DatasheetRevision"
BEGIN SELECT RAISE(ABORT, 'Ledgerline: A published datasheet is never changed or removed, a new revision follows it.'); END;

DROP TRIGGER IF EXISTS "LimitSet_keeps_body";
CREATE TRIGGER "LimitSet_keeps_body" BEFORE UPDATE ON "LimitSet"
WHEN NEW."id" IS NOT OLD."id" OR NEW."productId" IS NOT OLD."productId" OR NEW."characteristic" IS NOT OLD."characteristic" OR NEW."statistic" IS NOT OLD."statistic" OR NEW."number" IS NOT OLD."number" OR NEW."centre" IS NOT OLD."centre" OR NEW."sigma" IS NOT OLD."sigma" OR NEW."lower" IS NOT OLD."lower" OR NEW."upper" IS NOT OLD."upper" OR NEW."sigmaEstimator" IS NOT OLD."sigmaEstimator" OR NEW."lotCount" IS NOT OLD."lotCount" OR NEW."provisional" IS NOT OLD."provisional" OR NEW."baseline" IS NOT OLD."baseline" OR NEW."effectiveFrom" IS NOT OLD."effectiveFrom" OR NEW."frozenAt" IS NOT OLD."frozenAt" OR NEW."frozenById" IS NOT OLD."frozenById" OR NEW."reason" IS NOT OLD."reason" OR NEW."target" IS NOT OLD."target" OR NEW."rules" IS NOT OLD."rules"
BEGIN SELECT RAISE(ABORT, 'Ledgerline: Frozen limits are never changed or removed, another set follows them.'); END;

DROP TRIGGER IF EXISTS "LimitSet_no_delete";
CREATE TRIGGER "LimitSet_no_delete" BEFORE DELETE ON "LimitSet"
BEGIN SELECT RAISE(ABORT, 'Ledgerline: Frozen limits are never changed or removed, another set follows them.'); END;

DROP TRIGGER IF EXISTS "Specimen_keeps_body";
CREATE TRIGGER "Specimen_keeps_body" BEFORE UPDATE ON "Specimen"
WHEN NEW."id" IS NOT OLD."id" OR NEW."clientId" IS NOT OLD."clientId" OR NEW."lotId" IS NOT OLD."lotId" OR NEW."number" IS NOT OLD."number"
BEGIN SELECT RAISE(ABORT, 'Ledgerline: A specimen keeps its lot and number and is never removed.'); END;

DROP TRIGGER IF EXISTS "Specimen_no_delete";
CREATE TRIGGER "Specimen_no_delete" BEFORE DELETE ON "Specimen"
BEGIN SELECT RAISE(ABORT, 'Ledgerline: A specimen keeps its lot and number and is never removed.'); END;

DROP TRIGGER IF EXISTS "Signal_keeps_body";
CREATE TRIGGER "Signal_keeps_body" BEFORE UPDATE ON "Signal"
WHEN NEW."id" IS NOT OLD."id" OR NEW."lotId" IS NOT OLD."lotId" OR NEW."productId" IS NOT OLD."productId" OR NEW."characteristic" IS NOT OLD."characteristic" OR NEW."statistic" IS NOT OLD."statistic" OR NEW."limitSetId" IS NOT OLD."limitSetId" OR NEW."rule" IS NOT OLD."rule" OR NEW."side" IS NOT OLD."side" OR NEW."machineId" IS NOT OLD."machineId"
BEGIN SELECT RAISE(ABORT, 'Ledgerline: A signal keeps what it is about and is never removed, it is answered or marked.'); END;

DROP TRIGGER IF EXISTS "Signal_no_delete";
CREATE TRIGGER "Signal_no_delete" BEFORE DELETE ON "Signal"
BEGIN SELECT RAISE(ABORT, 'Ledgerline: A signal keeps what it is about and is never removed, it is answered or marked.'); END;

DROP TRIGGER IF EXISTS "Lot_keeps_body";
CREATE TRIGGER "Lot_keeps_body" BEFORE UPDATE ON "Lot"
WHEN NEW."id" IS NOT OLD."id" OR NEW."code" IS NOT OLD."code"
BEGIN SELECT RAISE(ABORT, 'Ledgerline: A lot keeps its code and is never removed.'); END;

DROP TRIGGER IF EXISTS "Lot_no_delete";
CREATE TRIGGER "Lot_no_delete" BEFORE DELETE ON "Lot"
BEGIN SELECT RAISE(ABORT, 'Ledgerline: A lot keeps its code and is never removed.'); END;

DROP TRIGGER IF EXISTS "Person_keeps_body";
CREATE TRIGGER "Person_keeps_body" BEFORE UPDATE ON "Person"
WHEN NEW."id" IS NOT OLD."id"
BEGIN SELECT RAISE(ABORT, 'Ledgerline: A person is never removed.'); END;

DROP TRIGGER IF EXISTS "Person_no_delete";
CREATE TRIGGER "Person_no_delete" BEFORE DELETE ON "Person"
BEGIN SELECT RAISE(ABORT, 'Ledgerline: A person is never removed.'); END;

DROP TRIGGER IF EXISTS "LedgerHead_keeps_body";
CREATE TRIGGER "LedgerHead_keeps_body" BEFORE UPDATE ON "LedgerHead"
WHEN NEW."id" IS NOT OLD."id"
BEGIN SELECT RAISE(ABORT, 'Ledgerline: The head of the ledger is never removed.'); END;

DROP TRIGGER IF EXISTS "LedgerHead_no_delete";
CREATE TRIGGER "LedgerHead_no_delete" BEFORE DELETE ON "LedgerHead"
BEGIN SELECT RAISE(ABORT, 'Ledgerline: The head of the ledger is never removed.'); END;

-- The ledger grows by one entry at a time, each hung on the one before.

INSERT INTO "LedgerHead" ("id", "count", "hash")
SELECT 1, 0, '0000000000000000000000000000000000000000000000000000000000000000'
WHERE NOT EXISTS (SELECT 1 FROM "LedgerHead") AND NOT EXISTS (SELECT 1 FROM "LedgerEntry");

DROP TRIGGER IF EXISTS "LedgerEntry_in_order";
CREATE TRIGGER "LedgerEntry_in_order" BEFORE INSERT ON "LedgerEntry"
WHEN NOT EXISTS (
  SELECT 1 FROM "LedgerHead" WHERE "id" = 1 AND "count" = NEW."sequence" - 1 AND "hash" = NEW."previousHash"
)
BEGIN SELECT RAISE(ABORT, 'Ledgerline: A ledger entry follows the last one.'); END;

DROP TRIGGER IF EXISTS "LedgerHead_in_order";
CREATE TRIGGER "LedgerHead_in_order" BEFORE UPDATE ON "LedgerHead"
WHEN NEW."count" IS NOT OLD."count" + 1 OR NOT EXISTS (
  SELECT 1 FROM "LedgerEntry" WHERE "sequence" = NEW."count" AND "hash" = NEW."hash"
)
BEGIN SELECT RAISE(ABORT, 'Ledgerline: The head of the ledger moves to the entry just written.'); END;

DROP TRIGGER IF EXISTS "LedgerHead_only_one";
CREATE TRIGGER "LedgerHead_only_one" BEFORE INSERT ON "LedgerHead"
WHEN EXISTS (SELECT 1 FROM "LedgerHead")
BEGIN SELECT RAISE(ABORT, 'Ledgerline: The ledger has one head.'); END;

-- Finite numbers only, and only numbers: not a number is stored as NULL by this engine, which the data model
-- refuses where a number is needed.

DROP TRIGGER IF EXISTS "LimitSet_finite_insert";
CREATE TRIGGER "LimitSet_finite_insert" BEFORE INSERT ON "LimitSet"
WHEN typeof(NEW."centre") NOT IN ('real', 'integer', 'null') OR abs(NEW."centre") > 1.7976931348623157e308
  OR typeof(NEW."sigma") NOT IN ('real', 'integer', 'null') OR abs(NEW."sigma") > 1.7976931348623157e308
  OR typeof(NEW."lower") NOT IN ('real', 'integer', 'null') OR abs(NEW."lower") > 1.7976931348623157e308
  OR typeof(NEW."upper") NOT IN ('real', 'integer', 'null') OR abs(NEW."upper") > 1.7976931348623157e308
  OR typeof(NEW."target") NOT IN ('real', 'integer', 'null') OR abs(NEW."target") > 1.7976931348623157e308
BEGIN SELECT RAISE(ABORT, 'Ledgerline: A number in LimitSet is not finite.'); END;

DROP TRIGGER IF EXISTS "LimitSet_finite_update";
CREATE TRIGGER "LimitSet_finite_update" BEFORE UPDATE ON "LimitSet"
WHEN typeof(NEW."centre") NOT IN ('real', 'integer', 'null') OR abs(NEW."centre") > 1.7976931348623157e308
  OR typeof(NEW."sigma") NOT IN ('real', 'integer', 'null') OR abs(NEW."sigma") > 1.7976931348623157e308
  OR typeof(NEW."lower") NOT IN ('real', 'integer', 'null') OR abs(NEW."lower") > 1.7976931348623157e308
  OR typeof(NEW."upper") NOT IN ('real', 'integer', 'null') OR abs(NEW."upper") > 1.7976931348623157e308
  OR typeof(NEW."target") NOT IN ('real', 'integer', 'null') OR abs(NEW."target") > 1.7976931348623157e308
BEGIN SELECT RAISE(ABORT, 'Ledgerline: A number in LimitSet is not finite.'); END;

DROP TRIGGER IF EXISTS "Signal_finite_insert";
CREATE TRIGGER "Signal_finite_insert" BEFORE INSERT ON "Signal"
WHEN typeof(NEW."departure") NOT IN ('real', 'integer', 'null') OR abs(NEW."departure") > 1.7976931348623157e308
BEGIN SELECT RAISE(ABORT, 'Ledgerline: A number in Signal is not finite.'); END;

DROP TRIGGER IF EXISTS "Signal_finite_update";
CREATE TRIGGER "Signal_finite_update" BEFORE UPDATE ON "Signal"
WHEN typeof(NEW."departure") NOT IN ('real', 'integer', 'null') OR abs(NEW."departure") > 1.7976931348623157e308
BEGIN SELECT RAISE(ABORT, 'Ledgerline: A number in Signal is not finite.'); END;

DROP TRIGGER IF EXISTS "Gauge_finite_insert";
CREATE TRIGGER "Gauge_finite_insert" BEFORE INSERT ON "Gauge"
WHEN typeof(NEW."resolution") NOT IN ('real', 'integer', 'null') OR abs(NEW."resolution") > 1.7976931348623157e308
  OR typeof(NEW."uAbsolute") NOT IN ('real', 'integer', 'null') OR abs(NEW."uAbsolute") > 1.7976931348623157e308
  OR typeof(NEW."uRelative") NOT IN ('real', 'integer', 'null') OR abs(NEW."uRelative") > 1.7976931348623157e308
  OR typeof(NEW."error") NOT IN ('real', 'integer', 'null') OR abs(NEW."error") > 1.7976931348623157e308
BEGIN SELECT RAISE(ABORT, 'Ledgerline: A number in Gauge is not finite.'); END;

DROP TRIGGER IF EXISTS "Gauge_finite_update";
CREATE TRIGGER "Gauge_finite_update" BEFORE UPDATE ON "Gauge"
WHEN typeof(NEW."resolution") NOT IN ('real', 'integer', 'null') OR abs(NEW."resolution") > 1.7976931348623157e308
  OR typeof(NEW."uAbsolute") NOT IN ('real', 'integer', 'null') OR abs(NEW."uAbsolute") > 1.7976931348623157e308
  OR typeof(NEW."uRelative") NOT IN ('real', 'integer', 'null') OR abs(NEW."uRelative") > 1.7976931348623157e308
  OR typeof(NEW."error") NOT IN ('real', 'integer', 'null') OR abs(NEW."error") > 1.7976931348623157e308
BEGIN SELECT RAISE(ABORT, 'Ledgerline: A number in Gauge is not finite.'); END;

DROP TRIGGER IF EXISTS "Weight_finite_insert";
CREATE TRIGGER "Weight_finite_insert" BEFORE INSERT ON "Weight"
WHEN typeof(NEW."conventionalMass") NOT IN ('real', 'integer', 'null') OR abs(NEW."conventionalMass") > 1.7976931348623157e308
  OR typeof(NEW."uMass") NOT IN ('real', 'integer', 'null') OR abs(NEW."uMass") > 1.7976931348623157e308
BEGIN SELECT RAISE(ABORT, 'Ledgerline: A number in Weight is not finite.'); END;

DROP TRIGGER IF EXISTS "Weight_finite_update";
CREATE TRIGGER "Weight_finite_update" BEFORE UPDATE ON "Weight"
WHEN typeof(NEW."conventionalMass") NOT IN ('real', 'integer', 'null') OR abs(NEW."conventionalMass") > 1.7976931348623157e308
  OR typeof(NEW."uMass") NOT IN ('real', 'integer', 'null') OR abs(NEW."uMass") > 1.7976931348623157e308
BEGIN SELECT RAISE(ABORT, 'Ledgerline: A number in Weight is not finite.'); END;

DROP TRIGGER IF EXISTS "Rig_finite_insert";
CREATE TRIGGER "Rig_finite_insert" BEFORE INSERT ON "Rig"
WHEN typeof(NEW."spanMetres") NOT IN ('real', 'integer', 'null') OR abs(NEW."spanMetres") > 1.7976931348623157e308
  OR typeof(NEW."uSpanMetres") NOT IN ('real', 'integer', 'null') OR abs(NEW."uSpanMetres") > 1.7976931348623157e308
  OR typeof(NEW."uEndRelative") NOT IN ('real', 'integer', 'null') OR abs(NEW."uEndRelative") > 1.7976931348623157e308
  OR typeof(NEW."frictionHalfWidth") NOT IN ('real', 'integer', 'null') OR abs(NEW."frictionHalfWidth") > 1.7976931348623157e308
  OR typeof(NEW."hangingLengthMetres") NOT IN ('real', 'integer', 'null') OR abs(NEW."hangingLengthMetres") > 1.7976931348623157e308
BEGIN SELECT RAISE(ABORT, 'Ledgerline: A number in Rig is not finite.'); END;

DROP TRIGGER IF EXISTS "Rig_finite_update";
CREATE TRIGGER "Rig_finite_update" BEFORE UPDATE ON "Rig"
WHEN typeof(NEW."spanMetres") NOT IN ('real', 'integer', 'null') OR abs(NEW."spanMetres") > 1.7976931348623157e308
  OR typeof(NEW."uSpanMetres") NOT IN ('real', 'integer', 'null') OR abs(NEW."uSpanMetres") > 1.7976931348623157e308
  OR typeof(NEW."uEndRelative") NOT IN ('real', 'integer', 'null') OR abs(NEW."uEndRelative") > 1.7976931348623157e308
  OR typeof(NEW."frictionHalfWidth") NOT IN ('real', 'integer', 'null') OR abs(NEW."frictionHalfWidth") > 1.7976931348623157e308
  OR typeof(NEW."hangingLengthMetres") NOT IN ('real', 'integer', 'null') OR abs(NEW."hangingLengthMetres") > 1.7976931348623157e308
BEGIN SELECT RAISE(ABORT, 'Ledgerline: A number in Rig is not finite.'); END;

DROP TRIGGER IF EXISTS "Die_finite_insert";
CREATE TRIGGER "Die_finite_insert" BEFORE INSERT ON "Die"
WHEN typeof(NEW."sizeMetres") NOT IN ('real', 'integer', 'null') OR abs(NEW."sizeMetres") > 1.7976931348623157e308
BEGIN SELECT RAISE(ABORT, 'Ledgerline: A number in Die is not finite.'); END;

DROP TRIGGER IF EXISTS "Die_finite_update";
CREATE TRIGGER "Die_finite_update" BEFORE UPDATE ON "Die"
WHEN typeof(NEW."sizeMetres") NOT IN ('real', 'integer', 'null') OR abs(NEW."sizeMetres") > 1.7976931348623157e308
BEGIN SELECT RAISE(ABORT, 'Ledgerline: A number in Die is not finite.'); END;

DROP TRIGGER IF EXISTS "Lot_finite_insert";
CREATE TRIGGER "Lot_finite_insert" BEFORE INSERT ON "Lot"
WHEN typeof(NEW."lengthMetres") NOT IN ('real', 'integer', 'null') OR abs(NEW."lengthMetres") > 1.7976931348623157e308
BEGIN SELECT RAISE(ABORT, 'Ledgerline: A number in Lot is not finite.'); END;

DROP TRIGGER IF EXISTS "Lot_finite_update";
CREATE TRIGGER "Lot_finite_update" BEFORE UPDATE ON "Lot"
WHEN typeof(NEW."lengthMetres") NOT IN ('real', 'integer', 'null') OR abs(NEW."lengthMetres") > 1.7976931348623157e308
BEGIN SELECT RAISE(ABORT, 'Ledgerline: A number in Lot is not finite.'); END;

DROP TRIGGER IF EXISTS "SpecimenResult_finite_insert";
CREATE TRIGGER "SpecimenResult_finite_insert" BEFORE INSERT ON "SpecimenResult"
WHEN typeof(NEW."diameter") NOT IN ('real', 'integer', 'null') OR abs(NEW."diameter") > 1.7976931348623157e308
  OR typeof(NEW."diameterU") NOT IN ('real', 'integer', 'null') OR abs(NEW."diameterU") > 1.7976931348623157e308
  OR typeof(NEW."diameterUc") NOT IN ('real', 'integer', 'null') OR abs(NEW."diameterUc") > 1.7976931348623157e308
  OR typeof(NEW."ovality") NOT IN ('real', 'integer', 'null') OR abs(NEW."ovality") > 1.7976931348623157e308
  OR typeof(NEW."ovalityU") NOT IN ('real', 'integer', 'null') OR abs(NEW."ovalityU") > 1.7976931348623157e308
  OR typeof(NEW."ovalityUc") NOT IN ('real', 'integer', 'null') OR abs(NEW."ovalityUc") > 1.7976931348623157e308
  OR typeof(NEW."massPerMetreWeighed") NOT IN ('real', 'integer', 'null') OR abs(NEW."massPerMetreWeighed") > 1.7976931348623157e308
  OR typeof(NEW."massPerMetreWeighedU") NOT IN ('real', 'integer', 'null') OR abs(NEW."massPerMetreWeighedU") > 1.7976931348623157e308
  OR typeof(NEW."massPerMetreWeighedUc") NOT IN ('real', 'integer', 'null') OR abs(NEW."massPerMetreWeighedUc") > 1.7976931348623157e308
  OR typeof(NEW."massPerMetreSounded") NOT IN ('real', 'integer', 'null') OR abs(NEW."massPerMetreSounded") > 1.7976931348623157e308
  OR typeof(NEW."massPerMetreSoundedU") NOT IN ('real', 'integer', 'null') OR abs(NEW."massPerMetreSoundedU") > 1.7976931348623157e308
  OR typeof(NEW."massPerMetreSoundedUc") NOT IN ('real', 'integer', 'null') OR abs(NEW."massPerMetreSoundedUc") > 1.7976931348623157e308
  OR typeof(NEW."closure") NOT IN ('real', 'integer', 'null') OR abs(NEW."closure") > 1.7976931348623157e308
  OR typeof(NEW."closureU") NOT IN ('real', 'integer', 'null') OR abs(NEW."closureU") > 1.7976931348623157e308
  OR typeof(NEW."closureUc") NOT IN ('real', 'integer', 'null') OR abs(NEW."closureUc") > 1.7976931348623157e308
  OR typeof(NEW."densityCheckWeighed") NOT IN ('real', 'integer', 'null') OR abs(NEW."densityCheckWeighed") > 1.7976931348623157e308
  OR typeof(NEW."densityCheckWeighedU") NOT IN ('real', 'integer', 'null') OR abs(NEW."densityCheckWeighedU") > 1.7976931348623157e308
  OR typeof(NEW."densityCheckWeighedUc") NOT IN ('real', 'integer', 'null') OR abs(NEW."densityCheckWeighedUc") > 1.7976931348623157e308
  OR typeof(NEW."densityCheckSounded") NOT IN ('real', 'integer', 'null') OR abs(NEW."densityCheckSounded") > 1.7976931348623157e308
  OR typeof(NEW."densityCheckSoundedU") NOT IN ('real', 'integer', 'null') OR abs(NEW."densityCheckSoundedU") > 1.7976931348623157e308
  OR typeof(NEW."densityCheckSoundedUc") NOT IN ('real', 'integer', 'null') OR abs(NEW."densityCheckSoundedUc") > 1.7976931348623157e308
  OR typeof(NEW."effectiveDensity") NOT IN ('real', 'integer', 'null') OR abs(NEW."effectiveDensity") > 1.7976931348623157e308
  OR typeof(NEW."effectiveDensityU") NOT IN ('real', 'integer', 'null') OR abs(NEW."effectiveDensityU") > 1.7976931348623157e308
  OR typeof(NEW."effectiveDensityUc") NOT IN ('real', 'integer', 'null') OR abs(NEW."effectiveDensityUc") > 1.7976931348623157e308
  OR typeof(NEW."tension") NOT IN ('real', 'integer', 'null') OR abs(NEW."tension") > 1.7976931348623157e308
  OR typeof(NEW."tensionU") NOT IN ('real', 'integer', 'null') OR abs(NEW."tensionU") > 1.7976931348623157e308
  OR typeof(NEW."tensionUc") NOT IN ('real', 'integer', 'null') OR abs(NEW."tensionUc") > 1.7976931348623157e308
  OR typeof(NEW."pitchError") NOT IN ('real', 'integer', 'null') OR abs(NEW."pitchError") > 1.7976931348623157e308
  OR typeof(NEW."pitchErrorU") NOT IN ('real', 'integer', 'null') OR abs(NEW."pitchErrorU") > 1.7976931348623157e308
  OR typeof(NEW."pitchErrorUc") NOT IN ('real', 'integer', 'null') OR abs(NEW."pitchErrorUc") > 1.7976931348623157e308
BEGIN SELECT RAISE(ABORT, 'Ledgerline: A number in SpecimenResult is not finite.'); END;

DROP TRIGGER IF EXISTS "SpecimenResult_finite_update";
CREATE TRIGGER "SpecimenResult_finite_update" BEFORE UPDATE ON "SpecimenResult"
WHEN typeof(NEW."diameter") NOT IN ('real', 'integer', 'null') OR abs(NEW."diameter") > 1.7976931348623157e308
  OR typeof(NEW."diameterU") NOT IN ('real', 'integer', 'null') OR abs(NEW."diameterU") > 1.7976931348623157e308
  OR typeof(NEW."diameterUc") NOT IN ('real', 'integer', 'null') OR abs(NEW."diameterUc") > 1.7976931348623157e308
  OR typeof(NEW."ovality") NOT IN ('real', 'integer', 'null') OR abs(NEW."ovality") > 1.7976931348623157e308
  OR typeof(NEW."ovalityU") NOT IN ('real', 'integer', 'null') OR abs(NEW."ovalityU") > 1.7976931348623157e308
  OR typeof(NEW."ovalityUc") NOT IN ('real', 'integer', 'null') OR abs(NEW."ovalityUc") > 1.7976931348623157e308
  OR typeof(NEW."massPerMetreWeighed") NOT IN ('real', 'integer', 'null') OR abs(NEW."massPerMetreWeighed") > 1.7976931348623157e308
  OR typeof(NEW."massPerMetreWeighedU") NOT IN ('real', 'integer', 'null') OR abs(NEW."massPerMetreWeighedU") > 1.7976931348623157e308
  OR typeof(NEW."massPerMetreWeighedUc") NOT IN ('real', 'integer', 'null') OR abs(NEW."massPerMetreWeighedUc") > 1.7976931348623157e308
  OR typeof(NEW."massPerMetreSounded") NOT IN ('real', 'integer', 'null') OR abs(NEW."massPerMetreSounded") > 1.7976931348623157e308
  OR typeof(NEW."massPerMetreSoundedU") NOT IN ('real', 'integer', 'null') OR abs(NEW."massPerMetreSoundedU") > 1.7976931348623157e308
  OR typeof(NEW."massPerMetreSoundedUc") NOT IN ('real', 'integer', 'null') OR abs(NEW."massPerMetreSoundedUc") > 1.7976931348623157e308
  OR typeof(NEW."closure") NOT IN ('real', 'integer', 'null') OR abs(NEW."closure") > 1.7976931348623157e308
  OR typeof(NEW."closureU") NOT IN ('real', 'integer', 'null') OR abs(NEW."closureU") > 1.7976931348623157e308
  OR typeof(NEW."closureUc") NOT IN ('real', 'integer', 'null') OR abs(NEW."closureUc") > 1.7976931348623157e308
  OR typeof(NEW."densityCheckWeighed") NOT IN ('real', 'integer', 'null') OR abs(NEW."densityCheckWeighed") > 1.7976931348623157e308
  OR typeof(NEW."densityCheckWeighedU") NOT IN ('real', 'integer', 'null') OR abs(NEW."densityCheckWeighedU") > 1.7976931348623157e308
  OR typeof(NEW."densityCheckWeighedUc") NOT IN ('real', 'integer', 'null') OR abs(NEW."densityCheckWeighedUc") > 1.7976931348623157e308
  OR typeof(NEW."densityCheckSounded") NOT IN ('real', 'integer', 'null') OR abs(NEW."densityCheckSounded") > 1.7976931348623157e308
  OR typeof(NEW."densityCheckSoundedU") NOT IN ('real', 'integer', 'null') OR abs(NEW."densityCheckSoundedU") > 1.7976931348623157e308
  OR typeof(NEW."densityCheckSoundedUc") NOT IN ('real', 'integer', 'null') OR abs(NEW."densityCheckSoundedUc") > 1.7976931348623157e308
  OR typeof(NEW."effectiveDensity") NOT IN ('real', 'integer', 'null') OR abs(NEW."effectiveDensity") > 1.7976931348623157e308
  OR typeof(NEW."effectiveDensityU") NOT IN ('real', 'integer', 'null') OR abs(NEW."effectiveDensityU") > 1.7976931348623157e308
  OR typeof(NEW."effectiveDensityUc") NOT IN ('real', 'integer', 'null') OR abs(NEW."effectiveDensityUc") > 1.7976931348623157e308
  OR typeof(NEW."tension") NOT IN ('real', 'integer', 'null') OR abs(NEW."tension") > 1.7976931348623157e308
  OR typeof(NEW."tensionU") NOT IN ('real', 'integer', 'null') OR abs(NEW."tensionU") > 1.7976931348623157e308
  OR typeof(NEW."tensionUc") NOT IN ('real', 'integer', 'null') OR abs(NEW."tensionUc") > 1.7976931348623157e308
  OR typeof(NEW."pitchError") NOT IN ('real', 'integer', 'null') OR abs(NEW."pitchError") > 1.7976931348623157e308
  OR typeof(NEW."pitchErrorU") NOT IN ('real', 'integer', 'null') OR abs(NEW."pitchErrorU") > 1.7976931348623157e308
  OR typeof(NEW."pitchErrorUc") NOT IN ('real', 'integer', 'null') OR abs(NEW."pitchErrorUc") > 1.7976931348623157e308
BEGIN SELECT RAISE(ABORT, 'Ledgerline: A number in SpecimenResult is not finite.'); END;

DROP TRIGGER IF EXISTS "LotSummary_finite_insert";
CREATE TRIGGER "LotSummary_finite_insert" BEFORE INSERT ON "LotSummary"
WHEN typeof(NEW."mean") NOT IN ('real', 'integer', 'null') OR abs(NEW."mean") > 1.7976931348623157e308
  OR typeof(NEW."m2") NOT IN ('real', 'integer', 'null') OR abs(NEW."m2") > 1.7976931348623157e308
  OR typeof(NEW."min") NOT IN ('real', 'integer', 'null') OR abs(NEW."min") > 1.7976931348623157e308
  OR typeof(NEW."max") NOT IN ('real', 'integer', 'null') OR abs(NEW."max") > 1.7976931348623157e308
  OR typeof(NEW."uCommon") NOT IN ('real', 'integer', 'null') OR abs(NEW."uCommon") > 1.7976931348623157e308
  OR typeof(NEW."uMean") NOT IN ('real', 'integer', 'null') OR abs(NEW."uMean") > 1.7976931348623157e308
BEGIN SELECT RAISE(ABORT, 'Ledgerline: A number in LotSummary is not finite.'); END;

DROP TRIGGER IF EXISTS "LotSummary_finite_update";
CREATE TRIGGER "LotSummary_finite_update" BEFORE UPDATE ON "LotSummary"
WHEN typeof(NEW."mean") NOT IN ('real', 'integer', 'null') OR abs(NEW."mean") > 1.7976931348623157e308
  OR typeof(NEW."m2") NOT IN ('real', 'integer', 'null') OR abs(NEW."m2") > 1.7976931348623157e308
  OR typeof(NEW."min") NOT IN ('real', 'integer', 'null') OR abs(NEW."min") > 1.7976931348623157e308
  OR typeof(NEW."max") NOT IN ('real', 'integer', 'null') OR abs(NEW."max") > 1.7976931348623157e308
  OR typeof(NEW."uCommon") NOT IN ('real', 'integer', 'null') OR abs(NEW."uCommon") > 1.7976931348623157e308
  OR typeof(NEW."uMean") NOT IN ('real', 'integer', 'null') OR abs(NEW."uMean") > 1.7976931348623157e308
BEGIN SELECT RAISE(ABORT, 'Ledgerline: A number in LotSummary is not finite.'); END;

DROP TRIGGER IF EXISTS "Works_finite_insert";
CREATE TRIGGER "Works_finite_insert" BEFORE INSERT ON "Works"
WHEN typeof(NEW."latitudeDegrees") NOT IN ('real', 'integer', 'null') OR abs(NEW."latitudeDegrees") > 1.7976931348623157e308
  OR typeof(NEW."heightMetres") NOT IN ('real', 'integer', 'null') OR abs(NEW."heightMetres") > 1.7976931348623157e308
  OR typeof(NEW."gravityTyped") NOT IN ('real', 'integer', 'null') OR abs(NEW."gravityTyped") > 1.7976931348623157e308
  OR typeof(NEW."airTemperatureCelsius") NOT IN ('real', 'integer', 'null') OR abs(NEW."airTemperatureCelsius") > 1.7976931348623157e308
  OR typeof(NEW."airPressurePascals") NOT IN ('real', 'integer', 'null') OR abs(NEW."airPressurePascals") > 1.7976931348623157e308
  OR typeof(NEW."airHumidity") NOT IN ('real', 'integer', 'null') OR abs(NEW."airHumidity") > 1.7976931348623157e308
  OR typeof(NEW."a4") NOT IN ('real', 'integer', 'null') OR abs(NEW."a4") > 1.7976931348623157e308
BEGIN SELECT RAISE(ABORT, 'Ledgerline: A number in Works is not finite.'); END;

DROP TRIGGER IF EXISTS "Works_finite_update";
CREATE TRIGGER "Works_finite_update" BEFORE UPDATE ON "Works"
WHEN typeof(NEW."latitudeDegrees") NOT IN ('real', 'integer', 'null') OR abs(NEW."latitudeDegrees") > 1.7976931348623157e308
  OR typeof(NEW."heightMetres") NOT IN ('real', 'integer', 'null') OR abs(NEW."heightMetres") > 1.7976931348623157e308
  OR typeof(NEW."gravityTyped") NOT IN ('real', 'integer', 'null') OR abs(NEW."gravityTyped") > 1.7976931348623157e308
  OR typeof(NEW."airTemperatureCelsius") NOT IN ('real', 'integer', 'null') OR abs(NEW."airTemperatureCelsius") > 1.7976931348623157e308
  OR typeof(NEW."airPressurePascals") NOT IN ('real', 'integer', 'null') OR abs(NEW."airPressurePascals") > 1.7976931348623157e308
  OR typeof(NEW."airHumidity") NOT IN ('real', 'integer', 'null') OR abs(NEW."airHumidity") > 1.7976931348623157e308
  OR typeof(NEW."a4") NOT IN ('real', 'integer', 'null') OR abs(NEW."a4") > 1.7976931348623157e308
BEGIN SELECT RAISE(ABORT, 'Ledgerline: A number in Works is not finite.'); END;

DROP TRIGGER IF EXISTS "MaterialIn_finite_insert";
CREATE TRIGGER "MaterialIn_finite_insert" BEFORE INSERT ON "MaterialIn"
WHEN typeof(NEW."sizeMetres") NOT IN ('real', 'integer', 'null') OR abs(NEW."sizeMetres") > 1.7976931348623157e308
  OR typeof(NEW."lengthMetres") NOT IN ('real', 'integer', 'null') OR abs(NEW."lengthMetres") > 1.7976931348623157e308
  OR typeof(NEW."massKilograms") NOT IN ('real', 'integer', 'null') OR abs(NEW."massKilograms") > 1.7976931348623157e308
BEGIN SELECT RAISE(ABORT, 'Ledgerline: A number in MaterialIn is not finite.'); END;

DROP TRIGGER IF EXISTS "MaterialIn_finite_update";
CREATE TRIGGER "MaterialIn_finite_update" BEFORE UPDATE ON "MaterialIn"
WHEN typeof(NEW."sizeMetres") NOT IN ('real', 'integer', 'null') OR abs(NEW."sizeMetres") > 1.7976931348623157e308
  OR typeof(NEW."lengthMetres") NOT IN ('real', 'integer', 'null') OR abs(NEW."lengthMetres") > 1.7976931348623157e308
  OR typeof(NEW."massKilograms") NOT IN ('real', 'integer', 'null') OR abs(NEW."massKilograms") > 1.7976931348623157e308
BEGIN SELECT RAISE(ABORT, 'Ledgerline: A number in MaterialIn is not finite.'); END;

DROP TRIGGER IF EXISTS "LotMaterial_finite_insert";
CREATE TRIGGER "LotMaterial_finite_insert" BEFORE INSERT ON "LotMaterial"
WHEN typeof(NEW."fromMetre") NOT IN ('real', 'integer', 'null') OR abs(NEW."fromMetre") > 1.7976931348623157e308
  OR typeof(NEW."toMetre") NOT IN ('real', 'integer', 'null') OR abs(NEW."toMetre") > 1.7976931348623157e308
BEGIN SELECT RAISE(ABORT, 'Ledgerline: A number in LotMaterial is not finite.'); END;

DROP TRIGGER IF EXISTS "LotMaterial_finite_update";
CREATE TRIGGER "LotMaterial_finite_update" BEFORE UPDATE ON "LotMaterial"
WHEN typeof(NEW."fromMetre") NOT IN ('real', 'integer', 'null') OR abs(NEW."fromMetre") > 1.7976931348623157e308
  OR typeof(NEW."toMetre") NOT IN ('real', 'integer', 'null') OR abs(NEW."toMetre") > 1.7976931348623157e308
BEGIN SELECT RAISE(ABORT, 'Ledgerline: A number in LotMaterial is not finite.'); END;

-- Words from closed lists.

DROP TRIGGER IF EXISTS "Lot_state_insert";
CREATE TRIGGER "Lot_state_insert" BEFORE INSERT ON "Lot"
WHEN NEW."state" NOT IN ('measuring', 'to-decide', 'released', 'held', 'rework', 'regraded', 'concession', 'scrapped')
BEGIN SELECT RAISE(ABORT, 'Ledgerline: Lot has no state of that name.'); END;

DROP TRIGGER IF EXISTS "Lot_state_update";
CREATE TRIGGER "Lot_state_update" BEFORE UPDATE OF "state" ON "Lot"
WHEN NEW."state" NOT IN ('measuring', 'to-decide', 'released', 'held', 'rework', 'regraded', 'concession', 'scrapped')
BEGIN SELECT RAISE(ABORT, 'Ledgerline: Lot has no state of that name.'); END;

DROP TRIGGER IF EXISTS "Disposition_verb_insert";
CREATE TRIGGER "Disposition_verb_insert" BEFORE INSERT ON "Disposition"
WHEN NEW."verb" NOT IN ('release', 'hold', 'rework', 'regrade', 'concession', 'scrap')
BEGIN SELECT RAISE(ABORT, 'Ledgerline: Disposition has no verb of that name.'); END;

DROP TRIGGER IF EXISTS "Disposition_verb_update";
CREATE TRIGGER "Disposition_verb_update" BEFORE UPDATE OF "verb" ON "Disposition"
WHEN NEW."verb" NOT IN ('release', 'hold', 'rework', 'regrade', 'concession', 'scrap')
BEGIN SELECT RAISE(ABORT, 'Ledgerline: Disposition has no verb of that name.'); END;

DROP TRIGGER IF EXISTS "Signal_state_insert";
CREATE TRIGGER "Signal_state_insert" BEFORE INSERT ON "Signal"
WHEN NEW."state" NOT IN ('open', 'answered', 'no-longer-holds')
BEGIN SELECT RAISE(ABORT, 'Ledgerline: Signal has no state of that name.'); END;

DROP TRIGGER IF EXISTS "Signal_state_update";
CREATE TRIGGER "Signal_state_update" BEFORE UPDATE OF "state" ON "Signal"
WHEN NEW."state" NOT IN ('open', 'answered', 'no-longer-holds')
BEGIN SELECT RAISE(ABORT, 'Ledgerline: Signal has no state of that name.'); END;

DROP TRIGGER IF EXISTS "Signal_rule_insert";
CREATE TRIGGER "Signal_rule_insert" BEFORE INSERT ON "Signal"
WHEN NEW."rule" NOT IN ('beyond-the-limits', 'nine-on-one-side')
BEGIN SELECT RAISE(ABORT, 'Ledgerline: Signal has no rule of that name.'); END;

DROP TRIGGER IF EXISTS "Signal_rule_update";
CREATE TRIGGER "Signal_rule_update" BEFORE UPDATE OF "rule" ON "Signal"
WHEN NEW."rule" NOT IN ('beyond-the-limits', 'nine-on-one-side')
BEGIN SELECT RAISE(ABORT, 'Ledgerline: Signal has no rule of that name.'); END;

DROP TRIGGER IF EXISTS "Signal_side_insert";
CREATE TRIGGER "Signal_side_insert" BEFORE INSERT ON "Signal"
WHEN NEW."side" NOT IN ('above', 'below')
BEGIN SELECT RAISE(ABORT, 'Ledgerline: Signal has no side of that name.'); END;

DROP TRIGGER IF EXISTS "Signal_side_update";
CREATE TRIGGER "Signal_side_update" BEFORE UPDATE OF "side" ON "Signal"
WHEN NEW."side" NOT IN ('above', 'below')
BEGIN SELECT RAISE(ABORT, 'Ledgerline: Signal has no side of that name.'); END;

DROP TRIGGER IF EXISTS "Signal_statistic_insert";
CREATE TRIGGER "Signal_statistic_insert" BEFORE INSERT ON "Signal"
WHEN NEW."statistic" NOT IN ('mean', 'within-lot-sd')
BEGIN SELECT RAISE(ABORT, 'Ledgerline: Signal has no statistic of that name.'); END;

DROP TRIGGER IF EXISTS "Signal_statistic_update";
CREATE TRIGGER "Signal_statistic_update" BEFORE UPDATE OF "statistic" ON "Signal"
WHEN NEW."statistic" NOT IN ('mean', 'within-lot-sd')
BEGIN SELECT RAISE(ABORT, 'Ledgerline: Signal has no statistic of that name.'); END;

DROP TRIGGER IF EXISTS "LimitSet_statistic_insert";
CREATE TRIGGER "LimitSet_statistic_insert" BEFORE INSERT ON "LimitSet"
WHEN NEW."statistic" NOT IN ('mean', 'within-lot-sd')
BEGIN SELECT RAISE(ABORT, 'Ledgerline: LimitSet has no statistic of that name.'); END;

DROP TRIGGER IF EXISTS "LimitSet_statistic_update";
CREATE TRIGGER "LimitSet_statistic_update" BEFORE UPDATE OF "statistic" ON "LimitSet"
WHEN NEW."statistic" NOT IN ('mean', 'within-lot-sd')
BEGIN SELECT RAISE(ABORT, 'Ledgerline: LimitSet has no statistic of that name.'); END;

DROP TRIGGER IF EXISTS "Reading_kind_insert";
CREATE TRIGGER "Reading_kind_insert" BEFORE INSERT ON "Reading"
WHEN NEW."kind" NOT IN ('sheet', 'section', 'weighing', 'sounding')
BEGIN SELECT RAISE(ABORT, 'Ledgerline: Reading has no kind of that name.'); END;

DROP TRIGGER IF EXISTS "Reading_kind_update";
CREATE TRIGGER "Reading_kind_update" BEFORE UPDATE OF "kind" ON "Reading"
WHEN NEW."kind" NOT IN ('sheet', 'section', 'weighing', 'sounding')
BEGIN SELECT RAISE(ABORT, 'Ledgerline: Reading has no kind of that name.'); END;

DROP TRIGGER IF EXISTS "Evaluation_cause_insert";
CREATE TRIGGER "Evaluation_cause_insert" BEFORE INSERT ON "Evaluation"
WHEN NEW."cause" NOT IN ('first', 'superseded', 'calibration', 'rig', 'material', 'settings', 'model')
BEGIN SELECT RAISE(ABORT, 'Ledgerline: Evaluation has no cause of that name.'); END;

DROP TRIGGER IF EXISTS "Evaluation_cause_update";
CREATE TRIGGER "Evaluation_cause_update" BEFORE UPDATE OF "cause" ON "Evaluation"
WHEN NEW."cause" NOT IN ('first', 'superseded', 'calibration', 'rig', 'material', 'settings', 'model')
BEGIN SELECT RAISE(ABORT, 'Ledgerline: Evaluation has no cause of that name.'); END;

DROP TRIGGER IF EXISTS "PersonRole_role_insert";
CREATE TRIGGER "PersonRole_role_insert" BEFORE INSERT ON "PersonRole"
WHEN NEW."role" NOT IN ('bench', 'quality', 'sales', 'administrator')
BEGIN SELECT RAISE(ABORT, 'Ledgerline: PersonRole has no role of that name.'); END;

DROP TRIGGER IF EXISTS "PersonRole_role_update";
CREATE TRIGGER "PersonRole_role_update" BEFORE UPDATE OF "role" ON "PersonRole"
WHEN NEW."role" NOT IN ('bench', 'quality', 'sales', 'administrator')
BEGIN SELECT RAISE(ABORT, 'Ledgerline: PersonRole has no role of that name.'); END;

DROP TRIGGER IF EXISTS "MaterialIn_kind_insert";
CREATE TRIGGER "MaterialIn_kind_insert" BEFORE INSERT ON "MaterialIn"
WHEN NEW."kind" NOT IN ('coil', 'spool', 'resin-batch')
BEGIN SELECT RAISE(ABORT, 'Ledgerline: MaterialIn has no kind of that name.'); END;

DROP TRIGGER IF EXISTS "MaterialIn_kind_update";
CREATE TRIGGER "MaterialIn_kind_update" BEFORE UPDATE OF "kind" ON "MaterialIn"
WHEN NEW."kind" NOT IN ('coil', 'spool', 'resin-batch')
BEGIN SELECT RAISE(ABORT, 'Ledgerline: MaterialIn has no kind of that name.'); END;

DROP TRIGGER IF EXISTS "LotMaterial_role_insert";
CREATE TRIGGER "LotMaterial_role_insert" BEFORE INSERT ON "LotMaterial"
WHEN NEW."role" NOT IN ('core', 'wrap-1', 'wrap-2', 'resin')
BEGIN SELECT RAISE(ABORT, 'Ledgerline: LotMaterial has no role of that name.'); END;

DROP TRIGGER IF EXISTS "LotMaterial_role_update";
CREATE TRIGGER "LotMaterial_role_update" BEFORE UPDATE OF "role" ON "LotMaterial"
WHEN NEW."role" NOT IN ('core', 'wrap-1', 'wrap-2', 'resin')
BEGIN SELECT RAISE(ABORT, 'Ledgerline: LotMaterial has no role of that name.'); END;

DROP TRIGGER IF EXISTS "Import_state_insert";
CREATE TRIGGER "Import_state_insert" BEFORE INSERT ON "Import"
WHEN NEW."state" NOT IN ('draft', 'queued', 'running', 'done', 'cancelled', 'failed')
BEGIN SELECT RAISE(ABORT, 'Ledgerline: Import has no state of that name.'); END;

DROP TRIGGER IF EXISTS "Import_state_update";
CREATE TRIGGER "Import_state_update" BEFORE UPDATE OF "state" ON "Import"
WHEN NEW."state" NOT IN ('draft', 'queued', 'running', 'done', 'cancelled', 'failed')
BEGIN SELECT RAISE(ABORT, 'Ledgerline: Import has no state of that name.'); END;

DROP TRIGGER IF EXISTS "Import_format_insert";
CREATE TRIGGER "Import_format_insert" BEFORE INSERT ON "Import"
WHEN NEW."format" NOT IN ('csv', 'xlsx')
BEGIN SELECT RAISE(ABORT, 'Ledgerline: Import has no format of that name.'); END;

DROP TRIGGER IF EXISTS "Import_format_update";
CREATE TRIGGER "Import_format_update" BEFORE UPDATE OF "format" ON "Import"
WHEN NEW."format" NOT IN ('csv', 'xlsx')
BEGIN SELECT RAISE(ABORT, 'Ledgerline: Import has no format of that name.'); END;

DROP TRIGGER IF EXISTS "ImportRow_kind_insert";
CREATE TRIGGER "ImportRow_kind_insert" BEFORE INSERT ON "ImportRow"
WHEN NEW."kind" NOT IN ('refused', 'differs')
BEGIN SELECT RAISE(ABORT, 'Ledgerline: ImportRow has no kind of that name.'); END;

DROP TRIGGER IF EXISTS "ImportRow_kind_update";
CREATE TRIGGER "ImportRow_kind_update" BEFORE UPDATE OF "kind" ON "ImportRow"
WHEN NEW."kind" NOT IN ('refused', 'differs')
BEGIN SELECT RAISE(ABORT, 'Ledgerline: ImportRow has no kind of that name.'); END;

DROP TRIGGER IF EXISTS "ImportRow_state_insert";
CREATE TRIGGER "ImportRow_state_insert" BEFORE INSERT ON "ImportRow"
WHEN NEW."state" NOT IN ('open', 'kept-stored', 'took-file')
BEGIN SELECT RAISE(ABORT, 'Ledgerline: ImportRow has no state of that name.'); END;

DROP TRIGGER IF EXISTS "ImportRow_state_update";
CREATE TRIGGER "ImportRow_state_update" BEFORE UPDATE OF "state" ON "ImportRow"
WHEN NEW."state" NOT IN ('open', 'kept-stored', 'took-file')
BEGIN SELECT RAISE(ABORT, 'Ledgerline: ImportRow has no state of that name.'); END;
