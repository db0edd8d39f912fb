import { FoldMark } from '../../charts/index.ts';
import { Tray, type TrayKind } from '../../drawing/index.ts';
import type { SymbolSet } from '../../study/index.ts';
import type { PanelPlaces } from './panelPlaces.ts';
import { setPanels } from './panelStore.ts';

interface Props {
  place: PanelPlaces['tray'];
  symbols: SymbolSet;
  armedKind: TrayKind | null;
  onArm(kind: TrayKind | null): void;
}

/** The tray with or without words under its symbols, and the button that changes it. */
export function TrayPanel({ place, symbols, armedKind, onArm }: Props) {
  const words = place.show === 'words';
  return (
    <div className="tray-panel" data-show={place.show} data-columns={place.columns}>
      <Tray armedKind={armedKind} onArm={onArm} symbols={symbols} />
      <button
        type="button"
        className="fold"
        aria-label={words ? 'Tray: symbols alone' : 'Tray: words under the symbols'}
        onClick={() => setPanels({ tray: words ? 'symbols' : 'words' })}
      >
        <FoldMark way={words ? 'left' : 'right'} />
      </button>
    </div>
  );
}
