import { kilogramsPerCubicMetre, pascals, perKelvin } from '../units/quantity'
import type { MaterialBody, Ranged } from './material'
import { pascalsFromKsi } from './strength'

/** How well a value stands: read on a public page, or only remembered from the source that is named. */
export type Standing = 'public page' | 'from memory'

export interface HandbookMaterial {
  readonly code: string
  readonly name: string
  readonly body: MaterialBody
  readonly standing: Standing
  readonly source: string
}

const density = (value: number, low: number, high: number): MaterialBody['density'] => ({
  value: kilogramsPerCubicMetre(value),
  low: kilogramsPerCubicMetre(low),
  high: kilogramsPerCubicMetre(high),
})

const modulus = (value: number, low: number, high: number): MaterialBody['youngsModulus'] => ({
  value: pascals(value * 1e9),
  low: pascals(low * 1e9),
  high: pascals(high * 1e9),
})

const expansion = (value: number, low: number, high: number): Ranged<ReturnType<typeof perKelvin>> => ({
  value: perKelvin(value * 1e-6),
  low: perKelvin(low * 1e-6),
  high: perKelvin(high * 1e-6),
})

const strength = (low: number, high: number): MaterialBody['tensileStrength'] => ({
  low: pascals(low * 1e6),
  high: pascals(high * 1e6),
})

const INCH = 0.0254

/** Music wire by diameter: inches, minimum and maximum in thousands of pounds-force per square inch. */
const musicWire = [
  [0.008, 399, 441],
  [0.009, 393, 434],
  [0.01, 387, 428],
  [0.011, 382, 422],
  [0.012, 377, 417],
  [0.013, 373, 412],
  [0.014, 369, 408],
  [0.016, 362, 400],
  [0.018, 356, 393],
  [0.02, 350, 387],
  [0.022, 345, 382],
  [0.024, 341, 377],
  [0.026, 337, 373],
] as const

const metal = (
  code: string,
  name: string,
  body: Omit<MaterialBody, 'kind' | 'poisson'> & { readonly poisson?: number },
  standing: Standing,
  source: string,
): HandbookMaterial => ({ code, name, standing, source, body: { kind: 'metal', poisson: 0.3, ...body } })

/**
 * Materials of string makers as handbooks give them: a value with the range met in practice, never a single
 * true one. A works adds its own, measured ones beside them. Densities kg/m³, moduli Pa, expansions 1/K,
 * strengths Pa.
 */
