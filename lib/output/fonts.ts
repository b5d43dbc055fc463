import { join } from 'node:path'

/**
 * Fonts are read from the installed packages below the folder that the server runs in: a path asked of the module
 * system would be turned into a name inside the bundle.
 */
const folderOf = (name: string): string =>
  join(/* turbopackIgnore: true */ process.cwd(), 'node_modules/@expo-google-fonts', name)

const face = (name: string, folder: string, file: string): string =>
  join(folderOf(name), folder, `${file}.ttf`)

/** Font files of everything that leaves the works as PDF or picture: whole faces with ≤ √ σ, and ♯ ♭ from the last. */
export const fontFiles = {
  sans: () => face('ibm-plex-sans', '400Regular', 'IBMPlexSans_400Regular'),
  sansItalic: () => face('ibm-plex-sans', '400Regular_Italic', 'IBMPlexSans_400Regular_Italic'),
  sansMedium: () => face('ibm-plex-sans', '500Medium', 'IBMPlexSans_500Medium'),
  sansStrong: () => face('ibm-plex-sans', '600SemiBold', 'IBMPlexSans_600SemiBold'),
  sansStrongItalic: () => face('ibm-plex-sans', '600SemiBold_Italic', 'IBMPlexSans_600SemiBold_Italic'),
  serif: () => face('source-serif-4', '400Regular', 'SourceSerif4_400Regular'),
  serifItalic: () => face('source-serif-4', '400Regular_Italic', 'SourceSerif4_400Regular_Italic'),
  serifStrong: () => face('source-serif-4', '600SemiBold', 'SourceSerif4_600SemiBold'),
  serifStrongItalic: () => face('source-serif-4', '600SemiBold_Italic', 'SourceSerif4_600SemiBold_Italic'),
  accidentals: () => face('noto-sans-math', '400Regular', 'NotoSansMath_400Regular'),
} as const
