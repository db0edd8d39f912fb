import { sortByMargin, summarise, type Verdict } from '../checks/index.ts';
import type { ResultsCase, ResultsFile } from '../engine/index.ts';
import { busById, busName, casesOf, elementName, type Finding, type Study } from '../study/index.ts';
import { type Column, fixed, significant, tableLines, wrapped } from './table.ts';

const lineWidth = 98;

const busColumns: Column[] = [
  { head: 'Busbar', align: 'left', most: 26 },
  { head: 'Un V', align: 'right' },
  { head: 'U12 V', align: 'right' },
  { head: 'U23 V', align: 'right' },
  { head: 'U31 V', align: 'right' },
  { head: 'U/Un %', align: 'right' },
  { head: 'THD U %', align: 'right' },
];

const terminalColumns: Column[] = [
  { head: 'Part', align: 'left', most: 22 },
  { head: 'at busbar', align: 'left', most: 15 },
  { head: 'kW', align: 'right' },
  { head: 'kvar', align: 'right' },
  { head: 'cos φ', align: 'right' },
  { head: 'PF', align: 'right' },
  { head: 'A', align: 'right' },
  { head: 'neutral A', align: 'right' },
  { head: 'THD I %', align: 'right' },
];

const resonanceColumns: Column[] = [
  { head: 'order', align: 'right' },
  { head: 'Hz', align: 'right' },
  { head: 'resonance', align: 'left' },
  { head: 'ohm', align: 'right' },
  { head: 'Q', align: 'right' },
];

const verdictColumns: Column[] = [
  { head: '', align: 'left' },
  { head: 'Check', align: 'left', most: 36 },
  { head: 'of', align: 'left', most: 18 },
  { head: 'value', align: 'right' },
  { head: 'limit', align: 'right' },
  { head: 'unit', align: 'left', most: 8 },
  { head: 'margin', align: 'right' },
];

const marks = { pass: '✓ pass', watch: '! watch', fail: '✕ fail', unknown: '? unknown' } as const;

/** The readable summary of a solved study, line by line, at most 100 columns wide. */
export function summary(
  study: Study,
  results: ResultsFile,
  verdicts: ReadonlyMap<string, readonly Verdict[]>,
  findings: readonly Finding[],
): string[] {
  const cases = results.cases.flatMap((solved) => [
    '',
    ...caseLines(study, solved, verdicts.get(solved.id) ?? []),
  ]);
  const warnings = [...results.warnings, ...findings.map(({ path, message }) => `${path}: ${message}`)];
  return [...headLines(study), ...cases, ...warningLines([...new Set(warnings)])];
}

function headLines(study: Study): string[] {
  const { title, site, frequencyHz, maxOrder = 50, summation = 'phasor' } = study;
  const law =
    summation === 'phasor' ? 'sources added with their angles' : 'sources added by the IEC 61000-3-6 law';
  const count = (n: number, word: string): string => `${n} ${word}${n === 1 ? '' : 's'}`;
  const sizes = [
    count(study.buses.length, 'busbar'),
    count(study.elements.length, 'part'),
    count(casesOf(study).length, 'case'),
  ];
  return [
    site === undefined || site === '' ? title : `${title}, ${site}`,
    `${frequencyHz} Hz, orders 1 to ${maxOrder}, ${law}; ${sizes.join(', ')}`,
    'rms of all orders; kW and kvar of the fundamental into the part (kvar below 0: leading)',
  ];
}

function caseLines(study: Study, solved: ResultsCase, verdicts: readonly Verdict[]): string[] {
  const name = casesOf(study).find(({ id }) => id === solved.id)?.name ?? solved.id;
  const outcome = solved.converged ? 'converged' : 'did not converge';
  const head = `Case ${name}${name === solved.id ? '' : ` (${solved.id})`}: ${outcome}`;
  const reason = solved.error === undefined ? [] : wrapped(solved.error, lineWidth, '  ', '  ');
  if (!solved.converged) return [underlined(head), ...reason, ...scanLines(study, solved)];
  return [
    underlined(head),
    ...reason,
    ...tableLines(
      busColumns,
      solved.buses.map((bus) => busRow(study, bus)),
    ),
    '',
    ...tableLines(
      terminalColumns,
      solved.terminals.map((terminal) => terminalRow(study, terminal)),
    ),
    ...scanLines(study, solved),
    ...verdictLines(study, verdicts),
  ];
}

