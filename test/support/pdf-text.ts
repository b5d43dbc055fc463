import { getDocument } from 'pdfjs-dist/legacy/build/pdf.mjs'

/** The text of a PDF as a reader copies it: one line a text line of each page, cells apart by spaces. */
export async function pdfText(bytes: Uint8Array): Promise<string> {
  const document = await getDocument({ data: Uint8Array.from(bytes), useSystemFonts: false, verbosity: 0 })
    .promise
  const pages: string[] = []
  for (let number = 1; number <= document.numPages; number += 1) {
    const { items } = await (await document.getPage(number)).getTextContent()
    const lines = new Map<number, { readonly x: number; readonly text: string }[]>()
    for (const item of items) {
      if (!('str' in item) || item.str.trim() === '') continue
      const [x = 0, y = 0] = item.transform.slice(4)
      const line = Math.round(y)
      const near = [line, line - 1, line + 1].find((one) => lines.has(one)) ?? line
      lines.set(near, [...(lines.get(near) ?? []), { x, text: item.str }])
    }
    pages.push(
      [...lines.entries()]
        .sort(([a], [b]) => b - a)
        .map(([, parts]) =>
          parts
            .sort((a, b) => a.x - b.x)
            .map(({ text }) => text)
            .join(' '),
        )
        .join('\n'),
    )
  }
  await document.destroy()
  return pages.join('\n')
}
