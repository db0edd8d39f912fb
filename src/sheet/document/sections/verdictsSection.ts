import type { Verdict } from '../../../checks/index.ts';
import { cells } from '../cells.ts';
import { byCheck, checkWords } from '../checkWords.ts';
import { significant } from '../formatNumber.ts';
import type { Block, Row, Section } from '../model.ts';
import { provenanceNote, sourceWithMark } from '../provenance.ts';
import { caseName, type SheetView, subjectName } from '../SheetView.ts';
import { byMargin, marginText } from '../verdictWords.ts';

/** The value all items share; undefined where they differ. */
function shared<T>(items: readonly T[]): T | undefined {
  return new Set(items).size === 1 ? items[0] : undefined;
}

/** Steps of the working that the row prints; the list of all orders stands in its own section. */
function stepsOf(verdict: Verdict): Verdict['working'] {
  return verdict.check === 'bus-order' ? verdict.working.slice(0, 1) : verdict.working;
}

function workingText(verdict: Verdict, equationSaid: boolean, sourceSaid: boolean): string {
  const steps = stepsOf(verdict).map(({ equation, numbers }, index) =>
    equationSaid && index === 0 ? numbers : `${equation}: ${numbers}`,
  );
  const source = sourceSaid ? [] : [sourceWithMark(verdict.source)];
  return [...steps, ...source].filter((text) => text !== '').join('; ');
}

function remarkText(verdict: Verdict): string {
  const mend = verdict.mend !== undefined && !verdict.remarks.includes(verdict.mend) ? [verdict.mend] : [];
  const screening = verdict.screening ? ['Screening rule: it never fails and never decides.'] : [];
  const bare = verdict.withoutCorrection;
  const value =
    bare?.value === null || bare === undefined ? '' : ` (${significant(bare.value, 3)} ${verdict.unit})`;
  const without = bare ? [`Without the correction: ${bare.verdict}${value.replace(' )', ')')}.`] : [];
  return [...without, ...verdict.remarks, ...screening, ...mend]
    .map((text) => (/[.!?)]$/.test(text) ? text : `${text}.`))
    .join(' ');
}

function rowOf(view: SheetView, verdict: Verdict, unitSaid: boolean, working: string): Row {
  const number = (value: number | null): string => {
    if (value === null || !Number.isFinite(value)) return 'none';
    return unitSaid || verdict.unit === ''
      ? significant(value, 3)
      : `${significant(value, 3)} ${verdict.unit}`;
  };
  const order =
    verdict.order !== undefined && Number.isInteger(verdict.order) ? `, order ${verdict.order}` : '';
  const remarks = remarkText(verdict);
  return cells(
    { text: verdict.verdict, mark: verdict.verdict },
    `${subjectName(view.study, verdict)}${order}`,
    caseName(view, verdict.caseId),
    number(verdict.value),
    number(verdict.limit),
    { text: marginText(verdict) || 'none', strong: true },
    remarks === '' ? { text: working } : { text: working, quiet: remarks },
  );
}

function checkBlocks(view: SheetView, check: string, verdicts: readonly Verdict[]): Block[] {
  const sorted = [...verdicts].sort(byMargin);
  const equation = shared(sorted.map((verdict) => stepsOf(verdict)[0]?.equation ?? ''));
  const source = shared(sorted.map(({ source: item }) => sourceWithMark(item)));
  const unit = shared(sorted.map((verdict) => verdict.unit));
  const terms = [
    ...(equation ? [{ label: 'equation', text: equation }] : []),
    ...(source ? [{ label: 'source', text: source }] : []),
  ];
  const unitHead = unit === undefined || unit === '' ? {} : { unit };
  const blocks: Block[] = [{ kind: 'heading', text: checkWords(check, sorted) }];
  if (terms.length > 0) blocks.push({ kind: 'terms', terms });
  blocks.push({
    kind: 'table',
    columns: [
      { head: 'verdict', align: 'left' },
      { head: 'at', align: 'left' },
      { head: 'case', align: 'left' },
      { head: 'value', ...unitHead, align: unit === undefined ? 'right' : 'decimal' },
      { head: 'limit', ...unitHead, align: unit === undefined ? 'right' : 'decimal' },
      { head: 'margin', align: 'decimal' },
      { head: 'numbers put in, and remarks', align: 'left', grow: 1 },
    ],
    rows: sorted.map((verdict) =>
      rowOf(view, verdict, unit !== undefined, workingText(verdict, Boolean(equation), source !== undefined)),
    ),
    notes: [],
  });
  return blocks;
}

/** Every verdict with its equation, the numbers put in, margin and source. */
export function verdictsSection(view: SheetView): Section {
  const title = 'Verdicts';
  if (view.verdicts.length === 0) {
    return { id: 'verdicts', title, blocks: [{ kind: 'paragraph', text: 'No check has been computed.' }] };
  }
  const marks = provenanceNote(view.verdicts.map(({ source }) => source));
  return {
    id: 'verdicts',
    title,
    aside: 'by check, the smallest margin first',
    blocks: [
      {
        kind: 'paragraph',
        small: true,
        text: '✓ pass: the limit is kept. ! watch: kept by a margin of less than 0.10, or a screening rule not met. ✕ fail: the limit is exceeded. ? unknown: data are missing, no verdict. Margin = (limit − value)/(limit − reference), its sign turned for lower limits; the reference is 0 for one-sided limits, nominal voltage for voltage bands and 1 for power factors.',
      },
      ...marks.map((text): Block => ({ kind: 'paragraph', small: true, text })),
      ...byCheck(view.verdicts).flatMap(({ check, verdicts }) => checkBlocks(view, check, verdicts)),
    ],
  };
}
