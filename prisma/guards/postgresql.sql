-- What the database server itself refuses, whoever asks: made anew after each run of the migrations. Each
-- refusal begins with "Ledgerline: " (lib/data/db-errors.ts). The same promises as sqlite.sql.

CREATE OR REPLACE FUNCTION ledgerline_refuse() RETURNS trigger LANGUAGE plpgsql AS $$
BEGIN
  RAISE EXCEPTION 'Ledgerline: %', TG_ARGV[0] USING ERRCODE = 'LL001';
END $$;

-- Append-only tables.

DROP TRIGGER IF EXISTS "Reading_no_update" ON "Reading";
CREATE TRIGGER "Reading_no_update" BEFORE UPDATE ON "Reading" FOR EACH ROW
EXECUTE FUNCTION ledgerline_refuse('A reading is never changed or removed, a correction is a reading that supersedes it.');

DROP TRIGGER IF EXISTS "Reading_no_delete" ON "Reading";
CREATE TRIGGER "Reading_no_delete" BEFORE DELETE ON "Reading" FOR EACH ROW
EXECUTE FUNCTION ledgerline_refuse('A reading is never changed or removed, a correction is a reading that supersedes it.');

DROP TRIGGER IF EXISTS "Reading_no_truncate" ON "Reading";
CREATE TRIGGER "Reading_no_truncate" BEFORE TRUNCATE ON "Reading" FOR EACH STATEMENT
EXECUTE FUNCTION ledgerline_refuse('A reading is never changed or removed, a correction is a reading that supersedes it.');

DROP TRIGGER IF EXISTS "InputSnapshot_no_update" ON "InputSnapshot";
CREATE TRIGGER "InputSnapshot_no_update" BEFORE UPDATE ON "InputSnapshot" FOR EACH ROW
EXECUTE FUNCTION ledgerline_refuse('What a result was computed from is never changed or removed.');

DROP TRIGGER IF EXISTS "InputSnapshot_no_delete" ON "InputSnapshot";
CREATE TRIGGER "InputSnapshot_no_delete" BEFORE DELETE ON "InputSnapshot" FOR EACH ROW
EXECUTE FUNCTION ledgerline_refuse('What a result was computed from is never changed or removed.');

DROP TRIGGER IF EXISTS "InputSnapshot_no_truncate" ON "InputSnapshot";
CREATE TRIGGER "InputSnapshot_no_truncate" BEFORE TRUNCATE ON "InputSnapshot" FOR EACH STATEMENT
EXECUTE FUNCTION ledgerline_refuse('What a result was computed from is never changed or removed.');

DROP TRIGGER IF EXISTS "Evaluation_no_update" ON "Evaluation";
CREATE TRIGGER "Evaluation_no_update" BEFORE UPDATE ON "Evaluation" FOR EACH ROW
EXECUTE FUNCTION ledgerline_refuse('An evaluation is never changed or removed, a new one follows it.');

DROP TRIGGER IF EXISTS "Evaluation_no_delete" ON "Evaluation";
CREATE TRIGGER "Evaluation_no_delete" BEFORE DELETE ON "Evaluation" FOR EACH ROW
EXECUTE FUNCTION ledgerline_refuse('An evaluation is never changed or removed, a new one follows it.');

DROP TRIGGER IF EXISTS "Evaluation_no_truncate" ON "Evaluation";
CREATE TRIGGER "Evaluation_no_truncate" BEFORE TRUNCATE ON "Evaluation" FOR EACH STATEMENT
EXECUTE FUNCTION ledgerline_refuse('An evaluation is never changed or removed, a new one follows it.');

DROP TRIGGER IF EXISTS "SpecimenResult_no_update" ON "SpecimenResult";
CREATE TRIGGER "SpecimenResult_no_update" BEFORE UPDATE ON "SpecimenResult" FOR EACH ROW
EXECUTE FUNCTION ledgerline_refuse('A result is never changed or removed, a new evaluation brings a new one.');

DROP TRIGGER IF EXISTS "SpecimenResult_no_delete" ON "SpecimenResult";
CREATE TRIGGER "SpecimenResult_no_delete" BEFORE DELETE ON "SpecimenResult" FOR EACH ROW
EXECUTE FUNCTION ledgerline_refuse('A result is never changed or removed, a new evaluation brings a new one.');

DROP TRIGGER IF EXISTS "SpecimenResult_no_truncate" ON "SpecimenResult";
CREATE TRIGGER "SpecimenResult_no_truncate" BEFORE TRUNCATE ON "SpecimenResult" FOR EACH STATEMENT
EXECUTE FUNCTION ledgerline_refuse('A result is never changed or removed, a new evaluation brings a new one.');

DROP TRIGGER IF EXISTS "SpecificationRevision_no_update" ON "SpecificationRevision";
CREATE TRIGGER "SpecificationRevision_no_update" BEFORE UPDATE ON "SpecificationRevision" FOR EACH ROW
EXECUTE FUNCTION ledgerline_refuse('An issued specification is never changed or removed, a new revision follows it.');

