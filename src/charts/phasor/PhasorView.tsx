import { SCREEN_STYLE } from '../figure/figureInk.ts';
import { ampereParts, fixedNumber, joinParts, voltParts } from '../figure/quantityParts.ts';
import { type LitPhasor, PhasorDrawing } from './PhasorDrawing.tsx';
import { phaseAngle, phaseAngleWords } from './phaseAngle.ts';
import { angleDeg, magnitude, type ThreePhasors } from './phasorSpectrum.ts';
import { PHASE_NAMES, type PhaseNames, phasorSummary } from './phasorWords.ts';

export interface PhasorViewProps {
  /** rms phase-to-neutral volts; null where there are none. */
  voltage: ThreePhasors | null;
  /** rms amperes. */
  current: ThreePhasors | null;
  /** Harmonic order shown, 1 for the fundamental. */
  order: number;
  size: 'small' | 'lens';
  /** Instant of the shared time cursor, 0…1 of a fundamental period. */
  timeTurn?: number;
  names?: PhaseNames | undefined;
  /** The angles at this order are not all known. */
  anglesUnknown?: boolean;
  /** Only magnitudes exist at this order (IEC 61000-3-6 summation); nothing can be drawn. */
  magnitudesOnly?: boolean;
  lit?: LitPhasor | null;
  onLit?(lit: LitPhasor | null): void;
}

const RADIUS = { small: 47, lens: 112 };

/** Three-phase voltage and current phasors of one order, with φ drawn and given in words. */
export function PhasorView(props: PhasorViewProps) {
  const { voltage, current, order, size, timeTurn = 0, names = PHASE_NAMES } = props;
  if (props.magnitudesOnly) {
    return (
      <p className="chart-hint">
        No phasors: under the IEC 61000-3-6 summation only magnitudes exist at h {order}.
      </p>
    );
  }
  const radius = RADIUS[size];
  const half = radius + (size === 'lens' ? 20 : 14);
  const angle = phaseAngle(voltage, current);
  const words = angle ? phaseAngleWords(angle, size === 'lens' ? 1 : 0) : null;
  return (
    <figure className={`phasor phasor-${size}`}>
      <svg
        width={half * 2}
        height={half * 2}
        viewBox={`${-half} ${-half} ${half * 2} ${half * 2}`}
        role="img"
        aria-label={phasorSummary(voltage, current, order, names)}
      >
        <PhasorDrawing
          voltage={voltage}
          current={current}
          order={order}
          timeTurn={timeTurn}
          radius={radius}
          names={names}
          style={SCREEN_STYLE}
          lit={props.lit ?? null}
          onLit={props.onLit}
        />
      </svg>
      <figcaption>
        {order !== 1 && <span className="phasor-order">h {order}</span>}
        {words && angle && (
          <span className="phasor-phi">
            {angle.phase === 0 ? '' : `${names[angle.phase]} `}
            {words}
          </span>
        )}
        {props.anglesUnknown && <span className="chart-doubt">unknown angles taken as 0</span>}
      </figcaption>
    </figure>
  );
}

interface PhasorTableProps {
  voltage: ThreePhasors | null;
  current: ThreePhasors | null;
  names?: PhaseNames | undefined;
}

/** The same phasors in numbers. */
export function PhasorTable({ voltage, current, names = PHASE_NAMES }: PhasorTableProps) {
  return (
    <table className="phasor-table">
      <thead>
        <tr>
          <th scope="col">phase</th>
          {voltage && <th scope="col">U, rms</th>}
          {voltage && <th scope="col">∠</th>}
          {current && <th scope="col">I, rms</th>}
          {current && <th scope="col">∠</th>}
        </tr>
      </thead>
      <tbody>
        {names.map((name, k) => (
          <tr key={name}>
            <th scope="row">{name}</th>
            {voltage && <td>{joinParts(voltParts(magnitude(voltage[k as 0 | 1 | 2])))}</td>}
            {voltage && <td>{fixedNumber(angleDeg(voltage[k as 0 | 1 | 2]), 1)}°</td>}
            {current && <td>{joinParts(ampereParts(magnitude(current[k as 0 | 1 | 2])))}</td>}
            {current && <td>{fixedNumber(angleDeg(current[k as 0 | 1 | 2]), 1)}°</td>}
          </tr>
        ))}
      </tbody>
    </table>
  );
}
