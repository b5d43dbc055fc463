import { dateFieldValue } from '@/app/_ui/format/dates'
import { ActionForm } from '@/app/_ui/forms/ActionForm'
import { SelectField } from '@/app/_ui/forms/SelectField'
import { Submit } from '@/app/_ui/forms/Submit'
import { NumberField, TextAreaField, TextField } from '@/app/_ui/forms/TextField'
import { basisNames } from '@/lib/domain/datasheets/tension-by-basis'
import type { SpecificationBody } from '@/lib/domain/metrology/specification'
import { guardFactorOf } from '@/lib/domain/quality/tolerances'
import { noteName } from '@/lib/domain/strings/pitch'
import { fromSi, type UnitId } from '@/lib/domain/units/unit'
import { tensionBases } from '@/lib/input/catalogue'
import type { WorksFacts } from '@/lib/services/get-works'
import type { EquipmentList } from '@/lib/services/list-equipment'
import type { MaterialFacts } from '@/lib/services/list-materials'
import type { ProductWithRevisions } from '@/lib/services/list-products'
import { issueSpecificationAction } from '../actions'
import { entryOf } from './shown'

interface SpecificationFormProps {
  readonly product: ProductWithRevisions
  readonly works: WorksFacts
  readonly materials: readonly MaterialFacts[]
  readonly rigs: EquipmentList['rigs']
  /** Epoch milliseconds. */
  readonly today: number
}

const guardOptions = [
  { value: '1', label: 'by the expanded uncertainty' },
  { value: '0', label: 'none' },
]

/** Half-width of a tolerance relative to its target. */
const relative = ({ target, upper }: { target: number; upper: number }): number => upper / target - 1

