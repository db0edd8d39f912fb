import { modeWords, type ReadingMode } from '../readings/ReadingMode.ts';
import type { PaneControls } from '../view/usePaneView.ts';

export function ZoomTools({ controls }: { controls: PaneControls }) {
  return (
    <fieldset className="zoom-tools" aria-label="Zoom">
      <button
        type="button"
        onClick={() => controls.zoomBy(0.8)}
        aria-label="Zoom out"
        title="Ctrl + wheel, −"
      >
        −
      </button>
      <button type="button" onClick={controls.fit} aria-label="Fit the whole drawing" title="F">
        {Math.round(controls.view.scale * 100)} %
      </button>
      <button
        type="button"
        onClick={() => controls.zoomBy(1.25)}
        aria-label="Zoom in"
        title="Ctrl + wheel, +"
      >
        +
      </button>
    </fieldset>
  );
}

export interface ReadingModeChoiceProps {
  mode: ReadingMode;
  /** The integer order that the third mode reads. */
  order: number;
  onReadingMode(mode: ReadingMode): void;
}

const MODES: ReadingMode[] = ['fundamental', 'rms', 'order'];

/** Names what the readings on the drawing show, and changes it. */
export function ReadingModeChoice({ mode, order, onReadingMode }: ReadingModeChoiceProps) {
  return (
    <select
      className="reading-mode"
      aria-label="Readings on the drawing"
      value={mode}
      onChange={(event) => onReadingMode(MODES.find((m) => m === event.target.value) ?? 'fundamental')}
    >
      {MODES.map((m) => (
        <option key={m} value={m}>
          {modeWords(m, order)}
        </option>
      ))}
    </select>
  );
}
