import { useMemo } from 'react';
import type { ImpedanceScan } from '../../engine/index.ts';
import { SCREEN_STYLE } from '../figure/figureInk.ts';
import { useMeasuredWidth } from '../figure/useMeasuredWidth.ts';
import { RailAxis } from './RailLandscape.tsx';
import { railLayout } from './railLayout.ts';
import { fullDomain, type RailModel, railModel } from './railModel.ts';

export interface PairedCurve {
  name: string;
  scan: ImpedanceScan;
}

export interface ImpedancePairProps {
  a: PairedCurve;
  b: PairedCurve;
  frequencyHz: number;
  maxOrder: number;
  height: number;
}

const dashes = { a: undefined, b: '6 4' } as const;

/** |Z| of one busbar in two states on one axis: the first drawn through, the second dashed, peaks by letter. */
export function ImpedancePair({ a, b, frequencyHz, maxOrder, height }: ImpedancePairProps) {
  const [frame, width] = useMeasuredWidth<HTMLElement>(420);
  const model = useMemo(() => {
    const scan = { with: a.scan, without: b.scan };
    const layout = railLayout(width, height, SCREEN_STYLE.smallSize);
    return railModel(
      { scan, frequencyHz, injected: [] },
      fullDomain(scan, frequencyHz, maxOrder),
      layout,
      SCREEN_STYLE,
    );
  }, [a.scan, b.scan, frequencyHz, maxOrder, width, height]);
  return (
    <figure ref={frame} className="impedance-pair">
      <svg
        width={width}
        height={height}
        role="img"
        aria-label={`Impedance over order: ${pairWords(a)}; ${pairWords(b)}`}
      >
        <RailAxis model={model} style={SCREEN_STYLE} />
        <Curve model={model} letter="b" path={model.withoutPath} scan={b.scan} />
        <Curve model={model} letter="a" path={model.withPath} scan={a.scan} />
      </svg>
      <figcaption>
        <Legend letter="a" curve={a} />
        <Legend letter="b" curve={b} />
      </figcaption>
    </figure>
  );
}

function peaksOf({ resonances }: ImpedanceScan) {
  return resonances
    .filter(({ kind }) => kind === 'parallel')
    .toSorted((one, other) => one.order - other.order);
}

function peakText(scan: ImpedanceScan): string {
  const peaks = peaksOf(scan);
  if (peaks.length === 0) return 'no parallel resonance';
  const told = peaks
    .slice(0, 3)
    .map(({ order, q }) => `h ${order.toFixed(2)}${q === null ? '' : `, Q ${q.toFixed(q < 10 ? 1 : 0)}`}`);
  return `parallel ${told.join('; ')}${peaks.length > 3 ? ` and ${peaks.length - 3} more` : ''}`;
}

const pairWords = ({ name, scan }: PairedCurve): string => `${name}, ${peakText(scan)}`;

interface CurveProps {
  model: RailModel;
  letter: 'a' | 'b';
  path: string | null;
  scan: ImpedanceScan;
}

function Curve({ model, letter, path, scan }: CurveProps) {
  const { axis, ohm, layout } = model;
  if (!path || !ohm) return null;
  return (
    <g>
      <path
        d={path}
        fill="none"
        stroke="var(--ink)"
        strokeWidth={letter === 'a' ? 2 : 1.5}
        strokeDasharray={dashes[letter]}
      />
      {peaksOf(scan).map(({ order, ohm: size }) => (
        <text
          key={order}
          x={axis.x(order)}
          y={Math.max(layout.top + 10, ohm.y(size) - 5)}
          dx={letter === 'a' ? -5 : 5}
          textAnchor={letter === 'a' ? 'end' : 'start'}
          fontSize={SCREEN_STYLE.textSize}
          fontWeight={600}
          fill="var(--ink)"
        >
          {letter.toUpperCase()}
        </text>
      ))}
    </g>
  );
}

function Legend({ letter, curve }: { letter: 'a' | 'b'; curve: PairedCurve }) {
  return (
    <span className="pair-legend">
      <svg width="34" height="10" aria-hidden="true">
        <path
          d="M1 5H33"
          stroke="var(--ink)"
          strokeWidth={letter === 'a' ? 2 : 1.5}
          strokeDasharray={dashes[letter]}
        />
      </svg>
      <b>{letter.toUpperCase()}</b> {curve.name} <span className="quiet">{peakText(curve.scan)}</span>
    </span>
  );
}
