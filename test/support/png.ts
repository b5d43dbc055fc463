import { inflateSync } from 'node:zlib'

export interface Picture {
  readonly width: number
  readonly height: number
  /** Red, green, blue and opacity of one pixel, each 0 to 255. */
  readonly at: (x: number, y: number) => readonly [number, number, number, number]
}

/** Paeth predictor of the PNG specification (ISO/IEC 15948, 9.4). */
function paeth(left: number, up: number, corner: number): number {
  const guess = left + up - corner
  const [a, b, c] = [Math.abs(guess - left), Math.abs(guess - up), Math.abs(guess - corner)]
  return a <= b && a <= c ? left : b <= c ? up : corner
}

/** Reads an RGBA picture of eight bits a channel (ISO/IEC 15948), the only kind that is written here. */
export function readPng(bytes: Uint8Array): Picture {
  const view = new DataView(bytes.buffer, bytes.byteOffset, bytes.byteLength)
  if (view.getUint32(0) !== 0x89504e47 || view.getUint32(4) !== 0x0d0a1a0a)
    throw new Error('no PNG signature')
  const parts: Uint8Array[] = []
  let [width, height] = [0, 0]
  for (let at = 8; at + 8 <= bytes.length; ) {
    const length = view.getUint32(at)
    const kind = String.fromCharCode(...bytes.subarray(at + 4, at + 8))
    if (kind === 'IHDR') {
      width = view.getUint32(at + 8)
      height = view.getUint32(at + 12)
      const [depth, colour, , , interlace] = bytes.subarray(at + 16, at + 21)
      if (depth !== 8 || colour !== 6 || interlace !== 0) throw new Error('not plain RGBA of eight bits')
    }
    if (kind === 'IDAT') parts.push(bytes.subarray(at + 8, at + 8 + length))
    at += 12 + length
  }
  const raw = inflateSync(Buffer.concat(parts))
  const stride = width * 4
  const pixels = new Uint8Array(stride * height)
  for (let y = 0; y < height; y += 1) {
    const filter = raw[y * (stride + 1)]
    for (let x = 0; x < stride; x += 1) {
      const left = x >= 4 ? (pixels[y * stride + x - 4] ?? 0) : 0
      const up = y > 0 ? (pixels[(y - 1) * stride + x] ?? 0) : 0
      const corner = x >= 4 && y > 0 ? (pixels[(y - 1) * stride + x - 4] ?? 0) : 0
      const guess = [0, left, up, (left + up) >> 1, paeth(left, up, corner)][filter ?? 0] ?? 0
      pixels[y * stride + x] = ((raw[y * (stride + 1) + 1 + x] ?? 0) + guess) & 0xff
    }
  }
  return {
    width,
    height,
    at: (x, y) => {
      const from = Math.round(y) * stride + Math.round(x) * 4
      const [r = 0, g = 0, b = 0, a = 0] = pixels.subarray(from, from + 4)
      return [r, g, b, a]
    },
  }
}