DROP TRIGGER IF EXISTS "SpecificationRevision_no_delete" ON "SpecificationRevision";
CREATE TRIGGER "SpecificationRevision_no_delete" BEFORE DELETE ON "SpecificationRevision" FOR EACH ROW
EXECUTE FUNCTION ledgerline_refuse('An issued specification is never changed or removed, a new revision follows it.');

DROP TRIGGER IF EXISTS "SpecificationRevision_no_truncate" ON "SpecificationRevision";
CREATE TRIGGER "SpecificationRevision_no_truncate" BEFORE TRUNCATE ON "SpecificationRevision" FOR EACH STATEMENT
EXECUTE FUNCTION ledgerline_refuse('An issued specification is never changed or removed, a new revision follows it.');

DROP TRIGGER IF EXISTS "DatasheetLot_no_update" ON "DatasheetLot";
CREATE TRIGGER "DatasheetLot_no_update" BEFORE UPDATE ON "DatasheetLot" FOR EACH ROW
EXECUTE FUNCTION ledgerline_refuse('The lots of a published datasheet stay as they are.');

DROP TRIGGER IF EXISTS "DatasheetLot_no_delete" ON "DatasheetLot";
CREATE TRIGGER "DatasheetLot_no_delete" BEFORE DELETE ON "DatasheetLot" FOR EACH ROW
EXECUTE FUNCTION ledgerline_refuse('The lots of a published datasheet stay as they are.');

DROP TRIGGER IF EXISTS "DatasheetLot_no_truncate" ON "DatasheetLot";
CREATE TRIGGER "DatasheetLot_no_truncate" BEFORE TRUNCATE ON "DatasheetLot" FOR EACH STATEMENT
EXECUTE FUNCTION ledgerline_refuse('The lots of a published datasheet stay as they are.');

DROP TRIGGER IF EXISTS "LedgerEntry_no_update" ON "LedgerEntry";
CREATE TRIGGER "LedgerEntry_no_update" BEFORE UPDATE ON "LedgerEntry" FOR EACH ROW
EXECUTE FUNCTION ledgerline_refuse('The ledger is never changed, it only grows.');

DROP TRIGGER IF EXISTS "LedgerEntry_no_delete" ON "LedgerEntry";
CREATE TRIGGER "LedgerEntry_no_delete" BEFORE DELETE ON "LedgerEntry" FOR EACH ROW
EXECUTE FUNCTION ledgerline_refuse('The ledger is never changed, it only grows.');

DROP TRIGGER IF EXISTS "LedgerEntry_no_truncate" ON "LedgerEntry";
CREATE TRIGGER "LedgerEntry_no_truncate" BEFORE TRUNCATE ON "LedgerEntry" FOR EACH STATEMENT
EXECUTE FUNCTION ledgerline_refuse('The ledger is never changed, it only grows.');

-- Tables whose rows keep what they say: only marks beside it may change.

DROP TRIGGER IF EXISTS "Disposition_keeps_body" ON "Disposition";
CREATE TRIGGER "Disposition_keeps_body" BEFORE UPDATE ON "Disposition" FOR EACH ROW WHEN (NEW."id" IS DISTINCT FROM OLD."id" OR NEW."lotId" IS DISTINCT FROM OLD."lotId" OR NEW."number" IS DISTINCT FROM OLD."number" OR NEW."verb" IS DISTINCT FROM OLD."verb" OR NEW."reason" IS DISTINCT FROM OLD."reason" OR NEW."decidedAt" IS DISTINCT FROM OLD."decidedAt" OR NEW."decidedById" IS DISTINCT FROM OLD."decidedById" OR NEW."proposal" IS DISTINCT FROM OLD."proposal" OR NEW."evidence" IS DISTINCT FROM OLD."evidence" OR NEW."evidenceHash" IS DISTINCT FROM OLD."evidenceHash")
EXECUTE FUNCTION ledgerline_refuse('A decision is never changed or removed, another one follows it.');

DROP TRIGGER IF EXISTS "Disposition_no_delete" ON "Disposition";
CREATE TRIGGER "Disposition_no_delete" BEFORE DELETE ON "Disposition" FOR EACH ROW
EXECUTE FUNCTION ledgerline_refuse('A decision is never changed or removed, another one follows it.');

DROP TRIGGER IF EXISTS "Disposition_no_truncate" ON "Disposition";
CREATE TRIGGER "Disposition_no_truncate" BEFORE TRUNCATE ON "Disposition" FOR EACH STATEMENT
EXECUTE FUNCTION ledgerline_refuse('A decision is never changed or removed, another one follows it.');

