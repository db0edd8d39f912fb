import type { ImpedanceScan } from '../../../engine/index.ts';
import { busName } from '../../../study/index.ts';
import { cells } from '../cells.ts';
import { fixed, significant } from '../formatNumber.ts';
import type { SheetScan } from '../input.ts';
import type { Block, Row, Section } from '../model.ts';
import type { CaseView, SheetView } from '../SheetView.ts';

interface Curve {
  scan: SheetScan;
  /** Cases in which the curve is the same to the last digit. */
  cases: CaseView[];
}

function sameArray(a: Float64Array, b: Float64Array): boolean {
  return a.length === b.length && a.every((value, index) => value === b[index]);
}

function sameScan(a: ImpedanceScan | undefined, b: ImpedanceScan | undefined): boolean {
  if (!a || !b) return a === b;
  if (a.bus !== b.bus || a.sequence !== b.sequence || a.error !== b.error) return false;
  return sameArray(a.frequencyHz, b.frequencyHz) && sameArray(a.re, b.re) && sameArray(a.im, b.im);
}

function curvesOf(view: SheetView): Curve[] {
  const curves: Curve[] = [];
  for (const item of view.cases) {
    for (const scan of item.computed?.scans ?? []) {
      const known = curves.find(
        (curve) =>
          sameScan(curve.scan.withCorrection, scan.withCorrection) &&
          sameScan(curve.scan.without, scan.without),
      );
      if (known) known.cases.push(item);
      else curves.push({ scan, cases: [item] });
    }
  }
  return curves;
}

/** |Z| with the prefix that suits it. */
function ohms(value: number): string {
  if (value >= 1000) return `${significant(value / 1000, 3)} kΩ`;
  return value >= 1 ? `${significant(value, 3)} Ω` : `${significant(value * 1000, 3)} mΩ`;
}

function resonanceRows(scan: ImpedanceScan, frequencyHz: number, word: string): Row[] {
  if (scan.error !== undefined) return [cells(word, `no curve: ${scan.error}`, '', '', '', '')];
  if (scan.resonances.length === 0) return [cells(word, 'none in the range', '', '', '', '')];
  return [...scan.resonances]
    .sort((a, b) => a.order - b.order)
    .map((resonance) =>
      cells(
        word,
        resonance.kind,
        fixed(resonance.order, 2),
        fixed(resonance.order * frequencyHz, 1),
        ohms(resonance.ohm),
        resonance.q === null ? 'out of reach' : fixed(resonance.q, 1),
      ),
    );
}

function curveTitle(view: SheetView, { scan, cases }: Curve): string {
  const names = cases.map(({ name }) => name).join(', ');
  return `${busName(view.study, scan.withCorrection.bus)}, ${scan.withCorrection.sequence} sequence: ${names}`;
}

function figureBlocks(view: SheetView, curve: Curve, index: number): Block[] {
  const { bus, sequence, error } = curve.scan.withCorrection;
  const heading: Block = { kind: 'heading', text: curveTitle(view, curve) };
  if (error !== undefined) return [heading, { kind: 'paragraph', text: `No curve: ${error}.` }];
  const [first] = curve.cases;
  if (!first) return [];
  return [
    heading,
    {
      kind: 'figure',
      id: `impedance-${index + 1}`,
      request: { kind: 'impedance', caseId: first.id, bus, sequence },
      label: `Impedance at ${curveTitle(view, curve)}`,
      aspect: 0.26,
    },
  ];
}

/** Driving-point impedance with and without the correction, a curve a case, and where it resonates. */
export function impedanceSection(view: SheetView): Section {
  const curves = curvesOf(view);
  if (curves.length === 0) {
    const text = 'No busbar was chosen for an impedance curve, so no resonance is listed.';
    return { id: 'impedance', title: 'Impedance and resonances', blocks: [{ kind: 'paragraph', text }] };
  }
  const rows = curves.flatMap((curve): Row[] => {
    const { withCorrection, without } = curve.scan;
    const { frequencyHz } = view.study;
    return [
      { kind: 'group', text: curveTitle(view, curve) },
      ...resonanceRows(withCorrection, frequencyHz, 'as studied'),
      ...(without ? resonanceRows(without, frequencyHz, 'without correction') : []),
    ];
  });
  return {
    id: 'impedance',
    title: 'Impedance and resonances',
    aside: 'full line: as studied; dashed: every bank and filter out of service',
    blocks: [
      ...curves.flatMap((curve, index) => figureBlocks(view, curve, index)),
      {
        kind: 'table',
        columns: [
          { head: 'network', align: 'left', grow: 2 },
          { head: 'resonance', align: 'left', grow: 1 },
          { head: 'order', align: 'decimal', grow: 1 },
          { head: 'frequency', unit: 'Hz', align: 'decimal', grow: 1 },
          { head: '|Z|', align: 'right', grow: 1 },
          { head: 'Q', align: 'decimal', grow: 1 },
        ],
        rows,
        notes: [
          'Parallel: a maximum of |Z|; series: a minimum. Q from the half-power points; “out of reach” where the curve does not fall to them.',
        ],
      },
    ],
  };
}
