import type { jsPDF } from 'jspdf';
import type { Face } from '../pages/measure.ts';

/** Where each face is registered in the PDF: family, style, weight. */
export const PDF_FONT: Record<Face, { family: string; style: string; weight: number }> = {
  'varwright-sans-regular': { family: 'Varwright Sans', style: 'normal', weight: 400 },
  'varwright-sans-semibold': { family: 'Varwright Sans', style: 'normal', weight: 600 },
  'varwright-marks': { family: 'Varwright Marks', style: 'normal', weight: 400 },
};

/** The font files by face, in base 64 as the PDF writer takes them. */
export type FontFiles = Record<Face, string>;

const FACES = Object.keys(PDF_FONT) as Face[];

function base64(bytes: Uint8Array): string {
  let binary = '';
  for (let at = 0; at < bytes.length; at += 0x8000) {
    binary += String.fromCharCode(...bytes.subarray(at, at + 0x8000));
  }
  return btoa(binary);
}

let loading: Promise<FontFiles> | undefined;

async function fetchFonts(folder: string): Promise<FontFiles> {
  const entries = await Promise.all(
    FACES.map(async (face) => {
      const response = await fetch(`${folder}${face}.ttf`);
      if (!response.ok) throw new Error(`the font ${face} could not be loaded (${response.status})`);
      return [face, base64(new Uint8Array(await response.arrayBuffer()))] as const;
    }),
  );
  return Object.fromEntries(entries) as FontFiles;
}

/** Loads the fonts once; a failed load is tried again next time. */
export function loadFontFiles(folder = `${import.meta.env.BASE_URL}fonts/`): Promise<FontFiles> {
  loading ??= fetchFonts(folder).catch((error: unknown) => {
    loading = undefined;
    throw error;
  });
  return loading;
}

/** Makes the fonts known to a PDF; only glyphs that are used end up in the file. */
export function addFonts(pdf: jsPDF, files: FontFiles): void {
  for (const face of FACES) {
    const { family, style, weight } = PDF_FONT[face];
    pdf.addFileToVFS(`${face}.ttf`, files[face]);
    pdf.addFont(`${face}.ttf`, family, style, weight);
  }
}
