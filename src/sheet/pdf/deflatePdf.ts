/**
 * Compresses the streams of a plain PDF with the browser's own deflate, off the main thread: the PDF
 * writer's would hold the page for the whole file at once. Reads the file by its cross-reference table.
 */

const decoder = new TextDecoder('latin1');
const latin1 = (text: string): Uint8Array<ArrayBuffer> =>
  Uint8Array.from(text, (letter) => letter.charCodeAt(0));

/** Dictionaries stand within this many bytes of an object's beginning. */
const HEAD_BYTES = 600;

async function deflate(bytes: Uint8Array<ArrayBuffer>): Promise<Uint8Array<ArrayBuffer>> {
  const stream = new Blob([bytes]).stream().pipeThrough(new CompressionStream('deflate'));
  return new Uint8Array(await new Response(stream).arrayBuffer());
}

interface Table {
  /** Byte offset by object number; 0 for a free one. */
  offsets: number[];
  /** Where the table begins. */
  start: number;
  trailer: string;
}

function readTable(pdf: Uint8Array<ArrayBuffer>): Table {
  const tail = decoder.decode(pdf.subarray(Math.max(0, pdf.length - 64)));
  const start = Number(/startxref\s+(\d+)\s+%%EOF\s*$/.exec(tail)?.[1]);
  if (!Number.isInteger(start) || start >= pdf.length)
    throw new RangeError('the PDF has no cross-reference table');
  const text = decoder.decode(pdf.subarray(start));
  const rows = [...text.matchAll(/^(\d{10}) \d{5} ([nf]) ?$/gm)];
  const offsets = rows.map(([, offset, use]) => (use === 'n' ? Number(offset) : 0));
  const trailer = /trailer\s+(<<[\s\S]*>>)\s+startxref/.exec(text)?.[1];
  if (offsets.length === 0 || trailer === undefined) throw new RangeError('the PDF has no trailer');
  return { offsets, start, trailer };
}

/** One object, its stream compressed where that is plain and becomes smaller. */
async function smaller(object: Uint8Array<ArrayBuffer>): Promise<Uint8Array<ArrayBuffer>[]> {
  const head = decoder.decode(object.subarray(0, HEAD_BYTES));
  const match = /^[\s\S]*?>>\r?\nstream\r?\n/.exec(head);
  const length = match && /\/Length (\d+)/.exec(match[0]);
  if (!match || !length || match[0].includes('/Filter')) return [object];
  const from = match[0].length;
  const plain = object.subarray(from, from + Number(length[1]));
  const packed = await deflate(plain);
  if (packed.length >= plain.length) return [object];
  const dictionary = match[0].replace(length[0], `/Length ${packed.length}\n/Filter /FlateDecode`);
  return [latin1(dictionary), packed, object.subarray(from + plain.length)];
}

/** The same PDF with its streams compressed. Throws RangeError for bytes that are no plain PDF. */
export async function deflatePdf(
  pdf: Uint8Array<ArrayBuffer>,
  between: () => Promise<void>,
): Promise<Uint8Array<ArrayBuffer>[]> {
  const { offsets, start, trailer } = readTable(pdf);
  const used = offsets.flatMap((offset, number) => (offset > 0 ? [{ offset, number }] : []));
  used.sort((a, b) => a.offset - b.offset);
  const parts: Uint8Array<ArrayBuffer>[] = [pdf.subarray(0, used[0]?.offset ?? start)];
  let at = parts[0]?.length ?? 0;
  const moved = offsets.map(() => 0);
  for (const [index, { offset, number }] of used.entries()) {
    moved[number] = at;
    const object = await smaller(pdf.subarray(offset, used[index + 1]?.offset ?? start));
    parts.push(...object);
    at += object.reduce((sum, part) => sum + part.length, 0);
    await between();
  }
  const rows = moved.map((offset) =>
    offset === 0 ? '0000000000 65535 f ' : `${String(offset).padStart(10, '0')} 00000 n `,
  );
  const table = ['xref', `0 ${rows.length}`, ...rows, 'trailer', trailer, 'startxref', String(at), '%%EOF'];
  parts.push(latin1(table.join('\n')));
  return parts;
}