DROP TRIGGER IF EXISTS "DatasheetRevision_keeps_body" ON "DatasheetRevision";
CREATE TRIGGER "DatasheetRevision_keeps_body" BEFORE UPDATE ON "DatasheetRevision" FOR EACH ROW WHEN (NEW."id" IS DISTINCT FROM OLD."id" OR NEW."datasheetId" IS DISTINCT FROM OLD."datasheetId" OR NEW."number" IS DISTINCT FROM OLD."number" OR NEW."basis" IS DISTINCT FROM OLD."basis" OR NEW."modelVersion" IS DISTINCT FROM OLD."modelVersion" OR NEW."body" IS DISTINCT FROM OLD."body" OR NEW."hash" IS DISTINCT FROM OLD."hash" OR NEW."ledgerCount" IS DISTINCT FROM OLD."ledgerCount" OR NEW."ledgerHash" IS DISTINCT FROM OLD."ledgerHash" OR NEW."publishedAt" IS DISTINCT FROM OLD."publishedAt" OR NEW."publishedById" IS DISTINCT FROM OLD."publishedById")
EXECUTE FUNCTION ledgerline_refuse('A published datasheet is never changed or removed, a new revision follows it.');

DROP TRIGGER IF EXISTS "DatasheetRevision_no_delete" ON "DatasheetRevision";
CREATE TRIGGER "DatasheetRevision_no_delete" BEFORE DELETE ON "DatasheetRevision" FOR EACH ROW
EXECUTE FUNCTION ledgerline_refuse('A published datasheet is never changed or removed, a new revision follows it.');

DROP TRIGGER IF EXISTS "DatasheetRevision_no_truncate" ON "DatasheetRevision";
CREATE TRIGGER "DatasheetRevision_no_truncate" BEFORE TRUNCATE ON "DatasheetRevision" FOR EACH STATEMENT
EXECUTE FUNCTION ledgerline_refuse('A published datasheet is never changed or removed, a new revision follows it.');

DROP TRIGGER IF EXISTS "LimitSet_keeps_body" ON "LimitSet";
CREATE TRIGGER "LimitSet_keeps_body" BEFORE UPDATE ON "LimitSet" FOR EACH ROW WHEN (NEW."id" IS DISTINCT FROM OLD."id" OR NEW."productId" IS DISTINCT FROM OLD."productId" OR NEW."characteristic" IS DISTINCT FROM OLD."characteristic" OR NEW."statistic" IS DISTINCT FROM OLD."statistic" OR NEW."number" IS DISTINCT FROM OLD."number" OR NEW."centre" IS DISTINCT FROM OLD."centre" OR NEW."sigma" IS DISTINCT FROM OLD."sigma" OR NEW."lower" IS DISTINCT FROM OLD."lower" OR NEW."upper" IS DISTINCT FROM OLD."upper" OR NEW."sigmaEstimator" IS DISTINCT FROM OLD."sigmaEstimator" OR NEW."lotCount" IS DISTINCT FROM OLD."lotCount" OR NEW."provisional" IS DISTINCT FROM OLD."provisional" OR NEW."baseline" IS DISTINCT FROM OLD."baseline" OR NEW."effectiveFrom" IS DISTINCT FROM OLD."effectiveFrom" OR NEW."frozenAt" IS DISTINCT FROM OLD."frozenAt" OR NEW."frozenById" IS DISTINCT FROM OLD."frozenById" OR NEW."reason" IS DISTINCT FROM OLD."reason" OR NEW."target" IS DISTINCT FROM OLD."target" OR NEW."rules" IS DISTINCT FROM OLD."rules")
EXECUTE FUNCTION ledgerline_refuse('Frozen limits are never changed or removed, another set follows them.');

DROP TRIGGER IF EXISTS "LimitSet_no_delete" ON "LimitSet";
CREATE TRIGGER "LimitSet_no_delete" BEFORE DELETE ON "LimitSet" FOR EACH ROW
EXECUTE FUNCTION ledgerline_refuse('Frozen limits are never changed or removed, another set follows them.');

DROP TRIGGER IF EXISTS "LimitSet_no_truncate" ON "LimitSet";
CREATE TRIGGER "LimitSet_no_truncate" BEFORE TRUNCATE ON "LimitSet" FOR EACH STATEMENT
EXECUTE FUNCTION ledgerline_refuse('Frozen limits are never changed or removed, another set follows them.');

DROP TRIGGER IF EXISTS "Specimen_keeps_body" ON "Specimen";
CREATE TRIGGER "Specimen_keeps_body" BEFORE UPDATE ON "Specimen" FOR EACH ROW WHEN (NEW."id" IS DISTINCT FROM OLD."id" OR NEW."clientId" IS DISTINCT FROM OLD."clientId" OR NEW."lotId" IS DISTINCT FROM OLD."lotId" OR NEW."number" IS DISTINCT FROM OLD."number")
EXECUTE FUNCTION ledgerline_refuse('A specimen keeps its lot and number and is never removed.');

