import type { FigureStyle } from '../figure/figureInk.ts';
import { phaseAngle } from './phaseAngle.ts';
import {
  angleArc,
  arrowHead,
  openArrowHead,
  PHASE_DASHES,
  phasorScale,
  phasorTip,
} from './phasorGeometry.ts';
import { magnitude, type Phasor, type ThreePhasors } from './phasorSpectrum.ts';
import type { PhaseNames } from './phasorWords.ts';

/** A phasor that is lit: the same phase of the same quantity lights elsewhere too. */
export interface LitPhasor {
  quantity: 'voltage' | 'current';
  phase: number;
}

export interface PhasorDrawingProps {
  voltage: ThreePhasors | null;
  current: ThreePhasors | null;
  order: number;
  /** Share 0…1 of a fundamental period; order h turns h times as far. */
  timeTurn: number;
  radius: number;
  names: PhaseNames;
  style: FigureStyle;
  lit: LitPhasor | null;
  onLit?: ((lit: LitPhasor | null) => void) | undefined;
}

/** Circle, axes, voltage and current phasors and the arc of φ, about the origin of the figure. */
export function PhasorDrawing(props: PhasorDrawingProps) {
  const { voltage, current, radius, style } = props;
  const turn = props.timeTurn * props.order;
  const { ink } = style;
  const angle = phaseAngle(voltage, current);
  const from = angle ? current?.[angle.phase as 0 | 1 | 2] : undefined;
  const to = angle ? voltage?.[angle.phase as 0 | 1 | 2] : undefined;
  return (
    <g>
      <circle r={radius} fill="none" stroke={ink.hairline} strokeWidth={1} />
      <path d={`M${-radius},0H${radius}M0,${-radius}V${radius}`} stroke={ink.hairline} strokeWidth={0.75} />
      {from && to && magnitude(from) > 0 && magnitude(to) > 0 && (
        <path d={angleArc(from, to, radius * 0.36, turn)} fill="none" stroke={ink.accent} strokeWidth={1.5} />
      )}
      <PhasorGroup {...props} quantity="voltage" phasors={voltage} turn={turn} />
      <PhasorGroup {...props} quantity="current" phasors={current} turn={turn} />
      <circle r={1.8} fill={ink.ink} />
      <PhaseLabels {...props} phasors={voltage ?? current} turn={turn} />
    </g>
  );
}

interface GroupProps extends PhasorDrawingProps {
  quantity: 'voltage' | 'current';
  phasors: ThreePhasors | null;
  turn: number;
}

function PhasorGroup(props: GroupProps) {
  const { phasors, radius, quantity } = props;
  const scale = phasorScale(phasors, radius, quantity);
  if (!phasors || scale === null) return null;
  return (
    <g>
      {phasors.map((phasor, phase) => (
        <PhasorArrow key={props.names[phase]} {...props} phase={phase} phasor={phasor} scale={scale} />
      ))}
    </g>
  );
}

function PhasorArrow(props: GroupProps & { phase: number; phasor: Phasor; scale: number }) {
  const { phase, phasor, scale, turn, style, quantity, lit, onLit, radius } = props;
  const tip = phasorTip(phasor, scale, turn);
  const head = Math.max(4, radius * 0.11);
  const length = Math.hypot(tip.x, tip.y);
  if (length < 0.5) return null;
  const colour = quantity === 'voltage' ? (style.ink.phases[phase] ?? style.ink.voltage) : style.ink.current;
  const isLit = lit !== null && lit.phase === phase && lit.quantity === quantity;
  const width = (quantity === 'voltage' ? 1.5 : style.print ? 0.9 : 1.5) * (isLit ? 1.9 : 1);
  const dash = PHASE_DASHES[phase];
  const neck = quantity === 'voltage' ? 1 - Math.min(1, (head * 0.8) / length) : 1;
  return (
    <g
      opacity={lit !== null && !isLit ? 0.45 : 1}
      {...(onLit
        ? { onPointerEnter: () => onLit({ quantity, phase }), onPointerLeave: () => onLit(null) }
        : {})}
    >
      <line
        x2={tip.x * neck}
        y2={tip.y * neck}
        stroke={colour}
        strokeWidth={width}
        {...(dash ? { strokeDasharray: dash } : {})}
      />
      {quantity === 'voltage' ? (
        <path d={arrowHead(tip, head)} fill={colour} />
      ) : (
        <path
          d={openArrowHead(tip, head)}
          fill="none"
          stroke={colour}
          strokeWidth={width}
          strokeLinejoin="round"
        />
      )}
      {onLit && <line x2={tip.x} y2={tip.y} stroke="transparent" strokeWidth={9} />}
    </g>
  );
}

function PhaseLabels(props: PhasorDrawingProps & { phasors: ThreePhasors | null; turn: number }) {
  const { phasors, turn, radius, style, names } = props;
  const largest = phasors ? Math.max(...phasors.map(magnitude)) : 0;
  if (!phasors || !(largest > 0)) return null;
  const away = radius + style.smallSize * 0.85;
  return (
    <g fill={style.ink.ink2} fontSize={style.smallSize} textAnchor="middle">
      {phasors.map((phasor, phase) => {
        if (magnitude(phasor) < 0.02 * largest) return null;
        const place = phasorTip(phasor, away / magnitude(phasor), turn);
        return (
          <text key={names[phase]} x={place.x} y={place.y + style.smallSize * 0.35}>
            {names[phase]}
          </text>
        );
      })}
    </g>
  );
}
