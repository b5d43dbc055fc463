type Line = readonly [number, number, number, number]

/**
 * Lines that hatch a rectangle at 45°, rising to the right, `step` px apart (measured across the lines): real
 * lines and no pattern, because patterns need ids and not every printer keeps them. `falling` mirrors them.
 */
export function hatchRect(x: number, y: number, w: number, h: number, step: number, falling = false): Line[] {
  if (!(w > 0) || !(h > 0)) return []
  const pitch = step * Math.SQRT2
  const found: Line[] = []
  for (let c = pitch / 2; c < w + h; c += pitch) {
    // From the left or bottom edge up to the top or right edge.
    const startX = Math.max(0, c - h)
    const startY = Math.min(h, c)
    const endX = Math.min(w, c)
    const endY = Math.max(0, c - w)
    const [y1, y2] = falling ? [h - startY, h - endY] : [startY, endY]
    found.push([x + startX, y + y1, x + endX, y + y2])
  }
  return found
}

/** Lines that hatch a disc at 45°, `step` px apart. */
export function hatchDisc(cx: number, cy: number, radius: number, step: number): Line[] {
  const found: Line[] = []
  for (let offset = -radius + step / 2; offset < radius; offset += step) {
    const half = Math.sqrt(Math.max(0, radius * radius - offset * offset))
    const [nx, ny] = [offset * Math.SQRT1_2, offset * Math.SQRT1_2]
    const along = half * Math.SQRT1_2
    found.push([cx + nx - along, cy + ny + along, cx + nx + along, cy + ny - along])
  }
  return found
}
