import type { SheetDocument } from '../document/model.ts';
import { cautionSlice } from './blockSlices.ts';
import type { PageMark } from './marks.ts';
import { textWidth } from './measure.ts';
import { contentWidth, type Paper, TYPE } from './paper.ts';
import type { Slice } from './slice.ts';
import { textMark } from './textSlices.ts';
import { wrap } from './wrap.ts';

/** What stands on every page around the text. Heights in points. */

const SLIM_HEAD = 22;
const TITLE_ROW = 42;

/** The longest beginning of a text that fits, with an ellipsis where something is left out. */
function shortened(text: string, width: number, size: number, semibold = false): string {
  const weight = semibold ? 'semibold' : 'regular';
  if (textWidth(text, size, weight) <= width) return text;
  let kept = text;
  while (kept !== '' && textWidth(`${kept}…`, size, weight) > width) kept = kept.slice(0, -1);
  return `${kept.trimEnd()}…`;
}

/** Title, subtitle, programme and study's fingerprint over a rule. */
export function frontHead(document: SheetDocument, paper: Paper): Slice {
  const width = contentWidth(paper);
  const right = [document.programme, document.shortFingerprint];
  const reserve = Math.max(...right.map((text) => textWidth(text, TYPE.table))) + 16;
  const titles = wrap(document.title, width - reserve, TYPE.title, 'semibold').slice(0, 3);
  const subtitles = wrap(document.subtitle, width - reserve, TYPE.body).slice(0, 2);
  const marks: PageMark[] = [];
  let y = 0;
  for (const line of titles) {
    marks.push(textMark(line, { size: TYPE.title, weight: 'semibold' }, y + 14));
    y += 18;
  }
  for (const line of subtitles) {
    marks.push(textMark(line, { size: TYPE.body, ink: 'quiet' }, y + 9));
    y += 12;
  }
  right.forEach((text, index) => {
    const x = width - textWidth(text, TYPE.table);
    marks.push(textMark(text, { size: TYPE.table, ink: 'quiet', x }, index === 0 ? 14 : y - 3));
  });
  y += 5;
  marks.push({ kind: 'line', x1: 0, y1: y, x2: width, y2: y, width: 1.1, ink: 'ink' });
  return { height: y + 2, marks, glued: false };
}

/** Title, site, revision and page on one line over a hairline. */
export function slimHead(document: SheetDocument, paper: Paper, page: string): Slice {
  const width = contentWidth(paper);
  const right = `${document.shortFingerprint} · ${page}`;
  const rightWidth = textWidth(right, TYPE.small);
  const left = shortened(`${document.title} · ${document.subtitle}`, width - rightWidth - 16, TYPE.small);
  return {
    height: SLIM_HEAD,
    marks: [
      textMark(left, { size: TYPE.small, ink: 'quiet' }),
      textMark(right, { size: TYPE.small, ink: 'quiet', x: width - rightWidth }),
      { kind: 'line', x1: 0, y1: 12.5, x2: width, y2: 12.5, width: 0.5, ink: 'hairline' },
    ],
    glued: false,
  };
}

/** The caution and the ruled block at the foot of the first page. */
export function frontFoot(document: SheetDocument, paper: Paper, page: string): Slice {
  const width = contentWidth(paper);
  const caution = cautionSlice(document.frontCaution, width);
  const top = caution.height + 11;
  const block = document.titleBlock;
  const fields: [label: string, text: string, share: number][] = [
    ['site', block.site, 0.25],
    ['prepared', block.preparedBy, 0.1766],
    ['checked', block.checkedBy, 0.1766],
    ['approved', block.approvedBy, 0.1766],
    ['revision', block.revision, 0.1102],
    ['page', page, 0.11],
  ];
  const marks: PageMark[] = [...caution.marks];
  let x = 0;
  for (const [label, text, share] of fields) {
    const room = share * width;
    marks.push({ kind: 'box', x, y: top, width: room, height: TITLE_ROW, stroke: 0.9, ink: 'ink' });
    marks.push(textMark(label, { size: TYPE.small, ink: 'quiet', x: x + 6 }, top + 12));
    const lines = wrap(text, room - 12, TYPE.body, 'semibold');
    lines.slice(0, 2).forEach((line, index) => {
      const last = index === 1 && lines.length > 2 ? `${line}…` : line;
      const set = shortened(last, room - 10, TYPE.body, true);
      if (set !== '')
        marks.push(textMark(set, { size: TYPE.body, weight: 'semibold', x: x + 6 }, top + 25 + index * 11));
    });
    x += room;
  }
  return { height: top + TITLE_ROW, marks, glued: false };
}

export const slimHeadHeight = SLIM_HEAD;
