import { busName } from '../../../study/index.ts';
import { cells } from '../cells.ts';
import type { Block, FigureBlock, Section } from '../model.ts';
import { provenanceNote, sourceWithMark } from '../provenance.ts';
import { caseName, type SheetView, subjectName } from '../SheetView.ts';
import { byMargin, counted, decides, marginText, withUnit } from '../verdictWords.ts';

export const shownWords = (view: SheetView): string =>
  view.shownIsBusiest ? `${view.shown.name}, the busiest case` : view.shown.name;

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
