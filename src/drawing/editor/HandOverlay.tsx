import { elementById, type Study, symbolSetOf } from '../../study/index.ts';
import type { DropOutcome } from '../gestures/DropOutcome.ts';
import type { Held } from '../gestures/Held.ts';
import type { Hand } from '../gestures/useGestures.ts';
import { SymbolGlyph } from '../glyphs/SymbolGlyph.tsx';
import { type Layout, measures } from '../layout/index.ts';
import { symbolPaths } from '../symbols/symbolShape.ts';

function heldShape(held: Held, study: Study) {
  const symbols = symbolSetOf(study);
  if (held.what === 'new')
    return held.kind === 'bus' ? undefined : symbolPaths(held.kind, undefined, symbols);
  const part = held.what === 'parts' ? elementById(study, held.grip) : undefined;
  return part && symbolPaths(part.kind, part, symbols);
}

export interface HandOverlayProps {
  hand: Hand;
  layout: Layout;
  study: Study;
}

/** What is in the hand, in drawing px: its symbol at the pointer, or a line from the symbol to its free end. */
export function HandOverlay({ hand, layout, study }: HandOverlayProps) {
  const { held, at } = hand;
  const shape = heldShape(held, study);
  const place = held.what === 'end' ? layout.parts.find((part) => part.id === held.id) : undefined;
  const count = held.what === 'parts' ? held.ids.length : 1;
  return (
    <g className="hand">
      {place && <path className="lead" d={`M${place.x},${place.y} L${at.x},${at.y}`} />}
      {place && <circle className="handle" cx={at.x} cy={at.y} r={6} />}
      {held.what === 'new' && held.kind === 'bus' && (
        <path className="bar-in-hand" d={`M${at.x - 40},${at.y} h80`} />
      )}
      {shape && (
        <g transform={`translate(${at.x} ${at.y})`}>
          <circle className="in-hand" r={27} />
          <SymbolGlyph shape={shape} ink="var(--accent)" strokePx={2} />
          {count > 1 && <circle className="count" cx={21} cy={-19} r={10} />}
          {count > 1 && (
            <text className="count-number" x={21} y={-15}>
              {count}
            </text>
          )}
        </g>
      )}
    </g>
  );
}

/** Where letting go would put it: a stub from the busbar, the busbar's way there, the symbol it replaces. */
export function PlaceMark({ plan, layout }: { plan: DropOutcome; layout: Layout }) {
  const bar = layout.buses.find((bus) => bus.id === plan.bus);
  const replaced = layout.parts.find((part) => part.id === plan.replaces);
  const { mark } = plan;
  return (
    <g className="hand">
      {bar && mark && mark.x > bar.x2 && <path className="growth" d={`M${bar.x2},${bar.y} H${mark.x}`} />}
      {mark && (
        <path className="mark" d={`M${mark.x},${mark.y - 7} V${mark.y + measures.LEAD} m-5,-6 l5,6 l5,-6`} />
      )}
      {replaced && (
        <rect className="taken" x={replaced.x - 26} y={replaced.y - 32} width={52} height={64} rx={5} />
      )}
    </g>
  );
}
