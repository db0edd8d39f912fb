import type { TermsBlock } from '../document/model.ts';
import type { Ink, TextMark, Weight } from './marks.ts';
import { textWidth } from './measure.ts';
import { LEADING, TYPE } from './paper.ts';
import type { Slice } from './slice.ts';
import { wrap } from './wrap.ts';

/** Baseline of a line of this size below the line's upper edge. */
export const baseline = (size: number): number => size * 1.02;

interface LineStyle {
  size: number;
  weight?: Weight;
  ink?: Ink;
  x?: number;
}

export function textMark(text: string, style: LineStyle, y = baseline(style.size)): TextMark {
  return {
    kind: 'text',
    x: style.x ?? 0,
    y,
    text,
    size: style.size,
    weight: style.weight ?? 'regular',
    ink: style.ink ?? 'ink',
  };
}

/** Lines as slices; the first two and the last two lines stay together. */
function lineSlices(lines: string[], style: LineStyle): Slice[] {
  return lines.map((line, index) => ({
    height: style.size * LEADING,
    marks: line === '' ? [] : [textMark(line, style)],
    glued: index < lines.length - 1 && (index === 0 || index === lines.length - 2),
  }));
}

function spaced(slices: Slice[], gap: number): Slice[] {
  const [first, ...rest] = slices;
  return first ? [{ ...first, gap }, ...rest] : [];
}

export function paragraphSlices(text: string, width: number, small: boolean): Slice[] {
  const size = small ? TYPE.small : TYPE.body;
  const ink: Ink = small ? 'quiet' : 'ink';
  return spaced(lineSlices(wrap(text, width, size), { size, ink }), small ? 3 : 4);
}

export function listSlices(items: string[], width: number): Slice[] {
  const indent = 11;
  return items.flatMap((item) => {
    const slices = lineSlices(wrap(item, width - indent, TYPE.body), { size: TYPE.body, x: indent });
    const [first, ...rest] = spaced(slices, 2.2);
    if (!first) return [];
    return [
      { ...first, marks: [textMark('•', { size: TYPE.body, x: 2, ink: 'quiet' }), ...first.marks] },
      ...rest,
    ];
  });
}

/** Labels in lighter ink in a column of their own, the words beside them. */
export function termsSlices({ terms, leadsOn = false }: TermsBlock, width: number): Slice[] {
  const size = TYPE.table;
  const indent = Math.min(width * 0.3, 10 + Math.max(0, ...terms.map(({ label }) => textWidth(label, size))));
  return terms.flatMap(({ label, text }) => {
    const lines = wrap(text, width - indent, size);
    const slices = spaced(lineSlices(lines, { size, x: indent }), 1.5);
    const labels = wrap(label, indent - 8, size);
    return slices.map((slice, index) => {
      const name = labels[index];
      const label = name === undefined ? [] : [textMark(name, { size, ink: 'quiet' })];
      return { ...slice, glued: leadsOn || slice.glued, marks: [...label, ...slice.marks] };
    });
  });
}

/** A title over what follows, with an aside in lighter ink beside or, where it is too long, under it. */
export function headingSlices(
  title: string,
  aside: string | undefined,
  width: number,
  section: boolean,
): Slice[] {
  const size = section ? TYPE.section : TYPE.heading;
  const lines = wrap(title, width, size, 'semibold');
  const slices: Slice[] = lines.map((line) => ({
    height: size * LEADING,
    marks: [textMark(line, { size, weight: 'semibold' })],
    glued: true,
  }));
  if (aside !== undefined) addAside(slices, lines.at(-1) ?? '', aside, size, width);
  return spaced(slices, section ? 15 : 9);
}

function addAside(slices: Slice[], line: string, aside: string, size: number, width: number): void {
  const x = textWidth(line, size, 'semibold') + 14;
  const last = slices.at(-1);
  if (last && x + textWidth(aside, TYPE.table) <= width) {
    last.marks.push(textMark(aside, { size: TYPE.table, ink: 'quiet', x }, baseline(size)));
    return;
  }
  const under = lineSlices(wrap(aside, width, TYPE.table), { size: TYPE.table, ink: 'quiet' });
  slices.push(...under.map((slice) => ({ ...slice, glued: true })));
}