DROP TRIGGER IF EXISTS "Specimen_no_delete" ON "Specimen";
CREATE TRIGGER "Specimen_no_delete" BEFORE DELETE ON "Specimen" FOR EACH ROW
EXECUTE FUNCTION ledgerline_refuse('A specimen keeps its lot and number and is never removed.');

DROP TRIGGER IF EXISTS "Specimen_no_truncate" ON "Specimen";
CREATE TRIGGER "Specimen_no_truncate" BEFORE TRUNCATE ON "Specimen" FOR EACH STATEMENT
EXECUTE FUNCTION ledgerline_refuse('A specimen keeps its lot and number and is never removed.');

DROP TRIGGER IF EXISTS "Signal_keeps_body" ON "Signal";
CREATE TRIGGER "Signal_keeps_body" BEFORE UPDATE ON "Signal" FOR EACH ROW WHEN (NEW."id" IS DISTINCT FROM OLD."id" OR NEW."lotId" IS DISTINCT FROM OLD."lotId" OR NEW."productId" IS DISTINCT FROM OLD."productId" OR NEW."characteristic" IS DISTINCT FROM OLD."characteristic" OR NEW."statistic" IS DISTINCT FROM OLD."statistic" OR NEW."limitSetId" IS DISTINCT FROM OLD."limitSetId" OR NEW."rule" IS DISTINCT FROM OLD."rule" OR NEW."side" IS DISTINCT FROM OLD."side" OR NEW."machineId" IS DISTINCT FROM OLD."machineId")
EXECUTE FUNCTION ledgerline_refuse('A signal keeps what it is about and is never removed, it is answered or marked.');

DROP TRIGGER IF EXISTS "Signal_no_delete" ON "Signal";
CREATE TRIGGER "Signal_no_delete" BEFORE DELETE ON "Signal" FOR EACH ROW
EXECUTE FUNCTION ledgerline_refuse('A signal keeps what it is about and is never removed, it is answered or marked.');

DROP TRIGGER IF EXISTS "Signal_no_truncate" ON "Signal";
CREATE TRIGGER "Signal_no_truncate" BEFORE TRUNCATE ON "Signal" FOR EACH STATEMENT
EXECUTE FUNCTION ledgerline_refuse('A signal keeps what it is about and is never removed, it is answered or marked.');

DROP TRIGGER IF EXISTS "Lot_keeps_body" ON "Lot";
CREATE TRIGGER "Lot_keeps_body" BEFORE UPDATE ON "Lot" FOR EACH ROW WHEN (NEW."id" IS DISTINCT FROM OLD."id" OR NEW."code" IS DISTINCT FROM OLD."code")
EXECUTE FUNCTION ledgerline_refuse('A lot keeps its code and is never removed.');

DROP TRIGGER IF EXISTS "Lot_no_delete" ON "Lot";
CREATE TRIGGER "Lot_no_delete" BEFORE DELETE ON "Lot" FOR EACH ROW
EXECUTE FUNCTION ledgerline_refuse('A lot keeps its code and is never removed.');

DROP TRIGGER IF EXISTS "Lot_no_truncate" ON "Lot";
CREATE TRIGGER "Lot_no_truncate" BEFORE TRUNCATE ON "Lot" FOR EACH STATEMENT
EXECUTE FUNCTION ledgerline_refuse('A lot keeps its code and is never removed.');

DROP TRIGGER IF EXISTS "Person_keeps_body" ON "Person";
CREATE TRIGGER "Person_keeps_body" BEFORE UPDATE ON "Person" FOR EACH ROW WHEN (NEW."id" IS DISTINCT FROM OLD."id")
EXECUTE FUNCTION ledgerline_refuse('A person is never removed.');

DROP TRIGGER IF EXISTS "Person_no_delete" ON "Person";
CREATE TRIGGER "Person_no_delete" BEFORE DELETE ON "Person" FOR EACH ROW
EXECUTE FUNCTION ledgerline_refuse('A person is never removed.');

DROP TRIGGER IF EXISTS "Person_no_truncate" ON "Person";
CREATE TRIGGER "Person_no_truncate" BEFORE TRUNCATE ON "Person" FOR EACH STATEMENT
EXECUTE FUNCTION ledgerline_refuse('A person is never removed.');

DROP TRIGGER IF EXISTS "LedgerHead_keeps_body" ON "LedgerHead";
CREATE TRIGGER "LedgerHead_keeps_body" BEFORE UPDATE ON "LedgerHead" FOR EACH ROW WHEN (NEW."id" IS DISTINCT FROM OLD."id")
EXECUTE FUNCTION ledgerline_refuse('The head of the ledger is never removed.');

DROP TRIGGER IF EXISTS "LedgerHead_no_delete" ON "LedgerHead";
CREATE TRIGGER "LedgerHead_no_delete" BEFORE DELETE ON "LedgerHead" FOR EACH ROW
EXECUTE FUNCTION ledgerline_refuse('The head of the ledger is never removed.');

