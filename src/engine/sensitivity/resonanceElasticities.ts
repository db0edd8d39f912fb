import type Complex from 'complex.js';
import type { Study } from '../../study/index.ts';
import { DrivingPoint, type DrivingPointAt, type Varied } from './DrivingPoint.ts';

export interface ResonanceElasticity {
  element: string;
  /** Field of the part; "kvar" of a bank is the total of the steps that are on. */
  field: string;
  value: number;
  /** ∂ln h₀/∂ln(field): per cent of the resonant order for one per cent of the field. */
  elasticity: number;
}

export interface ResonanceElasticities {
  /** The resonance's order h₀ and |Z| there, ohms; absent with `error`. */
  order?: number;
  ohm?: number;
  /** Largest effect first, ties in study order. */
  parameters: ResonanceElasticity[];
  error?: string;
}

/**
 * What moves a resonance: elasticities of the order h₀ of an extremum of |Z(h)|, exact by implicit
 * differentiation of g(h, p) = ½·∂|Z|²/∂h = Re(Z*·Z_h) = 0:
 *   dh₀/dp = −g_p/g_h,  g_h = |Z_h|² + Re(Z*·Z_hh),  g_p = Re(Z_p*·Z_h + Z*·Z_hp).
 * `order` (and `kind`, told from the curvature when absent) is the resonance as a scan reports it; Newton's
 * method settles its last digits. An order with no such extremum within 1 % is answered with `error`.
 */
export function resonanceElasticities(
  study: Study,
  caseId: string,
  at: DrivingPointAt & { order: number; kind?: 'parallel' | 'series' },
): ResonanceElasticities {
  if (!(at.order > 0)) throw new RangeError(`order ${at.order} must be above 0`);
  const point = new DrivingPoint(study, caseId, at);
  if (point.fault) return { parameters: [], error: point.fault };
  const found = settle(point, at.order, at.kind);
  if (!found) return { parameters: [], error: `|Z| has no extremum near order ${at.order}` };
  const { h, z, first, curvature } = found;
  const parameters = point.varied().map((varied) => {
    const shift = -slopeBy(point, varied, z, first) / curvature;
    const { element, field, value } = varied;
    return { element, field, value, elasticity: (value * shift) / h };
  });
  parameters.sort((a, b) => Math.abs(b.elasticity) - Math.abs(a.elasticity));
  return { order: h, ohm: z.abs(), parameters };
}

interface Extremum {
  h: number;
  z: Complex;
  first: Complex;
  curvature: number;
}

/**
 * Newton's method for the extremum nearby: on |Z|² for a series resonance, on 1/|Z|² for a parallel one,
 * whose neighbourhood is a parabola over many bandwidths (|Z|² itself turns its curvature half a bandwidth
 * away from the peak). Undefined when it leaves 1 % of the start or ends at the other kind.
 */
function settle(point: DrivingPoint, start: number, kind?: 'parallel' | 'series'): Extremum | undefined {
  let h = start;
  let wanted = kind;
  for (let round = 0; round < 16; round++) {
    const z = point.impedance(h);
    const { first, second } = point.differentiate();
    const curvature = first.re ** 2 + first.im ** 2 + real(z, second);
    wanted ??= curvature < 0 ? 'parallel' : 'series';
    const slope = real(z, first);
    const bend = wanted === 'series' ? curvature : curvature - (4 * slope * slope) / real(z, z);
    const step = -slope / bend;
    if (Math.abs(step) < 1e-9 * h)
      return curvature < 0 === (wanted === 'parallel') ? { h, z, first, curvature } : undefined;
    h += step;
    if (!(Math.abs(h - start) < 0.01 * start)) return undefined;
  }
  return undefined;
}

/** g_p = Re(Z_p*·Z_h + Z*·Z_hp). */
function slopeBy(point: DrivingPoint, varied: Varied, z: Complex, first: Complex): number {
  return real(point.byParameter(varied), first) + real(z, point.byOrderAndParameter(varied));
}

/** Re(a*·b). */
function real(a: Complex, b: Complex): number {
  return a.re * b.re + a.im * b.im;
}
