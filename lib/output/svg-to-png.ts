import { Resvg } from '@resvg/resvg-js'
import { fontFiles } from './fonts'

/** Pixels that one picture may have: a chart of a sheet of paper at 600 dpi, and no more memory than that. */
const MOST_PIXELS = 40_000_000

/**
 * A drawing's SVG text as a PNG, `scale` pixels to a px (2 for screens and print). Only the works' own faces are
 * used, so that every machine makes the same picture. Throws when the picture would be unreasonably large.
 */
export function svgToPng(svg: string, scale = 2): Uint8Array {
  const picture = new Resvg(svg, {
    fitTo: { mode: 'zoom', value: scale },
    font: {
      loadSystemFonts: false,
      fontFiles: [
        fontFiles.sans(),
        fontFiles.sansMedium(),
        fontFiles.sansStrong(),
        fontFiles.serif(),
        fontFiles.serifItalic(),
        fontFiles.serifStrong(),
        fontFiles.accidentals(),
      ],
      defaultFontFamily: 'IBM Plex Sans',
      sansSerifFamily: 'IBM Plex Sans',
      serifFamily: 'Source Serif 4',
    },
  })
  if (picture.width * picture.height * scale * scale > MOST_PIXELS)
    throw new RangeError(
      `a picture of ${picture.width} × ${picture.height} px at scale ${scale} is too large`,
    )
  return picture.render().asPng()
}