export const handbookMaterials: readonly HandbookMaterial[] = [
  metal(
    'MUSIC-WIRE',
    'Music wire',
    {
      density: density(7850, 7830, 7870),
      youngsModulus: modulus(206, 190, 210),
      poisson: 0.29,
      thermalExpansion: expansion(11.5, 10.8, 12),
      strengthByDiameter: musicWire.map(([inches, low, high]) => ({
        diameter: inches * INCH,
        low: pascalsFromKsi(low),
        high: pascalsFromKsi(high),
      })),
    },
    'public page',
    'Strength by diameter: ASTM A228/A228M, as one public page reproduces it. Density and modulus: EN 10270-1. Expansion from memory.',
  ),
  metal(
    'STAINLESS-302',
    'Stainless steel 302/304',
    {
      density: density(7900, 7860, 8000),
      youngsModulus: modulus(185, 180, 200),
      thermalExpansion: expansion(16.5, 16, 17.5),
      tensileStrength: strength(1900, 2250),
    },
    'from memory',
    'EN 10270-3 (1.4310), strength at 0.2 to 0.3 mm.',
  ),
  metal(
    'STAINLESS-430',
    'Stainless steel 430, wrap',
    {
      density: density(7730, 7700, 7750),
      youngsModulus: modulus(200, 195, 205),
      thermalExpansion: expansion(10.4, 10, 11),
      tensileStrength: strength(450, 900),
    },
    'from memory',
    'Handbook values.',
  ),
  metal(
    'NICKEL-200',
    'Nickel 200',
    {
      density: density(8890, 8890, 8908),
      youngsModulus: modulus(204, 200, 207),
      thermalExpansion: expansion(13.3, 13, 13.5),
      tensileStrength: strength(380, 900),
    },
    'from memory',
    'CRC Handbook; ASM Handbook.',
  ),
  metal(
    'NICKEL-PLATED',
    'Nickel-plated steel, wrap',
    {
      density: density(7930, 7850, 7950),
      youngsModulus: modulus(200, 195, 205),
      thermalExpansion: expansion(12, 11.5, 12.5),
      tensileStrength: strength(400, 1000),
    },
    'from memory',
    'Density by the mixture rule for 8 % nickel by mass.',
  ),
  metal(
    'PHOSPHOR-BRONZE-5',
    'Phosphor bronze C51000, 5 % tin',
    {
      density: density(8860, 8840, 8880),
      youngsModulus: modulus(110, 105, 115),
      thermalExpansion: expansion(17.8, 17.5, 18),
      tensileStrength: strength(560, 740),
    },
    'public page',
    'Copper alloy data sheet C51000, hard to spring temper.',
  ),
  metal(
    'PHOSPHOR-BRONZE-8',
    'Phosphor bronze C52100, 8 % tin',
    {
      density: density(8790, 8780, 8800),
      youngsModulus: modulus(110, 105, 115),
      thermalExpansion: expansion(18.2, 18, 18.5),
      tensileStrength: strength(640, 900),
    },
    'from memory',
    'Copper alloy data C52100.',
  ),
  metal(
    'BRASS-80-20',
    'Brass 80/20 C24000',
    {
      density: density(8670, 8650, 8690),
      youngsModulus: modulus(110, 105, 115),
      thermalExpansion: expansion(19.1, 18.8, 19.5),
      tensileStrength: strength(400, 850),
    },
    'from memory',
    'Copper alloy data C24000. The trade calls it 80/20 bronze; it holds zinc and no tin.',
  ),
  metal(
    'BRASS-85-15',
    'Brass 85/15 C23000',
    {
      density: density(8750, 8730, 8770),
      youngsModulus: modulus(110, 105, 115),
      thermalExpansion: expansion(19, 18.7, 19.3),
      tensileStrength: strength(280, 590),
    },
    'from memory',
    'Copper alloy data C23000: modulus, expansion and strength on a public page, density from memory.',
  ),
  metal(
    'BRASS-70-30',
    'Brass 70/30 C26000',
    {
      density: density(8530, 8510, 8550),
      youngsModulus: modulus(110, 105, 115),
      thermalExpansion: expansion(19.9, 19.6, 20.2),
      tensileStrength: strength(500, 900),
    },
    'from memory',
    'Copper alloy data C26000.',
  ),
  metal(
    'COPPER',
    'Copper',
    {
      density: density(8950, 8930, 8960),
      youngsModulus: modulus(120, 110, 130),
      thermalExpansion: expansion(16.8, 16.5, 17),
      tensileStrength: strength(250, 450),
    },
    'from memory',
    'Handbook values.',
  ),
  metal(
    'SILVER',
    'Silver',
    {
      density: density(10490, 10470, 10500),
      youngsModulus: modulus(80, 76, 83),
      thermalExpansion: expansion(18.9, 18, 19.5),
      tensileStrength: strength(170, 350),
    },
    'from memory',
    'Handbook values.',
  ),
  metal(
    'TUNGSTEN',
    'Tungsten',
    {
      density: density(19280, 19250, 19300),
      youngsModulus: modulus(405, 400, 411),
      poisson: 0.28,
      thermalExpansion: expansion(4.5, 4.3, 4.6),
      tensileStrength: strength(2000, 3500),
    },
    'from memory',
    'Handbook values, fine wire.',
  ),
  {
    code: 'NYLON-6',
    name: 'Nylon 6 and 6.6',
    standing: 'from memory',
    source:
      'Handbook values, drawn; the modulus of a stressed string is higher, its trend is on a public page.',
    body: {
      kind: 'polymer',
      density: density(1140, 1130, 1150),
      youngsModulus: modulus(4, 2, 8),
      poisson: 0.4,
      tensileStrength: strength(300, 600),
    },
  },
  {
    code: 'NYLON-610',
    name: 'Nylon 6.10 and 6.12',
    standing: 'from memory',
    source: 'Handbook values, drawn.',
    body: {
      kind: 'polymer',
      density: density(1075, 1060, 1090),
      youngsModulus: modulus(4, 2, 8),
      poisson: 0.4,
      tensileStrength: strength(300, 500),
    },
  },
  {
    code: 'PVDF',
    name: 'Fluoropolymer PVDF',
    standing: 'from memory',
    source: 'Handbook values: 2 to 3 GPa in bulk, 3 to 8 drawn. Other fluoropolymers differ; density tells.',
    body: {
      kind: 'polymer',
      density: density(1775, 1750, 1800),
      youngsModulus: modulus(5, 3, 8),
      poisson: 0.35,
      tensileStrength: strength(300, 700),
    },
  },
  {
    code: 'GUT',
    name: 'Gut',
    standing: 'from memory',
    source: 'Ranges only: density follows humidity, strength falls with the angle of twist.',
    body: {
      kind: 'gut',
      density: density(1320, 1280, 1360),
      youngsModulus: modulus(5.5, 4, 7),
      poisson: 0.4,
      tensileStrength: strength(250, 450),
    },
  },
]
