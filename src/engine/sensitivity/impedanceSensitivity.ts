import type Complex from 'complex.js';
import type { Study } from '../../study/index.ts';
import { DrivingPoint, type DrivingPointAt } from './DrivingPoint.ts';

export interface ParameterSensitivity {
  element: string;
  /** Field of the part in the study's unit; "kvar" of a bank is the total of the steps that are on. */
  field: string;
  value: number;
  /** ∂Z/∂(field), ohms per unit of the field. */
  dZ: Complex;
  /** ∂ln|Z|/∂ln(field): per cent of |Z| for one per cent of the field. */
  elasticityMagnitude: number;
}

export interface ImpedanceSensitivity {
  /** Driving-point impedance, ohms per phase of the sequence; absent with `error`. */
  impedance?: Complex;
  parameters: ParameterSensitivity[];
  /** Why there is none: no source, or no zero-sequence path. */
  error?: string;
}

/**
 * What every parameter of every part in service does to the driving-point impedance Z(h) of a busbar, in
 * the harmonic model of the scans, exact by adjoint: ∂Z/∂p = −wᵀ·(∂Y/∂p)·v. In study order.
 * RangeError for an unknown busbar or case, or an order that is not above zero.
 */
export function impedanceSensitivity(
  study: Study,
  caseId: string,
  at: DrivingPointAt & { order: number },
): ImpedanceSensitivity {
  if (!(at.order > 0)) throw new RangeError(`order ${at.order} must be above 0`);
  const point = new DrivingPoint(study, caseId, at);
  if (point.fault) return { parameters: [], error: point.fault };
  const impedance = point.impedance(at.order);
  const square = impedance.re ** 2 + impedance.im ** 2;
  const parameters = point.varied().map((varied) => {
    const dZ = point.byParameter(varied);
    const along = (impedance.re * dZ.re + impedance.im * dZ.im) / square;
    const { element, field, value } = varied;
    return { element, field, value, dZ, elasticityMagnitude: value * along };
  });
  return { impedance, parameters };
}
