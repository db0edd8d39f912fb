import type { PointerEvent as ReactPointerEvent } from 'react';
import type { SymbolSet } from '../../study/index.ts';
import { type TrayKind, trayNames } from '../gestures/TrayKind.ts';
import { SymbolGlyph } from '../glyphs/SymbolGlyph.tsx';
import { aroundKey, kindKeys } from '../keyboard/kindKeys.ts';
import { symbolPaths } from '../symbols/symbolShape.ts';
import { trayEntries } from './trayEntries.ts';
import { useTrayDrag } from './useTrayDrag.ts';
import { useTrayStops } from './useTrayStops.ts';

export interface TrayProps {
  armedKind: TrayKind | null;
  /** The standard the symbols follow. */
  symbols?: SymbolSet;
  onArm(kind: TrayKind | null): void;
}

/**
 * The column of symbols. A part is dragged onto the drawing, or armed (Enter, or a plain click) and then
 * dropped on the busbar chosen there.
 */
export function Tray({ armedKind, symbols, onArm }: TrayProps) {
  const { ghost, press } = useTrayDrag(armedKind, onArm);
  const { list, stop, setStop, onKeyDown } = useTrayStops();
  const arm = (kind: TrayKind) => onArm(armedKind === kind ? null : kind);
  return (
    <div
      ref={list}
      className="tray"
      role="toolbar"
      aria-orientation="vertical"
      aria-label="Tray of parts"
      data-drawing-tray=""
      onKeyDown={onKeyDown}
    >
      {trayEntries.map((entry) => (
        <div key={entry.name} className="tray-row">
          {entry.kinds.map((kind, at) => (
            <TrayItem
              key={kind}
              kind={kind}
              model={entry.model}
              name={at === 0 ? trayNames[kind] : trayNames[kind].replace('R-L-C, ', '')}
              symbol={at === 0}
              symbols={symbols}
              armed={armedKind === kind}
              stop={stop === kind}
              onPress={press}
              onArm={arm}
              onFocus={setStop}
            />
          ))}
        </div>
      ))}
      {ghost && (
        <div className="tray-ghost" style={{ left: ghost.x, top: ghost.y }}>
          <TraySymbol kind={ghost.kind} symbols={symbols} />
        </div>
      )}
    </div>
  );
}

interface TrayItemProps {
  kind: TrayKind;
  name: string;
  model: string;
  /** Shows its symbol also where words stand under the symbols. */
  symbol: boolean;
  symbols: SymbolSet | undefined;
  armed: boolean;
  /** Holds the tray's one tab stop. */
  stop: boolean;
  onPress(kind: TrayKind, event: ReactPointerEvent): void;
  onArm(kind: TrayKind): void;
  onFocus(kind: TrayKind): void;
}

/** A kind with its symbol; its letter on the drawing is underlined in its name. */
function TrayItem({
  kind,
  name,
  model,
  symbol,
  symbols,
  armed,
  stop,
  onPress,
  onArm,
  onFocus,
}: TrayItemProps) {
  const [before, letter, after] = aroundKey(kind, name);
  return (
    <button
      type="button"
      className={symbol ? 'tray-item' : 'tray-item tray-further'}
      title={`${model}\n${kindKeys[kind]} on the drawing adds it to the busbar in focus`}
      data-tray={kind}
      tabIndex={stop ? 0 : -1}
      aria-pressed={armed}
      aria-keyshortcuts={kindKeys[kind]}
      onPointerDown={(event) => onPress(kind, event)}
      // A pointer arms by its press; a click without one is the keyboard's.
      onClick={(event) => event.detail === 0 && onArm(kind)}
      onFocus={() => onFocus(kind)}
    >
      <TraySymbol kind={kind} symbols={symbols} />
      <span>
        {before}
        <span className="tray-letter">{letter}</span>
        {after}
      </span>
    </button>
  );
}

function TraySymbol({ kind, symbols }: { kind: TrayKind; symbols: SymbolSet | undefined }) {
  return (
    <svg width={40} height={36} viewBox="-30 -27 60 54" aria-hidden="true">
      {kind === 'bus' ? (
        <path d="M-24,0 H24" stroke="currentColor" strokeWidth={4} strokeLinecap="round" />
      ) : (
        <SymbolGlyph shape={symbolPaths(kind, undefined, symbols)} ink="currentColor" strokePx={1.8} />
      )}
    </svg>
  );
}
