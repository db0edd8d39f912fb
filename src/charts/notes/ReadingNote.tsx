import { type HTMLAttributes, memo, useMemo, useState } from 'react';
import type { LitPhasor } from '../phasor/PhasorDrawing.tsx';
import { PhasorTable, PhasorView } from '../phasor/PhasorView.tsx';
import { phasorsAt, reversedSpectrum } from '../phasor/phasorSpectrum.ts';
import { SpectrumView } from '../spectrum/SpectrumView.tsx';
import { spectrumBars } from '../spectrum/spectrumBars.ts';
import { WaveformView } from '../waveform/WaveformView.tsx';
import type { WaveSettings } from '../waveform/waveModel.ts';
import { cardNumbers, headNumber, type ReadingFace } from './cardNumbers.ts';
import { NoteFrame, type NoteHandlers, type NoteState } from './NoteFrame.tsx';
import { pinKey } from './noteLetters.ts';
import { readingText } from './noteText.ts';
import type { Reading } from './Reading.ts';
import { NumberParts, ReadingNumbers } from './ReadingNumbers.tsx';
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
  /** Which picture the card shows. */
  face: ReadingFace;
  /** A phasor is pointed at: its part may be lit on the drawing. */
  onLit?: ((lit: LitPhasor | null) => void) | undefined;
}

const SMALL_WAVE: WaveSettings = { content: 'all', periods: 1, phases: 'L1' };
const LENS_WAVE: WaveSettings = { content: 'all', periods: 1, phases: 'all' };

/** One pinned quantity: phasors, waveform or spectrum and its numbers; as a line, a card or a lens. */
export const ReadingNote = memo(function ReadingNote(props: ReadingNoteProps) {
  const { reading, letter } = props;
  const numbers = useMemo(() => readingNumbers(reading), [reading]);
  const head = headNumber(numbers);
  return (
    <NoteFrame
      {...props}
      noteKey={pinKey(reading.pin)}
      className={props.dropMark ? `reading ${props.dropMark}` : 'reading'}
      title={reading.title}
      figure={
        head && (
          <span title={head.formula}>
            <NumberParts number={{ ...head, words: undefined }} />
          </span>
        )
      }
      lit={props.lit ?? false}
      tabStop={props.tabStop ?? true}
      text={() => readingText(reading, letter)}
    >
      {reading.absent ? (
        <p className="chart-hint">{reading.absent}</p>
      ) : (
        <ReadingBody {...props} numbers={numbers} />
      )}
    </NoteFrame>
  );
});

interface ReadingBodyProps extends ReadingNoteProps {
  numbers: readonly ReadingNumber[];
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
  const voltageNow = reading.voltage && phasorsAt(reading.voltage, order);
  const currentNow = current && phasorsAt(current, order);
  const magnitudesOnly = reading.summation === 'alpha' && order > 1;
  const course = (
    <div className="reading-course">
      <PhasorView
        voltage={voltageNow}
        current={currentNow}
        order={order}
        size={size}
        timeTurn={timeTurn}
        anglesUnknown={size === 'lens' && (reading.anglesUnknown[order - 1] ?? false)}
        magnitudesOnly={magnitudesOnly}
        names={reading.phaseNames}
        lit={lit}
        onLit={showLit}
      />
      <WaveformView
        voltage={reading.voltage}
        current={current}
        frequencyHz={reading.frequencyHz}
        maxOrder={reading.maxOrder}
        summation={reading.summation}
        names={reading.phaseNames}
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
  if (size === 'small') {
    return (
      <>
        {face === 'course' ? course : <ReadingSpectrum {...props} size={size} />}
        <ReadingNumbers numbers={cardNumbers(reading, numbers, face)} />
      </>
    );
  }
  return (
    <>
      {course}
      <div className="reading-details">
        <div>
          {!magnitudesOnly && (
            <PhasorTable voltage={voltageNow} current={currentNow} names={reading.phaseNames} />
          )}
          <ReadingNumbers numbers={numbers} />
        </div>
        <ReadingSpectrum {...props} size={size} />
      </div>
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