function underlined(head: string): string {
  return `${head}\n${'─'.repeat(Math.min(head.length, lineWidth))}`;
}

function busRow(study: Study, bus: ResultsCase['buses'][number]): string[] {
  const nominalV = busById(study, bus.id)?.nominalV ?? Number.NaN;
  const furthest = bus.rmsLL.reduce((worst, v) =>
    Math.abs(v - nominalV) > Math.abs(worst - nominalV) ? v : worst,
  );
  return [
    busName(study, bus.id),
    significant(nominalV, 3),
    ...bus.rmsLL.map((volts) => fixed(volts, 1)),
    fixed((100 * furthest) / nominalV, 1),
    fixed(worst(bus.thdPercent), 2),
  ];
}

function terminalRow(study: Study, terminal: ResultsCase['terminals'][number]): string[] {
  const { kW, kvar, displacementPF, truePF, rmsA, neutralRmsA, thdPercent } = terminal;
  return [
    elementName(study, terminal.element),
    busName(study, terminal.bus),
    fixed(kW, 1),
    fixed(kvar, 1),
    fixed(displacementPF, 3),
    fixed(truePF, 3),
    fixed(Math.max(...rmsA), 1),
    fixed(neutralRmsA, 1),
    fixed(worst(thdPercent), 1),
  ];
}

/** The largest of the three phases' figures; null where none has one. */
function worst(values: readonly (number | null)[]): number | null {
  const known = values.filter((value) => value !== null);
  return known.length === 0 ? null : Math.max(...known);
}

function scanLines(study: Study, solved: ResultsCase): string[] {
  return solved.scans.flatMap((scan) => {
    const title = `  Impedance at ${busName(study, scan.bus)}, ${scan.sequence} sequence`;
    if (scan.error !== undefined)
      return ['', ...wrapped(`${title.trim()}: ${scan.error}`, lineWidth, '  ', '    ')];
    const [from, to] = [scan.points[0]?.[0], scan.points.at(-1)?.[0]];
    const span = `${title}, ${fixed(from, 0)} to ${fixed(to, 0)} Hz`;
    if (scan.resonances.length === 0) return ['', `${span}: no resonance`];
    const rows = scan.resonances.map(({ order, kind, ohm, q }) => [
      fixed(order, 3),
      fixed(order * study.frequencyHz, 1),
      kind,
      significant(ohm, 4),
      significant(q, 3),
    ]);
    return ['', span, ...tableLines(resonanceColumns, rows)];
  });
}

function verdictLines(study: Study, verdicts: readonly Verdict[]): string[] {
  const { fail, watch, unknown, pass } = summarise(verdicts);
  const head = `  Verdicts: ${fail} fail, ${watch} watch, ${unknown} unknown, ${pass} pass`;
  const open = sortByMargin(verdicts).filter(({ verdict }) => verdict !== 'pass');
  if (open.length === 0) return ['', head];
  const table = tableLines(
    verdictColumns,
    open.map((verdict) => verdictRow(study, verdict)),
  );
  return ['', head, ...table, ...missingLines(study, open)];
}

/** What each verdict that is unknown lacks. */
function missingLines(study: Study, verdicts: readonly Verdict[]): string[] {
  return verdicts
    .filter(({ verdict }) => verdict === 'unknown')
    .flatMap((verdict) => {
      const text = `? ${verdict.title}, ${subjectName(study, verdict)}: ${verdict.mend ?? verdict.remarks[0] ?? ''}`;
      return wrapped(text, lineWidth, '  ', '    ');
    });
}

function subjectName(study: Study, { subject }: Verdict): string {
  return subject.kind === 'bus' ? busName(study, subject.id) : elementName(study, subject.id);
}

function verdictRow(study: Study, verdict: Verdict): string[] {
  const { title, value, limit, unit, margin } = verdict;
  return [
    marks[verdict.verdict],
    title,
    subjectName(study, verdict),
    significant(value, 4),
    significant(limit, 4),
    unit,
    fixed(margin, 2),
  ];
}

function warningLines(warnings: readonly string[]): string[] {
  if (warnings.length === 0) return [];
  return ['', 'Warnings', ...warnings.flatMap((warning) => wrapped(warning, lineWidth, '  ', '    '))];
}
