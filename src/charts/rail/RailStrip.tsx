import type { ReactNode } from 'react';
import { FigureMenu } from '../figure/FigureMenu.tsx';
import { FoldMark } from '../figure/FoldMark.tsx';
import type { PictureWay } from '../notes/noteActions.ts';
import type { RailScan } from './railModel.ts';

interface RailStripProps {
  busName: string;
  scan: RailScan | null;
  summation: 'phasor' | 'alpha';
  sequence: 'positive' | 'zero';
  stale: boolean;
  band?: unknown;
  thinWords?: string;
  zoomed: boolean;
  folded?: boolean;
  /** The handle's words, where the strip stands alone. */
  children?: ReactNode;
  onPickBus?(): void;
  onZoom(factor: number): void;
  onReset(): void;
  /** Opens the entry of an order or frequency. */
  onEntry(): void;
  onFold?(folded: boolean): void;
  /** Hands the landscape on as a picture, or its numbers. */
  onPicture?: ((way: PictureWay) => void) | undefined;
}

/** The thin line above the rail: which busbar, which sequence and summation, what each curve is. */
export function RailStrip(props: RailStripProps) {
  const { busName, onPickBus } = props;
  return (
    <div className="rail-strip">
      {onPickBus ? (
        <button type="button" className="rail-bus" onClick={onPickBus}>
          {busName} <span aria-hidden="true">▾</span>
        </button>
      ) : (
        <strong className="rail-bus">{busName}</strong>
      )}
      {props.children}
      <span className="rail-words">{stripWords(props)}</span>
      {props.stale && (
        <span className="rail-state" role="status">
          recalculating: shown as before the last change
        </span>
      )}
      <RailTools {...props} />
    </div>
  );
}

function RailTools(props: RailStripProps) {
  const { zoomed, folded, onZoom, onReset, onEntry, onFold, onPicture } = props;
  return (
    <span className="rail-tools">
      <button
        type="button"
        title="7.2, h 7.2, 350 Hz or 0.35 kHz; on the rail a digit opens it"
        onClick={onEntry}
      >
        order or Hz…
      </button>
      {!folded && (
        <>
          <button type="button" aria-label="Widen the axis about the handle" onClick={() => onZoom(0.6)}>
            +
          </button>
          <button type="button" aria-label="Show more of the axis" onClick={() => onZoom(1 / 0.6)}>
            −
          </button>
          <button type="button" disabled={!zoomed} onClick={onReset}>
            whole axis
          </button>
          {onPicture && <FigureMenu name="the rail" onPicture={onPicture} />}
        </>
      )}
      {onFold && (
        <button
          type="button"
          className="fold"
          aria-label={folded ? 'Open the rail' : 'Fold the rail to its strip'}
          onClick={() => onFold(!folded)}
        >
          <FoldMark way={folded ? 'up' : 'down'} />
        </button>
      )}
    </span>
  );
}

/** "impedance seen, positive sequence · phasor summation · thin: without correction". */
export function stripWords(
  props: Pick<RailStripProps, 'scan' | 'summation' | 'sequence' | 'band' | 'thinWords'>,
): string {
  const problem = props.scan?.with.error;
  if (problem) return `no impedance to show: ${problem}`;
  if (!props.scan) return 'no impedance to show yet';
  const summation = props.summation === 'alpha' ? 'IEC 61000-3-6 summation' : 'phasor summation';
  const parts = [`impedance seen, ${props.sequence} sequence`, summation];
  if (props.band) parts.push('band: all states and tolerances');
  parts.push(`thin: ${props.thinWords ?? 'without correction'}`);
  return parts.join(' · ');
}
