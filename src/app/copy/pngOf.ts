import { type Picture, standaloneSvg } from './standaloneSvg.ts';

const FACES = [
  { family: 'Varwright Sans', weight: 400, file: 'varwright-sans-regular.woff2' },
  { family: 'Varwright Sans', weight: 600, file: 'varwright-sans-semibold.woff2' },
  { family: 'Varwright Marks', weight: 400, file: 'varwright-marks.woff2' },
];

/** Dots for one unit of the figure: sharp in a report at its printed size. */
const SCALE = 3;
/** Beyond this side a browser may refuse the canvas. */
const LARGEST = 12_000;

let faces: Promise<string> | null = null;

/** A picture drawn from SVG sees no font of the page, so its faces travel inside it. */
function embeddedFaces(): Promise<string> {
  faces ??= Promise.all(
    FACES.map(async ({ family, weight, file }) => {
      const bytes = new Uint8Array(await (await fetch(`/fonts/${file}`)).arrayBuffer());
      const text = Array.from(bytes, (byte) => String.fromCharCode(byte)).join('');
      return `@font-face{font-family:"${family}";font-weight:${weight};src:url(data:font/woff2;base64,${btoa(text)})}`;
    }),
  ).then((rules) => rules.join(''));
  return faces;
}

/** The figure as a PNG three dots to the unit, fewer where it would become too large. */
export async function pngOf(picture: Picture): Promise<Blob> {
  const text = standaloneSvg(picture, await embeddedFaces());
  const url = URL.createObjectURL(new Blob([text], { type: 'image/svg+xml' }));
  try {
    const image = new Image();
    image.src = url;
    await image.decode();
    const scale = Math.min(SCALE, LARGEST / Math.max(picture.width, picture.height));
    const canvas = document.createElement('canvas');
    canvas.width = Math.round(picture.width * scale);
    canvas.height = Math.round(picture.height * scale);
    canvas.getContext('2d')?.drawImage(image, 0, 0, canvas.width, canvas.height);
    return await new Promise((resolve, reject) =>
      canvas.toBlob(
        (blob) => (blob ? resolve(blob) : reject(new Error('the picture is too large'))),
        'image/png',
      ),
    );
  } finally {
    URL.revokeObjectURL(url);
  }
}
