import type { Verdict } from '../../../checks/index.ts';
import { cells } from '../cells.ts';
import { byCheck, checkWords } from '../checkWords.ts';
import type { Block, Row, Section } from '../model.ts';
import { provenanceNote, sourceWithMark } from '../provenance.ts';
import { caseName, type SheetView, subjectName } from '../SheetView.ts';
import { byMargin, marginText, withUnit } from '../verdictWords.ts';

/** The value all items share; undefined where they differ. */
function shared<T>(items: readonly T[]): T | undefined {
  return new Set(items).size === 1 ? items[0] : undefined;
}

/** Steps of the working that the row prints; the list of all orders stands in its own section. */
function stepsOf(verdict: Verdict): Verdict['working'] {
  return verdict.check === 'bus-order' ? verdict.working.slice(0, 1) : verdict.working;
}

function workingText(verdict: Verdict, equationSaid: boolean): string {
  const steps = stepsOf(verdict).map(({ equation, numbers }, index) =>
    equationSaid && index === 0 ? numbers : `${equation}: ${numbers}`,
  );
  return steps.filter((text) => text !== '').join('; ');
}

const closed = (text: string): string => (/[.!?)]$/.test(text) ? text : `${text}.`);

const capitalised = (text: string): string => `${text.charAt(0).toUpperCase()}${text.slice(1)}`;

/** What a verdict remarks besides what all verdicts of its list say. */
function remarksOf(verdict: Verdict): string[] {
  const mend = verdict.mend !== undefined && !verdict.remarks.includes(verdict.mend) ? [verdict.mend] : [];
  const said = verdict.remarks.some((text) => /screening/i.test(text));
  const screening = verdict.screening && !said ? ['Screening rule: it never fails and never decides.'] : [];
  return [...verdict.remarks, ...screening, ...mend].map(closed);
}

function withoutText({ withoutCorrection, unit }: Verdict): string[] {
  if (!withoutCorrection) return [];
  const { value, verdict } = withoutCorrection;
  return [`Without the correction: ${verdict}${value === null ? '' : `, ${withUnit(value, unit)}`}.`];
}

function rowOf(view: SheetView, verdict: Verdict, unitSaid: boolean, working: string, said: string[]): Row {
  const number = (value: number | null): string => withUnit(value, unitSaid ? '' : verdict.unit, 'none');
  const order =
    verdict.order !== undefined && Number.isInteger(verdict.order) ? `, order ${verdict.order}` : '';
  const remarks = [...withoutText(verdict), ...remarksOf(verdict).filter((text) => !said.includes(text))];
  return cells(
    { text: verdict.verdict, mark: verdict.verdict },
    `${subjectName(view.study, verdict)}${order}`,
    caseName(view, verdict.caseId),
    number(verdict.value),
    number(verdict.limit),
    { text: marginText(verdict) || 'none', strong: true },
    { text: working, quiet: remarks.join(' ') },
  );
}

/** Remarks that every one of several verdicts makes. */
function commonRemarks(verdicts: readonly Verdict[]): string[] {
  const [first, ...rest] = verdicts.map(remarksOf);
  if (!first || rest.length === 0) return [];
  return first.filter((text) => rest.every((remarks) => remarks.includes(text)));
}

/** Verdicts under the source they were judged by, in the order of their smallest margin. */
function bySource(sorted: readonly Verdict[]): [source: string, verdicts: Verdict[]][] {
  const groups = new Map<string, Verdict[]>();
  for (const verdict of sorted) {
    const source = sourceWithMark(verdict.source);
    groups.set(source, [...(groups.get(source) ?? []), verdict]);
  }
  return [...groups];
}

function checkBlocks(view: SheetView, check: string, verdicts: readonly Verdict[]): Block[] {
  const sorted = [...verdicts].sort(byMargin);
  const equation = shared(sorted.map((verdict) => stepsOf(verdict)[0]?.equation ?? ''));
  const unit = shared(sorted.map((verdict) => verdict.unit));
  const sources = bySource(sorted);
  const said = commonRemarks(sorted);
  const terms = [
    ...(equation ? [{ label: 'equation', text: equation }] : []),
    ...(sources.length === 1 && sources[0] ? [{ label: 'source', text: sources[0][0] }] : []),
    ...said.map((text) => ({ label: 'remark', text })),
  ];
  const unitHead = unit === undefined || unit === '' ? {} : { unit };
  const rowFor = (verdict: Verdict): Row =>
    rowOf(view, verdict, unit !== undefined, workingText(verdict, Boolean(equation)), said);
  const blocks: Block[] = [{ kind: 'heading', text: capitalised(checkWords(check, sorted)) }];
  if (terms.length > 0) blocks.push({ kind: 'terms', terms, leadsOn: true });
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
    rows: sources.flatMap(([source, list]): Row[] => [
      ...(sources.length === 1 ? [] : [{ kind: 'group' as const, text: source }]),
      ...list.map(rowFor),
    ]),
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
        leadsOn: true,
        text: '✓ pass: the limit is kept. ! watch: kept by a margin of less than 0.10, or a screening rule not met. ✕ fail: the limit is exceeded. ? unknown: data are missing, no verdict. Margin = (limit − value)/(limit − reference), its sign turned for lower limits; the reference is 0 for one-sided limits, nominal voltage for voltage bands and 1 for power factors.',
      },
      ...marks.map((text): Block => ({ kind: 'paragraph', small: true, leadsOn: true, text })),
      ...byCheck(view.verdicts).flatMap(({ check, verdicts }) => checkBlocks(view, check, verdicts)),
    ],
  };
}
