import type { PointerEvent as ReactPointerEvent } from 'react';
import { type TrayKind, trayNames } from '../gestures/TrayKind.ts';
import { SymbolGlyph } from '../glyphs/SymbolGlyph.tsx';
import { symbolPaths } from '../symbols/symbolShape.ts';
import { type TrayEntry, trayEntries } from './trayEntries.ts';
import { useTrayDrag } from './useTrayDrag.ts';

export interface TrayProps {
  armedKind: TrayKind | null;
  onArm(kind: TrayKind | null): void;
}

/**
 * The column of symbols. A part is dragged onto the drawing, or armed (Enter, or a plain click) and then
 * dropped on the busbar chosen there.
 */
export function Tray({ armedKind, onArm }: TrayProps) {
  const { ghost, press } = useTrayDrag(armedKind, onArm);
  const arm = (kind: TrayKind) => onArm(armedKind === kind ? null : kind);
  return (
    <nav className="tray" aria-label="Tray of parts" data-drawing-tray="">
      {trayEntries.map((entry) => (
        <TrayRow key={entry.name} entry={entry} armedKind={armedKind} onPress={press} onArm={arm} />
      ))}
      {ghost && (
        <div className="tray-ghost" style={{ left: ghost.x, top: ghost.y }}>
          <TraySymbol kind={ghost.kind} />
        </div>
      )}
    </nav>
  );
}

interface TrayRowProps {
  entry: TrayEntry;
  armedKind: TrayKind | null;
  onPress(kind: TrayKind, event: ReactPointerEvent): void;
  onArm(kind: TrayKind): void;
}

/** One symbol; an entry of two places has a button for each under its name. */
function TrayRow({ entry, armedKind, onPress, onArm }: TrayRowProps) {
  const [first, ...more] = entry.kinds;
  const buttonProps = (kind: TrayKind) => ({
    type: 'button' as const,
    title: entry.model,
    'data-tray': kind,
    'aria-pressed': armedKind === kind,
    onPointerDown: (event: ReactPointerEvent) => onPress(kind, event),
    // A pointer arms by its press; a click without one is the keyboard's.
    onClick: (event: { detail: number }) => event.detail === 0 && onArm(kind),
  });
  return (
    <div className="tray-row">
      <button className="tray-item" {...buttonProps(first)}>
        <TraySymbol kind={first} />
        <span>{more.length > 0 ? trayNames[first] : entry.name}</span>
      </button>
      {more.map((kind) => (
        <button key={kind} className="tray-item" {...buttonProps(kind)}>
          <span>{trayNames[kind].replace('R-L-C, ', '')}</span>
        </button>
      ))}
    </div>
  );
}

function TraySymbol({ kind }: { kind: TrayKind }) {
  return (
    <svg width={40} height={36} viewBox="-30 -27 60 54" aria-hidden="true">
      {kind === 'bus' ? (
        <path d="M-24,0 H24" stroke="currentColor" strokeWidth={4} strokeLinecap="round" />
      ) : (
        <SymbolGlyph shape={symbolPaths(kind)} ink="currentColor" strokePx={1.8} />
      )}
    </svg>
  );
}
