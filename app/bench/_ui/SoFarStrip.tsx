import type { SoFar } from './bench-lot'

const [WIDTH, LEFT, RIGHT] = [88, 8, 80]

/** The readings of a row as notes on a short rule: its ends are the tolerance. */
export function SoFarStrip({ soFar }: { readonly soFar: SoFar | undefined }) {
  if (!soFar) return null
  const outside = soFar.shares.filter((share) => share < 0 || share > 1).length
  const label = `${soFar.shares.length} ${soFar.shares.length === 1 ? 'reading' : 'readings'}, ${outside} outside`
  return (
    <svg className="bench-strip" width={WIDTH} height={16} role="img" aria-label={label}>
      <path d={`M${LEFT} 8H${RIGHT}M${LEFT} 3v10M${RIGHT} 3v10`} stroke="var(--staff)" fill="none" />
      {soFar.shares.map((share, index) => {
        const x = LEFT + Math.min(1.08, Math.max(-0.08, share)) * (RIGHT - LEFT)
        const beyond = share < 0 || share > 1
        return (
          <ellipse
            // biome-ignore lint/suspicious/noArrayIndexKey: readings keep their order, and equal ones are alike
            key={index}
            cx={x}
            cy={8}
            rx={3.6}
            ry={2.6}
            transform={`rotate(-20 ${x} 8)`}
            fill={beyond ? 'var(--vermilion)' : 'var(--ink)'}
            fillOpacity={0.8}
          />
        )
      })}
    </svg>
  )
}
