import { render, screen } from '@testing-library/react'
import { describe, expect, it } from 'vitest'
import { ClosureGate } from '@/app/_ui/charts/ClosureGate'
import { LotMarks } from '@/app/_ui/charts/LotMarks'
import { LotStrip } from '@/app/_ui/charts/LotStrip'
import { MiniStaff } from '@/app/_ui/charts/MiniStaff'
import { SectionDrawing } from '@/app/_ui/charts/SectionDrawing'
import { TensionCurves } from '@/app/_ui/charts/TensionCurves'
import { VerdictMark } from '@/app/_ui/charts/VerdictMark'

const picture = (name: string | RegExp) => screen.getByRole('img', { name })

describe('ClosureGate', () => {
  it('says each specimen’s two routes and what the marks mean', () => {
    const { container } = render(
      <ClosureGate
        unit="mg/m"
        decimals={1}
        specimens={[
          {
            label: '1',
            weighed: { value: 397.5 },
            sounded: { value: 397.9 },
            combined: 0.7,
            verdict: 'closed',
          },
        ]}
      />,
    )
    expect(
      picture(/1 specimen\. Specimen 1: weighed 397\.5 mg\/m, sounded 397\.9 mg\/m; closed\./),
    ).toBeDefined()
    expect(container.querySelector('figcaption')?.textContent).toContain(
      'Closed when the note stands inside the gate.',
    )
  })
})

describe('LotMarks', () => {
  it('says lots, mean and band', () => {
    render(
      <LotMarks unit="mg/m" decimals={1} values={[397, 398]} mean={397.5} band={{ from: 396, to: 399 }} />,
    )
    expect(picture('2 lots, mean 397.5 mg/m, from 396.0 to 399.0')).toBeDefined()
  })
})

describe('LotStrip', () => {
  it('says mean, uncertainty and tolerance', () => {
    render(
      <LotStrip
        label="Diameter"
        unit="µm"
        decimals={2}
        mean={254.1}
        expanded={0.5}
        specimens={[254]}
        lower={251}
        upper={257}
      />,
    )
    expect(picture('Diameter: mean 254.10 ± 0.50 µm, tolerance 251.00 to 257.00; 1 specimen')).toBeDefined()
  })
})

describe('MiniStaff', () => {
  it('says what it is of', () => {
    render(<MiniStaff title="Diameter" values={[1, 2, undefined]} centre={1} sigma={1} />)
    expect(picture('Diameter: 2 lots')).toBeDefined()
  })
})

describe('SectionDrawing', () => {
  it('says its places, and under it by how much departures are enlarged', () => {
    render(
      <SectionDrawing
        title="Specimen 1"
        unit="µm"
        decimals={1}
        nominal={254}
        places={[{ label: '1', a: 255, b: 254.4 }]}
      />,
    )
    expect(picture('Specimen 1: 255.0 by 254.4 µm at place 1')).toBeDefined()
    expect(screen.getByText(/departures × \d+\./)).toBeDefined()
  })
})

describe('TensionCurves', () => {
  it('says its lengths', () => {
    render(
      <TensionCurves
        unit="N"
        curves={[
          {
            label: '648 mm',
            points: [
              { semitone: 0, tension: 70 },
              { semitone: 1, tension: 78 },
            ],
          },
        ]}
        pitches={[]}
      />,
    )
    expect(picture('Tension in N against pitch for 648 mm')).toBeDefined()
  })
})

describe('VerdictMark', () => {
  it('is silent: the word stands beside it', () => {
    const { container } = render(<VerdictMark verdict="beyond" />)
    expect(screen.queryByRole('img')).toBeNull()
    expect(container.querySelector('svg')?.getAttribute('aria-hidden')).toBe('true')
    expect(container.querySelector('ellipse')?.getAttribute('fill')).toBe('var(--vermilion)')
  })

  it('takes another ink when told', () => {
    const { container } = render(<VerdictMark verdict="beyond" ink="slate" />)
    expect(container.querySelector('ellipse')?.getAttribute('fill')).toBe('var(--slate)')
  })
})
