import { elementById, type Study } from '../../study/index.ts';
import type { Held } from '../gestures/dropPlan.ts';
import type { Hand } from '../gestures/useGestures.ts';
import { SymbolGlyph } from '../glyphs/SymbolGlyph.tsx';
import type { Layout } from '../layout/index.ts';
import { symbolPaths } from '../symbols/symbolShape.ts';

export interface HandOverlayProps {
  hand: Hand;
  layout: Layout;
  study: Study;
}

function heldShape(held: Held, study: Study) {
  if (held.what === 'new') return held.kind === 'bus' ? undefined : symbolPaths(held.kind);
  const part = elementById(study, held.id);
  return held.what === 'part' && part ? symbolPaths(part.kind, part) : undefined;
}

/** What is in the hand, in drawing px: its symbol at the pointer, where it would stand, a line for an end. */
export function HandOverlay({ hand, layout, study }: HandOverlayProps) {
  const { held, at, plan } = hand;
  const shape = heldShape(held, study);
  const bar = layout.buses.find((bus) => bus.id === plan.bus);
  const place = held.what === 'end' ? layout.parts.find((part) => part.id === held.id) : undefined;
  return (
    <g className="hand">
      {bar && plan.markX !== undefined && (
        <path className="mark" d={`M${plan.markX},${bar.y} v22 m-5,-5 l5,5 l5,-5`} />
      )}
      {place && <path className="mark" d={`M${place.x},${place.y} L${at.x},${at.y}`} />}
      {place && <circle className="handle" cx={at.x} cy={at.y} r={6} />}
      {shape && (
        <g transform={`translate(${at.x} ${at.y})`} opacity={0.85}>
          <SymbolGlyph shape={shape} ink="var(--accent)" strokePx={2} />
        </g>
      )}
    </g>
  );
}
