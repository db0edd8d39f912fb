import { cellOf, type FigureValues } from '../figure/FigureValues.ts';
import { angleDeg, magnitude, type ThreePhasors } from './phasorSpectrum.ts';
import { PHASE_NAMES, type PhaseNames } from './phasorWords.ts';

/** rms and angle of each phase: volts phase to neutral, amperes. */
export function phasorValues(
  voltage: ThreePhasors | null,
  current: ThreePhasors | null,
  names: PhaseNames = PHASE_NAMES,
): FigureValues {
  const head = ['phase', ...(voltage ? ['U, V', 'U, °'] : []), ...(current ? ['I, A', 'I, °'] : [])];
  return [
    head,
    ...names.map((name, phase) => [
      name,
      ...[voltage?.[phase], current?.[phase]].flatMap((one) =>
        one ? [cellOf(magnitude(one)), cellOf(angleDeg(one))] : [],
      ),
    ]),
  ];
}