DROP TRIGGER IF EXISTS "LedgerHead_no_truncate" ON "LedgerHead";
CREATE TRIGGER "LedgerHead_no_truncate" BEFORE TRUNCATE ON "LedgerHead" FOR EACH STATEMENT
EXECUTE FUNCTION ledgerline_refuse('The head of the ledger is never removed.');

-- The ledger grows by one entry at a time, each hung on the one before.

INSERT INTO "LedgerHead" ("id", "count", "hash")
SELECT 1, 0, repeat('0', 64)
WHERE NOT EXISTS (SELECT 1 FROM "LedgerHead") AND NOT EXISTS (SELECT 1 FROM "LedgerEntry");

CREATE OR REPLACE FUNCTION ledgerline_entry_in_order() RETURNS trigger LANGUAGE plpgsql AS $$
BEGIN
  IF NOT EXISTS (
    SELECT 1 FROM "LedgerHead" WHERE "id" = 1 AND "count" = NEW."sequence" - 1 AND "hash" = NEW."previousHash"
  ) THEN
    RAISE EXCEPTION 'Ledgerline: A ledger entry follows the last one.' USING ERRCODE = 'LL001';
  END IF;
  RETURN NEW;
END $$;

DROP TRIGGER IF EXISTS "LedgerEntry_in_order" ON "LedgerEntry";
CREATE TRIGGER "LedgerEntry_in_order" BEFORE INSERT ON "LedgerEntry" FOR EACH ROW
EXECUTE FUNCTION ledgerline_entry_in_order();

CREATE OR REPLACE FUNCTION ledgerline_head_in_order() RETURNS trigger LANGUAGE plpgsql AS $$
BEGIN
  IF TG_OP = 'INSERT' AND EXISTS (SELECT 1 FROM "LedgerHead") THEN
    RAISE EXCEPTION 'Ledgerline: The ledger has one head.' USING ERRCODE = 'LL001';
  END IF;
  IF TG_OP = 'UPDATE' AND (NEW."count" <> OLD."count" + 1 OR NOT EXISTS (
    SELECT 1 FROM "LedgerEntry" WHERE "sequence" = NEW."count" AND "hash" = NEW."hash"
  )) THEN
    RAISE EXCEPTION 'Ledgerline: The head of the ledger moves to the entry just written.' USING ERRCODE = 'LL001';
  END IF;
  RETURN NEW;
END $$;

DROP TRIGGER IF EXISTS "LedgerHead_in_order" ON "LedgerHead";
CREATE TRIGGER "LedgerHead_in_order" BEFORE INSERT OR UPDATE ON "LedgerHead" FOR EACH ROW
EXECUTE FUNCTION ledgerline_head_in_order();

-- Finite numbers only: not a number sorts above infinity here, so one comparison refuses both. Rows that are
-- there have been checked when they were written; NOT VALID spares reading them all at each start.

ALTER TABLE "LimitSet" DROP CONSTRAINT IF EXISTS "LimitSet_finite";
ALTER TABLE "LimitSet" ADD CONSTRAINT "LimitSet_finite" CHECK (
  ("centre" IS NULL OR "centre" > '-Infinity' AND "centre" < 'Infinity')
  AND ("sigma" IS NULL OR "sigma" > '-Infinity' AND "sigma" < 'Infinity')
  AND ("lower" IS NULL OR "lower" > '-Infinity' AND "lower" < 'Infinity')
  AND ("upper" IS NULL OR "upper" > '-Infinity' AND "upper" < 'Infinity')
  AND ("target" IS NULL OR "target" > '-Infinity' AND "target" < 'Infinity')
) NOT VALID;

ALTER TABLE "Signal" DROP CONSTRAINT IF EXISTS "Signal_finite";
ALTER TABLE "Signal" ADD CONSTRAINT "Signal_finite" CHECK (
  ("departure" IS NULL OR "departure" > '-Infinity' AND "departure" < 'Infinity')
) NOT VALID;

ALTER TABLE "Gauge" DROP CONSTRAINT IF EXISTS "Gauge_finite";
ALTER TABLE "Gauge" ADD CONSTRAINT "Gauge_finite" CHECK (
  ("resolution" IS NULL OR "resolution" > '-Infinity' AND "resolution" < 'Infinity')
  AND ("uAbsolute" IS NULL OR "uAbsolute" > '-Infinity' AND "uAbsolute" < 'Infinity')
  AND ("uRelative" IS NULL OR "uRelative" > '-Infinity' AND "uRelative" < 'Infinity')
  AND ("error" IS NULL OR "error" > '-Infinity' AND "error" < 'Infinity')
) NOT VALID;

