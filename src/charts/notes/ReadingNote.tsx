import { type HTMLAttributes, memo, useMemo, useState } from 'react';
import { joinParts } from '../figure/quantityParts.ts';
import type { LitPhasor } from '../phasor/PhasorDrawing.tsx';
import { PhasorView } from '../phasor/PhasorView.tsx';
import { phasorsAt, reversedSpectrum } from '../phasor/phasorSpectrum.ts';
import { SpectrumView } from '../spectrum/SpectrumView.tsx';
import { spectrumBars } from '../spectrum/spectrumBars.ts';
import { WaveformView } from '../waveform/WaveformView.tsx';
import type { WaveSettings } from '../waveform/waveModel.ts';
import { NoteFrame, type NoteHandlers, type NoteState } from './NoteFrame.tsx';
import { pinKey } from './noteLetters.ts';
import { readingText } from './noteText.ts';
import type { Reading } from './Reading.ts';
import { ReadingNumbers } from './ReadingNumbers.tsx';
import { type ReadingNumber, readingNumbers, worstThd } from './readingNumbers.ts';

export interface ReadingNoteProps extends NoteHandlers {
  reading: Reading;
  letter: string;
  state: NoteState;
  lit?: boolean;
  tabStop?: boolean;
  /** Drawn as being dragged, or as the place where a dragged note would land. */
  dropMark?: 'dragged' | 'drop-before' | 'drop-after' | undefined;
  drag?: HTMLAttributes<HTMLButtonElement> | undefined;
  /** The rail's order. */
  order: number;
  /** Shared time cursor, 0…1 of a fundamental period. */
  timeTurn: number;
  onOrder?: ((order: number) => void) | undefined;
  onTimeTurn?: ((timeTurn: number) => void) | undefined;
  onWiden?: (() => void) | undefined;
  onUnpin?: (() => void) | undefined;
  /** A phasor is pointed at: its part may be lit on the drawing. */
  onLit?: ((lit: LitPhasor | null) => void) | undefined;
}

const SMALL_WAVE: WaveSettings = { content: 'all', periods: 1, phases: 'L1' };
const LENS_WAVE: WaveSettings = { content: 'all', periods: 1, phases: 'all' };

/** One pinned quantity: phasors, waveform or spectrum and its numbers; as a line, a card or a lens. */
export const ReadingNote = memo(function ReadingNote(props: ReadingNoteProps) {
  const { reading, letter, state } = props;
  const numbers = useMemo(() => readingNumbers(reading), [reading]);
  const [face, setFace] = useState<'course' | 'spectrum'>(
    reading.pin.quantity === 'voltage' ? 'spectrum' : 'course',
  );
  const other = face === 'course' ? 'spectrum' : 'course';
  return (
    <NoteFrame
      {...props}
      noteKey={pinKey(reading.pin)}
      className={props.dropMark ? `reading ${props.dropMark}` : 'reading'}
      title={state === 'line' ? lineTitle(reading, numbers) : reading.title}
      lit={props.lit ?? false}
      tabStop={props.tabStop ?? true}
      text={() => readingText(reading, letter)}
      actions={
        <>
          {state === 'card' && (
            <button type="button" onClick={() => setFace(other)}>
              {other === 'course' ? 'phasors' : 'spectrum'}
            </button>
          )}
          {props.onWiden && (
            <button type="button" aria-pressed={state === 'lens'} onClick={props.onWiden}>
              {state === 'lens' ? 'narrow' : 'widen'}
            </button>
          )}
          {props.onUnpin && (
            <button type="button" title="Take this reading off the column (Delete)" onClick={props.onUnpin}>
              unpin
            </button>
          )}
        </>
      }
    >
      {reading.absent ? (
        <p className="chart-hint">{reading.absent}</p>
      ) : (
        <ReadingBody {...props} numbers={numbers} face={face} />
      )}
    </NoteFrame>
  );
});

/** Title and the one number a folded note shows. */
function lineTitle(reading: Reading, numbers: readonly ReadingNumber[]): string {
  const first = numbers.find((one) => one.label === 'I' || one.label === 'U');
  return first ? `${reading.title} · ${joinParts(first.parts)}` : reading.title;
}

interface ReadingBodyProps extends ReadingNoteProps {
  numbers: readonly ReadingNumber[];
  face: 'course' | 'spectrum';
}

function ReadingBody(props: ReadingBodyProps) {
  const { reading, state, numbers, face, timeTurn } = props;
  const [lensWave, setLensWave] = useState(LENS_WAVE);
  const [lit, setLit] = useState<LitPhasor | null>(null);
  const current = useMemo(
    () => (reading.current && reading.reversed ? reversedSpectrum(reading.current) : reading.current),
    [reading.current, reading.reversed],
  );
  const size = state === 'lens' ? 'lens' : 'small';
  const order = phasorOrder(props.order, reading.maxOrder);
  const showLit = (next: LitPhasor | null) => {
    setLit(next);
    props.onLit?.(next);
  };
  const course = (
    <div className="reading-course">
      <PhasorView
        voltage={reading.voltage && phasorsAt(reading.voltage, order)}
        current={current && phasorsAt(current, order)}
        order={order}
        size={size}
        timeTurn={timeTurn}
        anglesUnknown={size === 'lens' && (reading.anglesUnknown[order - 1] ?? false)}
        magnitudesOnly={reading.summation === 'alpha' && order > 1}
        lit={lit}
        onLit={showLit}
      />
      <WaveformView
        voltage={reading.voltage}
        current={current}
        frequencyHz={reading.frequencyHz}
        maxOrder={reading.maxOrder}
        summation={reading.summation}
        anglesUnknown={reading.anglesUnknown.some(Boolean)}
        settings={size === 'lens' ? lensWave : SMALL_WAVE}
        size={size}
        timeTurn={timeTurn}
        lit={size === 'lens' ? lit : null}
        {...(props.onTimeTurn ? { onTimeTurn: props.onTimeTurn } : {})}
        {...(size === 'lens' ? { onSettings: setLensWave } : {})}
      />
    </div>
  );
  return (
    <>
      {(size === 'lens' || face === 'course') && course}
      {(size === 'lens' || face === 'spectrum') && <ReadingSpectrum {...props} size={size} />}
      <ReadingNumbers numbers={numbers} />
    </>
  );
}

/** Phasors follow the rail where it stands on a whole order, else they show the fundamental. */
function phasorOrder(order: number, maxOrder: number): number {
  return Number.isInteger(order) && order >= 1 && order <= maxOrder ? order : 1;
}

function ReadingSpectrum(props: ReadingBodyProps & { size: 'small' | 'lens' }) {
  const { reading, size } = props;
  const { judged, maxOrder, limits, demandCurrentA } = reading;
  const bars = useMemo(
    () => (judged ? spectrumBars(judged, maxOrder, limits ?? [], demandCurrentA) : null),
    [judged, maxOrder, limits, demandCurrentA],
  );
  const thd = reading.pin.quantity === 'voltage' ? reading.bus?.thdPercent : reading.terminal?.thdPercent;
  return (
    <SpectrumView
      quantity={reading.pin.quantity}
      bars={bars}
      thdPercent={worstThd(thd ?? [])}
      maxOrder={maxOrder}
      order={props.order}
      size={size}
      anglesUnknown={reading.anglesUnknown.some(Boolean)}
      {...(reading.thdLimit === undefined ? {} : { thdLimit: reading.thdLimit })}
      {...(demandCurrentA === undefined ? {} : { baseWords: 'of demand current' })}
      {...(props.onOrder ? { onOrder: props.onOrder } : {})}
    />
  );
}
