import type { Section, SheetDocument } from '../document/model.ts';
import { blockSlices, type Room } from './blockSlices.ts';
import { type SheetPage, shifted } from './marks.ts';
import { frontFoot, frontHead, slimHead, slimHeadHeight } from './pageFrame.ts';
import { type PlacedSlice, paginate } from './paginate.ts';
import { contentWidth, type Paper, paperOf, turned } from './paper.ts';
import type { Slice } from './slice.ts';
import { headingSlices } from './textSlices.ts';

/** Space under the head and over the foot of the first page. */
const FRONT_GAP = 10;
/** Room a section's title takes at the head of a page. */
const HEADING = 20;

function slicesOf(section: Section, room: Room): Slice[] {
  const [head, ...under] = headingSlices(section.title, section.aside, room.width, true);
  const blocks = section.blocks.flatMap((block) => blockSlices(block, room));
  if (!head) return blocks;
  return [{ ...head, section: { id: section.id, title: section.title } }, ...under, ...blocks];
}

/** Sections that follow one another on the same paper. */
interface Run {
  paper: Paper;
  sections: Section[];
}

function runsOf({ paper, sections }: SheetDocument): Run[] {
  const upright = paperOf(paper);
  const onSide = turned(upright);
  const runs: Run[] = [];
  for (const section of sections) {
    const wanted = section.landscape ? onSide : upright;
    const last = runs.at(-1);
    if (last?.paper === wanted) last.sections.push(section);
    else runs.push({ paper: wanted, sections: [section] });
  }
  return runs;
}

const sectionsOnFirst = (pages: PlacedSlice[][]): number =>
  pages[0]?.filter(({ slice }) => slice.section !== undefined).length ?? 0;

/** The pages of a run; on the first page of all, head and foot leave less room. */
function* fillRun({ paper, sections }: Run, frame: number | undefined): Generator<void, PlacedSlice[][]> {
  const whole = paper.height - paper.margin.top - paper.margin.bottom;
  const later = whole - slimHeadHeight;
  const sets: { section: Section; slices: Slice[] }[] = [];
  for (const section of sections) {
    sets.push({
      section,
      slices: slicesOf(section, { width: contentWidth(paper), tallest: later - HEADING }),
    });
    yield;
  }
  const room = (page: number): number => (page === 0 && frame !== undefined ? whole - frame : later);
  const slices = sets.flatMap((set) => set.slices);
  const loose = paginate(slices, room);
  if (frame === undefined) return loose;
  const tightened = slices.map((slice) => (slice.tight ? { ...slice, ...slice.tight } : slice));
  const tight = paginate(tightened, room);
  const best = sectionsOnFirst(tight) > sectionsOnFirst(loose) ? tight : loose;
  if (sectionsOnFirst(best) > 1) return best;
  return paginate(
    floated(sets).flatMap((set) => set.slices),
    room,
  );
}

/** The sections with each floating one moved past those it may follow. */
function floated<T extends { section: Section }>(sets: readonly T[]): T[] {
  const order = [...sets];
  for (const set of sets) {
    if (set.section.floatsPast === undefined) continue;
    const at = order.indexOf(set);
    order.splice(at, 1);
    order.splice(at + set.section.floatsPast, 0, set);
  }
  return order;
}

function pageOf(placed: PlacedSlice[], number: number, head: Slice, paper: Paper): SheetPage {
  const { width, height, margin } = paper;
  const textTop = margin.top + head.height + (number === 1 ? FRONT_GAP : 0);
  const marks = head.marks.map((mark) => shifted(mark, margin.left, margin.top));
  const page: SheetPage = { number, width, height, sections: [], marks };
  for (const { slice, y } of placed) {
    if (slice.section) page.sections.push({ ...slice.section, y: textTop + y });
    page.marks.push(...slice.marks.map((mark) => shifted(mark, margin.left, textTop + y)));
  }
  return page;
}

/** layoutPages in steps of a section each, for callers that must not hold the page for long. */
export function* layoutSteps(document: SheetDocument): Generator<void, SheetPage[]> {
  const upright = paperOf(document.paper);
  const front = frontHead(document, upright);
  const frame = front.height + frontFoot(document, upright, '1 of 1').height + 2 * FRONT_GAP;
  const placed: { slices: PlacedSlice[]; paper: Paper }[] = [];
  for (const [index, run] of runsOf(document).entries()) {
    const pages = yield* fillRun(run, index === 0 ? frame : undefined);
    placed.push(...pages.map((slices) => ({ slices, paper: run.paper })));
  }
  const count = placed.length;
  const pages = placed.map(({ slices, paper }, index) => {
    const head = index === 0 ? front : slimHead(document, paper, `page ${index + 1} of ${count}`);
    return pageOf(slices, index + 1, head, paper);
  });
  const foot = frontFoot(document, upright, `1 of ${count}`);
  const { left, bottom } = upright.margin;
  const y = upright.height - bottom - foot.height;
  pages[0]?.marks.push(...foot.marks.map((mark) => shifted(mark, left, y)));
  return pages;
}

/**
 * The document set on paper: every mark of every page, in points. The preview and the PDF both draw
 * exactly these marks, so they cannot differ. The same document gives the same pages.
 */
export function layoutPages(document: SheetDocument): SheetPage[] {
  const steps = layoutSteps(document);
  for (;;) {
    const step = steps.next();
    if (step.done) return step.value;
  }
}
