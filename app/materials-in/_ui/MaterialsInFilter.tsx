import Link from 'next/link'
import { materialInKinds } from '@/lib/domain/record/material-in'
import type { ListMaterialsInInput } from '@/lib/input/material-in'
import { kindNames } from './paths'

interface Props {
  readonly asked: ListMaterialsInInput
  readonly filtered: boolean
}

export function MaterialsInFilter({ asked, filtered }: Props) {
  return (
    <search>
      <form method="get" className="materials-in-filter">
        <div className="field">
          <label htmlFor="materials-in-search">Search</label>
          <input
            id="materials-in-search"
            name="search"
            type="search"
            className="input"
            defaultValue={asked.search}
            placeholder="Code, name, heat, supplier"
            maxLength={80}
          />
        </div>
        <div className="field">
          <label htmlFor="materials-in-kind">Kind</label>
          <select id="materials-in-kind" name="kind" className="input" defaultValue={asked.kind ?? ''}>
            <option value="">any</option>
            {materialInKinds.map((kind) => (
              <option key={kind} value={kind}>
                {kindNames[kind]}
              </option>
            ))}
          </select>
        </div>
        <div className="field">
          <label htmlFor="materials-in-use">In use</label>
          <select id="materials-in-use" name="inUse" className="input" defaultValue={asked.inUse ?? ''}>
            <option value="">in use or put away</option>
            <option value="yes">in use</option>
            <option value="no">put away</option>
          </select>
        </div>
        <button type="submit" className="button">
          Show
        </button>
        {filtered ? (
          <Link className="button quiet" href="/materials-in">
            Show all
          </Link>
        ) : null}
      </form>
    </search>
  )
}
