import { measures } from '../layout/index.ts';
import type { Palette } from './Palette.ts';

export interface PhasorDialProps {
  /** L1 L2 L3, 1 is the ring. */
  phasors: [number, number][] | null;
  x: number;
  y: number;
  palette: Palette;
}

const RADIUS = measures.DIAL_RADIUS;
const PHASES = [
  { phase: 'L1', dash: undefined },
  { phase: 'L2', dash: '4 2' },
  { phase: 'L3', dash: '1.5 1.5' },
];

/** Three-phase voltages of a busbar: L1 solid, L2 dashed, L3 dotted; angle 0 to the right, turning left. */
export function PhasorDial({ phasors, x, y, palette }: PhasorDialProps) {
  return (
    <g transform={`translate(${x} ${y})`} fill="none">
      <circle r={RADIUS} stroke={palette.hairline} fill={palette.sheet} />
      {PHASES.map(({ phase, dash }, at) => {
        const [re, im] = phasors?.[at] ?? [0, 0];
        const length = Math.min(Math.hypot(re, im), 1.12) || 0;
        const angle = Math.atan2(im, re);
        const [px, py] = [
          length * (RADIUS - 2.5) * Math.cos(angle),
          -length * (RADIUS - 2.5) * Math.sin(angle),
        ];
        return (
          <line
            key={phase}
            x2={px.toFixed(2)}
            y2={py.toFixed(2)}
            stroke={palette.phases[at] ?? palette.ink}
            strokeWidth={1.5}
            strokeDasharray={dash}
          />
        );
      })}
    </g>
  );
}
