import { getDocument } from 'pdfjs-dist/legacy/build/pdf.mjs';

export interface PdfText {
  text: string;
  /** Points from the page's lower left corner, at the start of the baseline. */
  x: number;
  y: number;
  width: number;
  height: number;
}

export interface PdfPage {
  width: number;
  height: number;
  texts: PdfText[];
  /** All texts in the order in which they are painted, runs of spaces as one. */
  words: string;
}

export interface PdfFacts {
  pages: PdfPage[];
  title: string;
  author: string;
  language: string;
  createdAt: string;
  outline: string[];
}

/** Reads a PDF as a reader program does, independently of the library that wrote it. */
export async function readPdf(bytes: Uint8Array): Promise<PdfFacts> {
  const task = getDocument({
    // The reader takes the memory over: it gets a copy.
    data: new Uint8Array(bytes),
    standardFontDataUrl: new URL('standard_fonts/', import.meta.resolve('pdfjs-dist/package.json'))
      .pathname,
    verbosity: 0,
  });
  const document = await task.promise;
  const pages: PdfPage[] = [];
  for (let number = 1; number <= document.numPages; number += 1) {
    const page = await document.getPage(number);
    const [left = 0, bottom = 0, right = 0, top = 0] = page.view;
    const content = await page.getTextContent();
    const texts = content.items.flatMap((item): PdfText[] => {
      if (!('str' in item) || item.str.trim() === '') return [];
      const [, , , , x, y] = item.transform.map(Number);
      return [{ text: item.str, x: x ?? NaN, y: y ?? NaN, width: item.width, height: item.height }];
    });
    pages.push({
      width: right - left,
      height: top - bottom,
      texts,
      words: texts
        .map(({ text }) => text)
        .join(' ')
        .replace(/\s+/g, ' '),
    });
  }
  const { info } = await document.getMetadata();
  const facts = new Map(Object.entries(info));
  const outline = await document.getOutline();
  const result = {
    pages,
    title: String(facts.get('Title')),
    author: String(facts.get('Author')),
    language: String(facts.get('Language')),
    createdAt: String(facts.get('CreationDate')),
    outline: outline.map(({ title }: { title: string }) => title),
  };
  await task.destroy();
  return result;
}
