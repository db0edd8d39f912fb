/** The few corners of the sfnt container that making our subsets needs: tables, names, advance widths. */

interface TableEntry {
  tag: string;
  data: Buffer;
}

export function readTables(font: Buffer): TableEntry[] {
  const count = font.readUInt16BE(4);
  return Array.from({ length: count }, (_, index) => {
    const at = 12 + 16 * index;
    const offset = font.readUInt32BE(at + 8);
    return {
      tag: font.toString('latin1', at, at + 4),
      data: font.subarray(offset, offset + font.readUInt32BE(at + 12)),
    };
  });
}

function table(font: Buffer, tag: string): Buffer {
  const entry = readTables(font).find((candidate) => candidate.tag === tag);
  if (!entry) throw new RangeError(`font without a ${tag} table`);
  return entry.data;
}

function checksum(data: Buffer): number {
  let sum = 0;
  for (let at = 0; at < data.length; at += 4) {
    const word =
      at + 4 <= data.length
        ? data.readUInt32BE(at)
        : Buffer.concat([data.subarray(at), Buffer.alloc(3)]).readUInt32BE(0);
    sum = (sum + word) >>> 0;
  }
  return sum;
}

function writeTables(flavour: number, entries: TableEntry[]): Buffer {
  const log2 = Math.floor(Math.log2(entries.length));
  const header = Buffer.alloc(12 + 16 * entries.length);
  header.writeUInt32BE(flavour, 0);
  header.writeUInt16BE(entries.length, 4);
  header.writeUInt16BE(16 * 2 ** log2, 6);
  header.writeUInt16BE(log2, 8);
  header.writeUInt16BE(16 * entries.length - 16 * 2 ** log2, 10);
  const bodies: Buffer[] = [];
  let offset = header.length;
  entries.forEach(({ tag, data }, index) => {
    const at = 12 + 16 * index;
    header.write(tag, at, 'latin1');
    header.writeUInt32BE(checksum(data), at + 4);
    header.writeUInt32BE(offset, at + 8);
    header.writeUInt32BE(data.length, at + 12);
    const padded = Buffer.concat([data, Buffer.alloc((4 - (data.length % 4)) % 4)]);
    bodies.push(padded);
    offset += padded.length;
  });
  const font = Buffer.concat([header, ...bodies]);
  const head = entries.findIndex(({ tag }) => tag === 'head');
  const headAt = font.readUInt32BE(12 + 16 * head + 8);
  font.writeUInt32BE(0, headAt + 8);
  font.writeUInt32BE((0xb1b0afba - checksum(font)) >>> 0, headAt + 8);
  return font;
}

function nameTable(names: ReadonlyMap<number, string>): Buffer {
  const sorted = [...names].sort(([a], [b]) => a - b);
  const header = Buffer.alloc(6 + 12 * sorted.length);
  header.writeUInt16BE(sorted.length, 2);
  header.writeUInt16BE(header.length, 4);
  const strings: Buffer[] = [];
  let offset = 0;
  sorted.forEach(([id, words], index) => {
    const text = Buffer.from(words, 'utf16le').swap16();
    [3, 1, 0x409, id, text.length, offset].forEach((value, field) => {
      header.writeUInt16BE(value, 6 + 12 * index + 2 * field);
    });
    strings.push(text);
    offset += text.length;
  });
  return Buffer.concat([header, ...strings]);
}

/** The same font under other names. The licence of a font with reserved names asks this of a subset. */
export function renamed(font: Buffer, names: ReadonlyMap<number, string>): Buffer {
  const entries = readTables(font).map(({ tag, data }) => ({
    tag,
    data: tag === 'name' ? nameTable(names) : Buffer.from(data),
  }));
  return writeTables(font.readUInt32BE(0), entries);
}

function glyphOfCharacter(cmap: Buffer): (code: number) => number {
  const count = cmap.readUInt16BE(2);
  for (let index = 0; index < count; index += 1) {
    const at = cmap.readUInt32BE(4 + 8 * index + 4);
    if (cmap.readUInt16BE(at) !== 4) continue;
    const segments = cmap.readUInt16BE(at + 6) / 2;
    return (code) => {
      for (let k = 0; k < segments; k += 1) {
        const end = cmap.readUInt16BE(at + 14 + 2 * k);
        if (code > end) continue;
        const start = cmap.readUInt16BE(at + 16 + 2 * segments + 2 * k);
        if (code < start) return 0;
        const delta = cmap.readUInt16BE(at + 16 + 4 * segments + 2 * k);
        const rangeAt = at + 16 + 6 * segments + 2 * k;
        const range = cmap.readUInt16BE(rangeAt);
        if (range === 0) return (code + delta) & 0xffff;
        const glyph = cmap.readUInt16BE(rangeAt + range + 2 * (code - start));
        return glyph === 0 ? 0 : (glyph + delta) & 0xffff;
      }
      return 0;
    };
  }
  throw new RangeError('font without a format 4 character map');
}

/** Advance widths in thousandths of the type size, by code point; characters without a glyph are left out. */
export function advanceWidths(font: Buffer, codes: readonly number[]): Map<number, number> {
  const glyph = glyphOfCharacter(table(font, 'cmap'));
  const metrics = table(font, 'hmtx');
  const measured = table(font, 'hhea').readUInt16BE(34);
  const unitsPerEm = table(font, 'head').readUInt16BE(18);
  const widths = new Map<number, number>();
  for (const code of codes) {
    const id = glyph(code);
    if (id === 0) continue;
    const advance = metrics.readUInt16BE(4 * Math.min(id, measured - 1));
    widths.set(code, Math.round((advance / unitsPerEm) * 1e4) / 10);
  }
  return widths;
}