ALTER TABLE "Weight" DROP CONSTRAINT IF EXISTS "Weight_finite";
ALTER TABLE "Weight" ADD CONSTRAINT "Weight_finite" CHECK (
  ("conventionalMass" IS NULL OR "conventionalMass" > '-Infinity' AND "conventionalMass" < 'Infinity')
  AND ("uMass" IS NULL OR "uMass" > '-Infinity' AND "uMass" < 'Infinity')
) NOT VALID;

ALTER TABLE "Rig" DROP CONSTRAINT IF EXISTS "Rig_finite";
ALTER TABLE "Rig" ADD CONSTRAINT "Rig_finite" CHECK (
  ("spanMetres" IS NULL OR "spanMetres" > '-Infinity' AND "spanMetres" < 'Infinity')
  AND ("uSpanMetres" IS NULL OR "uSpanMetres" > '-Infinity' AND "uSpanMetres" < 'Infinity')
  AND ("uEndRelative" IS NULL OR "uEndRelative" > '-Infinity' AND "uEndRelative" < 'Infinity')
  AND ("frictionHalfWidth" IS NULL OR "frictionHalfWidth" > '-Infinity' AND "frictionHalfWidth" < 'Infinity')
  AND ("hangingLengthMetres" IS NULL OR "hangingLengthMetres" > '-Infinity' AND "hangingLengthMetres" < 'Infinity')
) NOT VALID;

ALTER TABLE "Die" DROP CONSTRAINT IF EXISTS "Die_finite";
ALTER TABLE "Die" ADD CONSTRAINT "Die_finite" CHECK (
  ("sizeMetres" IS NULL OR "sizeMetres" > '-Infinity' AND "sizeMetres" < 'Infinity')
) NOT VALID;

ALTER TABLE "Lot" DROP CONSTRAINT IF EXISTS "Lot_finite";
ALTER TABLE "Lot" ADD CONSTRAINT "Lot_finite" CHECK (
  ("lengthMetres" IS NULL OR "lengthMetres" > '-Infinity' AND "lengthMetres" < 'Infinity')
) NOT VALID;

ALTER TABLE "SpecimenResult" DROP CONSTRAINT IF EXISTS "SpecimenResult_finite";
ALTER TABLE "SpecimenResult" ADD CONSTRAINT "SpecimenResult_finite" CHECK (
  ("diameter" IS NULL OR "diameter" > '-Infinity' AND "diameter" < 'Infinity')
  AND ("diameterU" IS NULL OR "diameterU" > '-Infinity' AND "diameterU" < 'Infinity')
  AND ("diameterUc" IS NULL OR "diameterUc" > '-Infinity' AND "diameterUc" < 'Infinity')
  AND ("ovality" IS NULL OR "ovality" > '-Infinity' AND "ovality" < 'Infinity')
  AND ("ovalityU" IS NULL OR "ovalityU" > '-Infinity' AND "ovalityU" < 'Infinity')
  AND ("ovalityUc" IS NULL OR "ovalityUc" > '-Infinity' AND "ovalityUc" < 'Infinity')
  AND ("massPerMetreWeighed" IS NULL OR "massPerMetreWeighed" > '-Infinity' AND "massPerMetreWeighed" < 'Infinity')
  AND ("massPerMetreWeighedU" IS NULL OR "massPerMetreWeighedU" > '-Infinity' AND "massPerMetreWeighedU" < 'Infinity')
  AND ("massPerMetreWeighedUc" IS NULL OR "massPerMetreWeighedUc" > '-Infinity' AND "massPerMetreWeighedUc" < 'Infinity')
  AND ("massPerMetreSounded" IS NULL OR "massPerMetreSounded" > '-Infinity' AND "massPerMetreSounded" < 'Infinity')
  AND ("massPerMetreSoundedU" IS NULL OR "massPerMetreSoundedU" > '-Infinity' AND "massPerMetreSoundedU" < 'Infinity')
  AND ("massPerMetreSoundedUc" IS NULL OR "massPerMetreSoundedUc" > '-Infinity' AND "massPerMetreSoundedUc" < 'Infinity')
  AND ("closure" IS NULL OR "closure" > '-Infinity' AND "closure" < 'Infinity')
  AND ("closureU" IS NULL OR "closureU" > '-Infinity' AND "closureU" < 'Infinity')
  AND ("closureUc" IS NULL OR "closureUc" > '-Infinity' AND "closureUc" < 'Infinity')
  AND ("densityCheckWeighed" IS NULL OR "densityCheckWeighed" > '-Infinity' AND "densityCheckWeighed" < 'Infinity')
  AND ("densityCheckWeighedU" IS NULL OR "densityCheckWeighedU" > '-Infinity' AND "densityCheckWeighedU" < 'Infinity')
  AND ("densityCheckWeighedUc" IS NULL OR "densityCheckWeighedUc" > '-Infinity' AND "densityCheckWeighedUc" < 'Infinity')
  AND ("densityCheckSounded" IS NULL OR "densityCheckSounded" > '-Infinity' AND "densityCheckSounded" < 'Infinity')
  AND ("densityCheckSoundedU" IS NULL OR "densityCheckSoundedU" > '-Infinity' AND "densityCheckSoundedU" < 'Infinity')
  AND ("densityCheckSoundedUc" IS NULL OR "densityCheckSoundedUc" > '-Infinity' AND "densityCheckSoundedUc" < 'Infinity')
  AND ("effectiveDensity" IS NULL OR "effectiveDensity" > '-Infinity' AND "effectiveDensity" < 'Infinity')
  AND ("effectiveDensityU" IS NULL OR "effectiveDensityU" > '-Infinity' AND "effectiveDensityU" < 'Infinity')
  AND ("effectiveDensityUc" IS NULL OR "effectiveDensityUc" > '-Infinity' AND "effectiveDensityUc" < 'Infinity')
  AND ("tension" IS NULL OR "tension" > '-Infinity' AND "tension" < 'Infinity')
  AND ("tensionU" IS NULL OR "tensionU" > '-Infinity' AND "tensionU" < 'Infinity')
  AND ("tensionUc" IS NULL OR "tensionUc" > '-Infinity' AND "tensionUc" < 'Infinity')
  AND ("pitchError" IS NULL OR "pitchError" > '-Infinity' AND "pitchError" < 'Infinity')
  AND ("pitchErrorU" IS NULL OR "pitchErrorU" > '-Infinity' AND "pitchErrorU" < 'Infinity')
  AND ("pitchErrorUc" IS NULL OR "pitchErrorUc" > '-Infinity' AND "pitchErrorUc" < 'Infinity')
) NOT VALID;