/** Begins with the newest revision, so that a change is a change and not a rewriting. */
export function SpecificationForm({ product, works, materials, rigs, today }: SpecificationFormProps) {
  const [newest] = product.revisions
  const body: SpecificationBody | undefined = newest?.body
  const { units, numberFormat } = works
  const typed = (si: number | undefined, unit: UnitId, otherwise = '') =>
    si === undefined ? otherwise : entryOf(fromSi(si, unit), numberFormat)
  const plan = body?.plan
  const heads = plan ? plan.takenAt.filter((end) => end === 'head').length : 3
  const usedRigs = rigs.filter(({ active }) => active)
  return (
    <ActionForm action={issueSpecificationAction.bind(null, product.code)} label="Specification">
      <fieldset>
        <legend>String</legend>
        <div className="fields">
          <SelectField
            name="materialCode"
            label="Material"
            none="Choose"
            value={newest?.materialCode}
            options={materials.map(({ code, name }) => ({ value: code, label: name }))}
          />
          <SelectField
            name="coreShape"
            label="Core"
            hint="Bears the load of a wound string."
            none="none: a plain string"
            value={body?.core?.shape}
            options={[
              { value: 'round', label: 'round' },
              { value: 'hex', label: 'hexagonal' },
            ]}
            optional
          />
          <NumberField
            name="coreSize"
            label="Size of the core"
            hint="Its diameter, or across flats."
            unit="mm"
            value={typed(body?.core?.size, 'mm')}
            optional
          />
          <NumberField
            name="diameter"
            label="Diameter"
            unit={units.diameter}
            value={typed(body?.diameter.target, units.diameter)}
          />
          <NumberField
            name="diameterTolerance"
            label="Tolerance of the diameter ±"
            unit="µm"
            value={typed(body && body.diameter.upper - body.diameter.target, 'µm', '3')}
          />
          <NumberField
            name="ovalityMax"
            label="Ovality at most"
            unit="µm"
            value={typed(body?.ovalityMax, 'µm', '1.5')}
          />
          <NumberField
            name="massPerMetre"
            label="Mass per metre"
            hint="Left empty it follows from diameter and density; of a wound string it has to be given."
            unit="mg/m"
            value={typed(body?.core && body.massPerMetre.target, 'mg/m')}
            optional
          />
          <NumberField
            name="massTolerance"
            label="Tolerance of the mass ±"
            hint="The tolerance of the tension follows from it."
            unit="%"
            value={typed(body && relative(body.massPerMetre), '%', '2')}
          />
          <NumberField
            name="densityTolerance"
            label="Tolerance of the density ±"
            unit="%"
            value={typed(body && relative(body.effectiveDensity), '%', '1.5')}
          />
        </div>
      </fieldset>
      <fieldset>
        <legend>Tension</legend>
        <div className="fields">
          <TextField
            name="referenceNote"
            label="Reference note"
            hint="Such as E4, F#2, Bb2; middle C is C4."
            value={body ? noteName(body.reference.midi) : ''}
            maxLength={5}
          />
          <NumberField
            name="length"
            label="Reference length"
            unit="mm"
            value={typed(body?.reference.length, 'mm', '648')}
          />
          <NumberField
            name="a4"
            label="Concert A"
            unit="Hz"
            value={typed(body?.reference.a4 ?? works.a4, 'Hz')}
          />
          <SelectField
            name="basis"
            label="Basis"
            value={body?.basis ?? 'unloaded-mass'}
            options={tensionBases.map((basis) => ({ value: basis, label: basisNames[basis] }))}
          />
          <SelectField
            name="guardMass"
            label="Guard band of mass and tension"
            value={body ? String(guardFactorOf(body, 'massPerMetreWeighed')) : '1'}
            options={guardOptions}
          />
          <SelectField
            name="guardDiameter"
            label="Guard band of the diameter"
            value={body ? String(guardFactorOf(body, 'diameter')) : '0'}
            options={guardOptions}
          />
        </div>
      </fieldset>
      <fieldset>
        <legend>Inspection of a lot</legend>
        <div className="fields">
          <NumberField name="heads" label="Specimens from the head" value={String(heads)} />
          <NumberField
            name="tails"
            label="Specimens from the tail"
            value={String(plan ? plan.specimens - heads : 2)}
          />
          <NumberField name="positions" label="Places of the diameter" value={String(plan?.positions ?? 3)} />
          <SelectField
            name="directions"
            label="Directions at each place"
            value={String(plan?.directions ?? 2)}
            options={[
              { value: '2', label: 'two, at right angles' },
              { value: '1', label: 'one: ovality is not seen' },
            ]}
          />
          <NumberField
            name="cutLength"
            label="Cut length"
            unit="mm"
            value={typed(plan?.cutLength, 'mm', '500')}
          />
          <SelectField
            name="weighedState"
            label="Cut"
            value={plan?.weighedState ?? 'slack'}
            options={[
              { value: 'slack', label: 'slack (metal)' },
              { value: 'marked', label: 'marked under load (nylon, gut)' },
            ]}
          />
          <NumberField
            name="acceptanceConstant"
            label="Acceptance constant"
            hint="The mean has to stay this many standard deviations inside either limit."
            value={entryOf(plan?.acceptanceConstant ?? 1.5, numberFormat)}
          />
          <SelectField
            name="rigCode"
            label="Rig"
            value={plan?.rigCode ?? usedRigs[0]?.code}
            options={usedRigs.map(({ code, name }) => ({ value: code, label: `${code}, ${name}` }))}
          />
        </div>
      </fieldset>
      <fieldset>
        <legend>Issue</legend>
        <div className="fields">
          <TextField
            name="effectiveDay"
            label="In force from"
            type="date"
            value={dateFieldValue(today, works.timeZone)}
          />
          <TextAreaField name="note" label="What changed" optional maxLength={500} whole />
        </div>
      </fieldset>
      <div className="actions">
        <Submit>Issue revision {(newest?.number ?? 0) + 1}</Submit>
        <span className="small">It can’t be changed afterwards; a later revision takes its place.</span>
      </div>
    </ActionForm>
  )
}
