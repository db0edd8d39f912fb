import type { PartEnd, Point } from '../layout/index.ts';

export interface FlowArrowProps {
  /** The conductor from the busbar to the symbol. */
  end: PartEnd;
  /** The symbol's centre; the arrow is drawn around it. */
  centre: Point;
  /** Active power flows from the busbar into the part. */
  into: boolean;
  /** Width of the conductor, px. */
  width: number;
  ink: string;
  paper: string;
}

/** Length of the head, and the least half width of it. */
const LENGTH = 8;
const LEAST_HALF = 3.5;

/** A small head on the conductor that shows which way active power flows; edged so that it stands out on a wide line. */
export function FlowArrow({ end, centre, into, width, ink, paper }: FlowArrowProps) {
  const [from, to] = [end.path[0], end.path[1]];
  if (!from || !to) return null;
  const length = Math.hypot(to.x - from.x, to.y - from.y);
  if (length < LENGTH + 6) return null;
  const sign = into ? 1 : -1;
  const [ux, uy] = [(sign * (to.x - from.x)) / length, (sign * (to.y - from.y)) / length];
  const [x, y] = [(from.x + to.x) / 2 - centre.x, (from.y + to.y) / 2 - centre.y];
  const half = Math.max(LEAST_HALF, width / 2 + 2);
  const corner = (along: number, across: number) =>
    `${(x + along * ux - across * uy).toFixed(2)},${(y + along * uy + across * ux).toFixed(2)}`;
  const tip = LENGTH / 2;
  return (
    <path
      className="flow"
      d={`M${corner(tip, 0)} L${corner(-tip, half)} L${corner(-tip, -half)} Z`}
      fill={ink}
      stroke={paper}
      strokeWidth={0.75}
    />
  );
}
