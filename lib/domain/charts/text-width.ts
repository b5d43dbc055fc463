/**
 * Advance widths in hundredths of the size, characters 32 to 126, read from the faces themselves (IBM Plex Sans
 * 400 and 600, Source Serif 4 italic 400). Labels must not collide, and nothing here can measure a page.
 */
const advances = {
  sans: '24 28 42 71 60 93 69 24 34 34 45 60 27 40 27 38 60 60 60 60 60 60 60 60 60 60 29 29 60 60 60 48 89 64 65 62 67 58 56 70 71 40 51 63 50 81 71 71 61 71 64 58 57 68 61 89 61 59 58 32 38 32 60 57 60 53 58 50 58 55 32 53 57 25 25 53 27 87 57 56 58 58 37 49 35 57 49 77 51 50 46 34 31 34 60',
  strong:
    '24 31 47 66 60 96 71 26 34 34 56 60 30 40 30 44 60 60 60 60 60 60 60 60 60 60 32 32 60 60 60 49 90 67 66 64 69 60 58 71 72 42 55 68 52 82 72 71 64 71 66 61 58 69 64 95 66 63 60 33 44 33 60 56 60 56 60 51 60 56 35 55 59 28 28 56 29 89 59 56 60 60 39 50 37 59 52 82 54 52 50 36 38 36 60',
  italic:
    '23 31 46 57 52 93 70 26 39 39 48 53 30 31 30 34 54 54 54 54 54 54 54 54 54 54 30 30 53 53 53 46 88 68 62 61 70 60 57 67 77 37 36 69 58 94 75 67 57 67 65 51 59 73 65 92 67 59 56 35 33 35 53 51 40 55 52 43 56 44 33 51 58 32 28 50 30 87 60 53 54 52 43 38 35 60 51 78 56 52 49 39 29 39 53',
} as const

export type Face = keyof typeof advances

const tables: Record<Face, readonly number[]> = {
  sans: advances.sans.split(' ').map(Number),
  strong: advances.strong.split(' ').map(Number),
  italic: advances.italic.split(' ').map(Number),
}

/** Any other letter or sign counts as a figure does. */
const OTHER = 60

/** Width of a line of text in px. */
export function textWidth(text: string, size: number, face: Face = 'sans'): number {
  let hundredths = 0
  for (const character of text) hundredths += tables[face][(character.codePointAt(0) ?? 0) - 32] ?? OTHER
  return (hundredths * size) / 100
}

/** Breaks words into lines of at most `width` px; a word that is wider stands on its own line. */
export function wrapWords(text: string, width: number, size: number, face: Face = 'sans'): string[] {
  const kept: string[] = []
  for (const word of text.split(' ')) {
    const last = kept.at(-1)
    if (last !== undefined && textWidth(`${last} ${word}`, size, face) <= width)
      kept[kept.length - 1] = `${last} ${word}`
    else kept.push(word)
  }
  return kept
}