ALTER TABLE "LotSummary" DROP CONSTRAINT IF EXISTS "LotSummary_finite";
ALTER TABLE "LotSummary" ADD CONSTRAINT "LotSummary_finite" CHECK (
  ("mean" IS NULL OR "mean" > '-Infinity' AND "mean" < 'Infinity')
  AND ("m2" IS NULL OR "m2" > '-Infinity' AND "m2" < 'Infinity')
  AND ("min" IS NULL OR "min" > '-Infinity' AND "min" < 'Infinity')
  AND ("max" IS NULL OR "max" > '-Infinity' AND "max" < 'Infinity')
  AND ("uCommon" IS NULL OR "uCommon" > '-Infinity' AND "uCommon" < 'Infinity')
  AND ("uMean" IS NULL OR "uMean" > '-Infinity' AND "uMean" < 'Infinity')
) NOT VALID;

ALTER TABLE "Works" DROP CONSTRAINT IF EXISTS "Works_finite";
ALTER TABLE "Works" ADD CONSTRAINT "Works_finite" CHECK (
  ("latitudeDegrees" IS NULL OR "latitudeDegrees" > '-Infinity' AND "latitudeDegrees" < 'Infinity')
  AND ("heightMetres" IS NULL OR "heightMetres" > '-Infinity' AND "heightMetres" < 'Infinity')
  AND ("gravityTyped" IS NULL OR "gravityTyped" > '-Infinity' AND "gravityTyped" < 'Infinity')
  AND ("airTemperatureCelsius" IS NULL OR "airTemperatureCelsius" > '-Infinity' AND "airTemperatureCelsius" < 'Infinity')
  AND ("airPressurePascals" IS NULL OR "airPressurePascals" > '-Infinity' AND "airPressurePascals" < 'Infinity')
  AND ("airHumidity" IS NULL OR "airHumidity" > '-Infinity' AND "airHumidity" < 'Infinity')
  AND ("a4" IS NULL OR "a4" > '-Infinity' AND "a4" < 'Infinity')
) NOT VALID;

ALTER TABLE "MaterialIn" DROP CONSTRAINT IF EXISTS "MaterialIn_finite";
ALTER TABLE "MaterialIn" ADD CONSTRAINT "MaterialIn_finite" CHECK (
  ("sizeMetres" IS NULL OR "sizeMetres" > '-Infinity' AND "sizeMetres" < 'Infinity')
  AND ("lengthMetres" IS NULL OR "lengthMetres" > '-Infinity' AND "lengthMetres" < 'Infinity')
  AND ("massKilograms" IS NULL OR "massKilograms" > '-Infinity' AND "massKilograms" < 'Infinity')
) NOT VALID;

ALTER TABLE "LotMaterial" DROP CONSTRAINT IF EXISTS "LotMaterial_finite";
ALTER TABLE "LotMaterial" ADD CONSTRAINT "LotMaterial_finite" CHECK (
  ("fromMetre" IS NULL OR "fromMetre" > '-Infinity' AND "fromMetre" < 'Infinity')
  AND ("toMetre" IS NULL OR "toMetre" > '-Infinity' AND "toMetre" < 'Infinity')
) NOT VALID;

