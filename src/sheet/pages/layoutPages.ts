import type { SheetDocument } from '../document/model.ts';
import { blockSlices, type Room } from './blockSlices.ts';
import { type SheetPage, type SheetPages, shifted } from './marks.ts';
import { frontFoot, frontHead, slimHead, slimHeadHeight } from './pageFrame.ts';
import { type PlacedSlice, paginate } from './paginate.ts';
import { contentWidth, type Paper, paperOf } from './paper.ts';
import type { Slice } from './slice.ts';
import { headingSlices } from './textSlices.ts';

function documentSlices(document: SheetDocument, room: Room): Slice[] {
  return document.sections.flatMap((section) => {
    const [head, ...under] = headingSlices(section.title, section.aside, room.width, true);
    const blocks = section.blocks.flatMap((block) => blockSlices(block, room));
    if (!head) return blocks;
    return [{ ...head, section: { id: section.id, title: section.title } }, ...under, ...blocks];
  });
}

const sectionsOnFirst = (pages: PlacedSlice[][]): number =>
  pages[0]?.filter(({ slice }) => slice.section !== undefined).length ?? 0;

function pageOf(placed: PlacedSlice[], number: number, head: Slice, paper: Paper): SheetPage {
  const { left, top } = paper.margin;
  const textTop = top + head.height + (number === 1 ? 10 : 0);
  const page: SheetPage = { number, sections: [], marks: head.marks.map((mark) => shifted(mark, left, top)) };
  for (const { slice, y } of placed) {
    if (slice.section) page.sections.push({ ...slice.section, y: textTop + y });
    page.marks.push(...slice.marks.map((mark) => shifted(mark, left, textTop + y)));
  }
  return page;
}

/**
 * The document set on paper: every mark of every page, in points. The preview and the PDF both draw
 * exactly these marks, so they cannot differ. The same document gives the same pages.
 */
export function layoutPages(document: SheetDocument): SheetPages {
  const paper = paperOf(document.paper);
  const width = contentWidth(paper);
  const front = frontHead(document, paper);
  const foot = frontFoot(document, paper, '1 of 1');
  const whole = paper.height - paper.margin.top - paper.margin.bottom;
  const tallest = whole - slimHeadHeight - 60;
  const fill = (slices: Slice[]): PlacedSlice[][] =>
    paginate(slices, (page) =>
      page === 0 ? whole - front.height - foot.height - 20 : whole - slimHeadHeight,
    );
  const slices = documentSlices(document, { width, tallest });
  const loose = fill(slices);
  const tight = fill(slices.map((slice) => (slice.tight ? { ...slice, ...slice.tight } : slice)));
  const placed = sectionsOnFirst(tight) > sectionsOnFirst(loose) ? tight : loose;
  const count = placed.length;
  const pages = placed.map((slices, index) => {
    const page = `page ${index + 1} of ${count}`;
    return pageOf(slices, index + 1, index === 0 ? front : slimHead(document, paper, page), paper);
  });
  const first = pages[0];
  if (first) {
    const set = frontFoot(document, paper, `1 of ${count}`);
    const y = paper.height - paper.margin.bottom - set.height;
    first.marks.push(...set.marks.map((mark) => shifted(mark, paper.margin.left, y)));
  }
  return { width: paper.width, height: paper.height, pages };
}
