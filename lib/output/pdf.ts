import type { TDocumentDefinitions } from 'pdfmake/interfaces'
import { fontFiles } from './fonts'

interface PdfMaker {
  setFonts(fonts: Readonly<Record<string, Readonly<Record<string, string>>>>): void
  setUrlAccessPolicy(policy: (url: string) => boolean): void
  setLocalAccessPolicy?(policy: (path: string) => boolean): void
  createPdf(document: TDocumentDefinitions): { getBuffer(): Promise<Buffer> }
}

let maker: PdfMaker | undefined

const faces = () => ({
  sans: {
    normal: fontFiles.sans(),
    bold: fontFiles.sansStrong(),
    italics: fontFiles.sansItalic(),
    bolditalics: fontFiles.sansStrongItalic(),
  },
  serif: {
    normal: fontFiles.serif(),
    bold: fontFiles.serifStrong(),
    italics: fontFiles.serifItalic(),
    bolditalics: fontFiles.serifStrongItalic(),
  },
  // Sharps, flats and what else the works' faces lack.
  signs: { normal: fontFiles.accidentals(), bold: fontFiles.accidentals() },
})

/** The maker of documents, with the works' faces and no door to the network. */
const pdfMaker = async (): Promise<PdfMaker> => {
  if (maker) return maker
  const loaded = (await import('pdfmake')) as unknown as { readonly default?: PdfMaker }
  const made = loaded.default ?? (loaded as unknown as PdfMaker)
  const fonts = faces()
  const files = new Set(Object.values(fonts).flatMap((face) => Object.values(face)))
  made.setFonts(fonts)
  made.setUrlAccessPolicy(() => false)
  made.setLocalAccessPolicy?.((path) => files.has(path))
  maker = made
  return made
}

/**
 * A document as PDF bytes, its fonts embedded. The same definition, its `info.creationDate` included, gives the same
 * bytes.
 */
export const pdfBytes = async (document: TDocumentDefinitions): Promise<Uint8Array> =>
  (await pdfMaker()).createPdf(document).getBuffer()

/** A text in runs: sharps and flats in the face that has them. */
export const withSigns = (text: string): { text: string; font?: string }[] =>
  text
    .split(/([♯♭]+)/u)
    .filter((part) => part !== '')
    .map((part) => (/[♯♭]/u.test(part) ? { text: part, font: 'signs' } : { text: part }))