-- Words from closed lists.

ALTER TABLE "Lot" DROP CONSTRAINT IF EXISTS "Lot_state_known";
ALTER TABLE "Lot" ADD CONSTRAINT "Lot_state_known" CHECK ("state" IN ('measuring', 'to-decide', 'released', 'held', 'rework', 'regraded', 'concession', 'scrapped')) NOT VALID;

ALTER TABLE "Disposition" DROP CONSTRAINT IF EXISTS "Disposition_verb_known";
ALTER TABLE "Disposition" ADD CONSTRAINT "Disposition_verb_known" CHECK ("verb" IN ('release', 'hold', 'rework', 'regrade', 'concession', 'scrap')) NOT VALID;

ALTER TABLE "Signal" DROP CONSTRAINT IF EXISTS "Signal_state_known";
ALTER TABLE "Signal" ADD CONSTRAINT "Signal_state_known" CHECK ("state" IN ('open', 'answered', 'no-longer-holds')) NOT VALID;

ALTER TABLE "Signal" DROP CONSTRAINT IF EXISTS "Signal_rule_known";
ALTER TABLE "Signal" ADD CONSTRAINT "Signal_rule_known" CHECK ("rule" IN ('beyond-the-limits', 'nine-on-one-side')) NOT VALID;

ALTER TABLE "Signal" DROP CONSTRAINT IF EXISTS "Signal_side_known";
ALTER TABLE "Signal" ADD CONSTRAINT "Signal_side_known" CHECK ("side" IN ('above', 'below')) NOT VALID;

ALTER TABLE "Signal" DROP CONSTRAINT IF EXISTS "Signal_statistic_known";
ALTER TABLE "Signal" ADD CONSTRAINT "Signal_statistic_known" CHECK ("statistic" IN ('mean', 'within-lot-sd')) NOT VALID;

ALTER TABLE "LimitSet" DROP CONSTRAINT IF EXISTS "LimitSet_statistic_known";
ALTER TABLE "LimitSet" ADD CONSTRAINT "LimitSet_statistic_known" CHECK ("statistic" IN ('mean', 'within-lot-sd')) NOT VALID;

ALTER TABLE "Reading" DROP CONSTRAINT IF EXISTS "Reading_kind_known";
ALTER TABLE "Reading" ADD CONSTRAINT "Reading_kind_known" CHECK ("kind" IN ('sheet', 'section', 'weighing', 'sounding')) NOT VALID;

ALTER TABLE "Evaluation" DROP CONSTRAINT IF EXISTS "Evaluation_cause_known";
ALTER TABLE "Evaluation" ADD CONSTRAINT "Evaluation_cause_known" CHECK ("cause" IN ('first', 'superseded', 'calibration', 'rig', 'material', 'settings', 'model')) NOT VALID;

ALTER TABLE "PersonRole" DROP CONSTRAINT IF EXISTS "PersonRole_role_known";
ALTER TABLE "PersonRole" ADD CONSTRAINT "PersonRole_role_known" CHECK ("role" IN ('bench', 'quality', 'sales', 'administrator')) NOT VALID;

ALTER TABLE "MaterialIn" DROP CONSTRAINT IF EXISTS "MaterialIn_kind_known";
ALTER TABLE "MaterialIn" ADD CONSTRAINT "MaterialIn_kind_known" CHECK ("kind" IN ('coil', 'spool', 'resin-batch')) NOT VALID;

ALTER TABLE "LotMaterial" DROP CONSTRAINT IF EXISTS "LotMaterial_role_known";
ALTER TABLE "LotMaterial" ADD CONSTRAINT "LotMaterial_role_known" CHECK ("role" IN ('core', 'wrap-1', 'wrap-2', 'resin')) NOT VALID;

ALTER TABLE "Import" DROP CONSTRAINT IF EXISTS "Import_state_known";
ALTER TABLE "Import" ADD CONSTRAINT "Import_state_known" CHECK ("state" IN ('draft', 'queued', 'running', 'done', 'cancelled', 'failed')) NOT VALID;

ALTER TABLE "Import" DROP CONSTRAINT IF EXISTS "Import_format_known";
ALTER TABLE "Import" ADD CONSTRAINT "Import_format_known" CHECK ("format" IN ('csv', 'xlsx')) NOT VALID;

ALTER TABLE "ImportRow" DROP CONSTRAINT IF EXISTS "ImportRow_kind_known";
ALTER TABLE "ImportRow" ADD CONSTRAINT "ImportRow_kind_known" CHECK ("kind" IN ('refused', 'differs')) NOT VALID;

ALTER TABLE "ImportRow" DROP CONSTRAINT IF EXISTS "ImportRow_state_known";
ALTER TABLE "ImportRow" ADD CONSTRAINT "ImportRow_state_known" CHECK ("state" IN ('open', 'kept-stored', 'took-file')) NOT VALID;
