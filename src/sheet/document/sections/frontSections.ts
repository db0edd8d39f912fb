import { busName } from '../../../study/index.ts';
import { cells } from '../cells.ts';
import type { Block, FigureBlock, Section } from '../model.ts';
import { provenanceNote, sourceWithMark } from '../provenance.ts';
import { caseName, type SheetView, solvedIn, subjectName } from '../SheetView.ts';
import { byMargin, counted, decides, marginText, withUnit } from '../verdictWords.ts';

/** Units of the drawing's own margin that the sheet leaves out on each side. */
export const DRAWING_CROP = 16;
/** Points for one unit of the drawing at most: letters of 12 units become 9 points. */
const LARGEST_SCALE = 0.75;
/** Letters of 12 units stay above 7.5 points. */
const TIGHTEST = 0.85;

/** The drawing without most of its own margin, in its units. */
function croppedSize({ input }: SheetView): { width: number; height: number } | undefined {
  const size = input.drawingSize;
  return size && { width: size.width - 2 * DRAWING_CROP, height: size.height - 2 * DRAWING_CROP };
}

const shownWords = (view: SheetView): string =>
  view.shownIsBusiest ? `${view.shown.name}, the busiest case` : view.shown.name;

/** The single-line diagram of the shown case. */
export function drawingSection(view: SheetView): Section {
  const solved = solvedIn(view.shown) !== undefined;
  const aside = solved
    ? `${shownWords(view)}; readings at the fundamental`
    : `${view.shown.name}; no readings: the case is not solved`;
  const size = croppedSize(view);
  return {
    id: 'drawing',
    title: 'Single-line diagram',
    aside,
    blocks: [
      {
        kind: 'figure',
        id: 'drawing',
        request: { kind: 'drawing', caseId: view.shown.id },
        label: `Single-line diagram, ${view.shown.name}`,
        aspect: size ? size.height / size.width : 0.5,
        tightest: TIGHTEST,
        ...(size ? { widest: size.width * LARGEST_SCALE } : {}),
      },
    ],
  };
}

/** The impedance at the first chosen busbar in the shown case; absent where none was scanned. */
export function frontImpedanceSection(view: SheetView): Section | undefined {
  const scan = view.shown.computed?.scans.find(({ withCorrection }) => withCorrection.error === undefined);
  if (!scan) return undefined;
  const { bus, sequence } = scan.withCorrection;
  const compared = scan.without ? '; dashed: every bank and filter out of service' : '';
  const figure: FigureBlock = {
    kind: 'figure',
    id: 'front-impedance',
    request: { kind: 'impedance', caseId: view.shown.id, bus, sequence },
    label: `Impedance at ${busName(view.study, bus)}, ${view.shown.name}`,
    aspect: 0.21,
  };
  return {
    id: 'front-impedance',
    title: `Impedance seen at ${busName(view.study, bus)}`,
    aside: `${sequence} sequence, ${shownWords(view)}${compared}`,
    blocks: [figure],
  };
}

/** The six verdicts with the least room, one a check and subject. */
export function marginsSection(view: SheetView): Section {
  const seen = new Set<string>();
  const rows = view.verdicts
    .filter(decides)
    .sort(byMargin)
    .filter((verdict) => {
      const label = `${verdict.check}|${verdict.subject.id}`;
      if (seen.has(label)) return false;
      seen.add(label);
      return true;
    })
    .slice(0, 6);
  const table: Block = {
    kind: 'table',
    columns: [
      { head: 'check', align: 'left', grow: 2 },
      { head: 'at', align: 'left', grow: 2 },
      { head: 'value', align: 'left', grow: 1 },
      { head: 'limit', align: 'left', grow: 1 },
      { head: 'margin', align: 'decimal' },
      { head: 'in case', align: 'left', grow: 1 },
      { head: 'source', align: 'left', grow: 2 },
    ],
    rows: rows.map((verdict) =>
      cells(
        { text: verdict.title, mark: verdict.verdict, quiet: verdict.verdict },
        subjectName(view.study, verdict),
        withUnit(verdict.value, verdict.unit),
        withUnit(verdict.limit, verdict.unit),
        { text: marginText(verdict), strong: true },
        caseName(view, verdict.caseId),
        sourceWithMark(verdict.source),
      ),
    ),
    notes: provenanceNote(rows.map(({ source }) => source)),
  };
  const none: Block = { kind: 'paragraph', text: 'No verdict with a margin has been computed.' };
  return {
    id: 'margins',
    title: 'Smallest margins',
    aside: `all ${counted(view.verdicts.length, 'verdict')} with equations and sources below`,
    blocks: [rows.length > 0 ? table : none],
  };
}
