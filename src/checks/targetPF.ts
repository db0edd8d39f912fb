import { busById, nameOf } from '../study/index.ts';
import type { CheckContext } from './CheckContext.ts';
import { figure } from './figure.ts';
import { type Inflow, inflowAt } from './inflow.ts';
import { meteredBusesOf } from './pcc.ts';
import { commonPractice } from './source.ts';
import type { Verdict } from './types.ts';
import { judged, keptQuietly, type Row, unknown } from './verdict.ts';

/** Share of the largest case's active power below which a power factor says nothing. */
const LOW_LOAD_SHARE = 0.1;

const direction = (kvar: number): string => (kvar >= 0 ? 'lagging' : 'leading');

/**
 * Displacement power factor at each PCC, or at a generator that feeds the site alone (target-pf): cos φ1 ≥ criteria.targetPF (0.95) in load cases;
 * kvar against criteria.leadingKvarLimit in light, generator and low-load cases; export is left to the
 * tariff's quadrant rule, in words.
 */
export function targetPF(context: CheckContext): Verdict[] {
  return meteredBusesOf(context.study, context.pccBuses).map((bus) => atPcc(context, bus));
}

function rowAt(context: CheckContext, bus: string): Row {
  return {
    check: 'target-pf',
    title: 'power factor at the PCC',
    subject: { kind: 'bus', id: bus },
    caseId: context.caseId,
    unit: '',
    source: commonPractice,
    working: [],
  };
}

function atPcc(context: CheckContext, bus: string): Verdict {
  const row = rowAt(context, bus);
  const inflow = inflowAt(context.study, context.solved, bus);
  const place = nameOf(busById(context.study, bus) ?? { id: bus });
  if (!inflow) return unknown(row, `nothing feeds ${place} in this case, so no power factor can be formed`);
  row.working = [
    {
      equation: 'P + jQ = Σ V · I* at the fundamental, into the site',
      numbers: `P = ${figure(inflow.kW)} kW, Q = ${figure(inflow.kvar)} kvar ${direction(inflow.kvar)}`,
    },
  ];
  if (inflow.kW < 0 || context.role === 'export') return exported(row, inflow);
  const largest = context.role === 'load' ? context.largestKW(bus) : null;
  const low = largest !== null && inflow.kW < LOW_LOAD_SHARE * largest;
  if (context.role !== 'load' || low) return leadingKvar(context, row, inflow, low ? largest : null);
  return loadCase(context, row, inflow);
}

function loadCase(context: CheckContext, row: Row, inflow: Inflow): Verdict {
  const target = context.study.criteria?.targetPF ?? 0.95;
  const pf = inflow.displacementPF;
  if (pf === null)
    return unknown(row, 'no current flows at the PCC, so it has no power factor', null, target);
  const tan = Math.sqrt(1 / target ** 2 - 1);
  const missing = inflow.kvar - inflow.kW * tan;
  const working = [
    ...row.working,
    {
      equation: 'cos φ1 = Re(V⁺ I⁺*) / |V⁺ I⁺|',
      numbers: `${figure(pf)} ${direction(inflow.kvar)}, target ${figure(target)}`,
    },
  ];
  const lagging = inflow.kvar >= 0;
  const mend = mendWords(lagging, missing);
  const remarks = lagging ? [] : ['The site is leading here; many tariffs bill capacitive energy as well.'];
  if (target >= 1)
    return unknown(
      { ...row, working },
      'a target of 1.00 leaves no room for a margin; set it below 1',
      pf,
      target,
    );
  return judged({ ...row, working, remarks, value: pf, limit: target, reference: 1, sense: 'lower', mend });
}

function mendWords(lagging: boolean, missingKvar: number): string {
  if (!lagging) return 'Overcorrected: switch steps off or choose a smaller bank.';
  return missingKvar > 0
    ? `Add about ${figure(missingKvar, 3)} kvar of correction, or switch in more steps.`
    : 'Met with little room: one more step would give it.';
}

function leadingKvar(context: CheckContext, row: Row, inflow: Inflow, largestKW: number | null): Verdict {
  const limit = context.study.criteria?.leadingKvarLimit;
  const leading = Math.max(0, -inflow.kvar);
  const remarks = [
    largestKW === null
      ? 'Light-load and generator states are judged by their leading kvar, not by a power factor.'
      : `The active power is below 10 % of the largest case (${figure(largestKW)} kW): judged by leading kvar.`,
  ];
  const judgedRow = { ...row, title: 'leading kvar at the PCC', unit: 'kvar', part: 'leading', remarks };
  const word = { equation: 'Q_leading = max(0, −Q)', numbers: `${figure(leading)} kvar` };
  const working = [...row.working, word];
  if (limit === undefined && leading > 0) {
    return unknown(
      { ...judgedRow, working },
      'enter the leading kvar the operator or the generator allows (leading kvar allowed)',
      leading,
    );
  }
  if (limit === undefined || limit === 0)
    return withoutRoom({ ...judgedRow, working }, leading, limit ?? null);
  return judged({
    ...judgedRow,
    working,
    value: leading,
    limit,
    mend: 'Switch steps off in this state, or let the controller hold a lagging band.',
  });
}

/** A limit of 0 kvar leaves no margin to form: kept while the site is not leading at all. */
function withoutRoom(row: Row, leading: number, limit: number | null): Verdict {
  if (leading <= 1e-9) return keptQuietly(row, 'The site is not leading in this state.', leading, limit);
  const failed = judged({ ...row, value: leading, limit: 1e-9 });
  return { ...failed, limit: 0, margin: -1, mend: 'Switch steps off in this state.' };
}

function exported(row: Row, inflow: Inflow): Verdict {
  const flow = inflow.kW < 0 ? 'exports active power' : 'is an export case';
  return unknown(
    row,
    `the site ${flow} with ${figure(Math.abs(inflow.kvar))} kvar ${direction(inflow.kvar)}; the tariff's rule for this quadrant decides`,
    inflow.displacementPF,
  );
}
