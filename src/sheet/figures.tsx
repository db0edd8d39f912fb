import {
  PhasorFigure,
  PRINT_INK,
  phaseInk,
  phasorsAt,
  RailFigure,
  SpectrumFigure,
  spectrumBars,
  WaveformFigure,
} from '../charts/index.ts';
import { orderTable } from '../checks/index.ts';
import { drawingSize, layoutStudy, printPalette, StaticDrawing } from '../drawing/index.ts';
import type { ImpedanceScan } from '../engine/index.ts';
import { type Pin, phaseColoursOf, phaseNamesOf, studyInCase } from '../study/index.ts';
import type { DrawingWindow, FigureRequest, SheetCase, SheetInput } from './document/index.ts';
import type { FigureComposer } from './FigureComposer.ts';
import { type PinSpectra, phasesToDraw, pinSpectra } from './pinSpectra.ts';

const FAMILY = 'Varwright Sans';
/** Letter height of figures in points; axis text is one point smaller. */
const LETTERS = 8.2;

interface Size {
  width: number;
  height: number;
}

/** Stands for a curve that was not computed, so that the figure draws the other one alone. */
function emptyScan({ bus, sequence }: ImpedanceScan): ImpedanceScan {
  const none = new Float64Array();
  return { bus, sequence, frequencyHz: none, re: none, im: none, resonances: [], error: 'not computed' };
}

/** Black but for the phases, which have their customary colours beside dash and label. */
function inkOf({ study }: SheetInput) {
  return { ...PRINT_INK, phases: phaseInk(phaseColoursOf(study), 'light') };
}

function drawing(input: SheetInput, computed: SheetCase, window: DrawingWindow, size: Size) {
  const layout = layoutStudy(input.study);
  const shown = window ?? { x: 0, y: 0, ...drawingSize(input.study, layout) };
  const clip = `piece-${[shown.x, shown.y].map(Math.round).join('-')}`;
  return (
    <svg
      xmlns="http://www.w3.org/2000/svg"
      width={size.width}
      height={size.height}
      viewBox={[shown.x, shown.y, shown.width, shown.height].join(' ')}
    >
      <clipPath id={clip}>
        <rect {...shown} />
      </clipPath>
      <g clipPath={`url(#${clip})`}>
        <StaticDrawing
          study={input.study}
          caseId={computed.caseId}
          layout={layout}
          solution={computed.solution.converged ? computed.solution : null}
          verdicts={computed.verdicts}
          palette={{ ...printPalette, phases: phaseInk(phaseColoursOf(input.study), 'light') }}
          fontFamily={FAMILY}
        />
      </g>
    </svg>
  );
}

function impedance(
  input: SheetInput,
  computed: SheetCase,
  request: Extract<FigureRequest, { kind: 'impedance' }>,
  size: Size,
) {
  const found = computed.scans.find(
    ({ withCorrection }) =>
      withCorrection.bus === request.bus && withCorrection.sequence === request.sequence,
  );
  if (!found) return null;
  const { withCorrection, without } = found;
  return (
    <RailFigure
      {...size}
      fontFamily={FAMILY}
      textSize={LETTERS}
      scan={{ with: withCorrection, without: without ?? emptyScan(withCorrection) }}
      frequencyHz={input.study.frequencyHz}
      maxOrder={Math.min(
        input.study.maxOrder ?? 50,
        (withCorrection.frequencyHz.at(-1) ?? Number.POSITIVE_INFINITY) / input.study.frequencyHz,
      )}
    />
  );
}

function waveform(input: SheetInput, computed: SheetCase, spectra: PinSpectra, size: Size) {
  const { solution } = computed;
  return (
    <WaveformFigure
      {...size}
      ink={inkOf(input)}
      fontFamily={FAMILY}
      textSize={LETTERS}
      voltage={spectra.voltage}
      current={spectra.current ?? null}
      frequencyHz={input.study.frequencyHz}
      maxOrder={solution.maxOrder}
      summation={solution.summation}
      anglesUnknown={solution.judged.anglesUnknown.some(Boolean)}
      settings={{ content: 'all', periods: 1, phases: phasesToDraw(spectra.current ?? spectra.voltage) }}
    />
  );
}

function spectrum(input: SheetInput, computed: SheetCase, pin: Pin, spectra: PinSpectra, size: Size) {
  const { solution } = computed;
  const limits =
    pin.quantity === 'voltage'
      ? orderTable(studyInCase(input.study, computed.caseId), solution, pin.bus).flatMap(({ h, limit }) =>
          limit === null ? [] : [{ h, limit }],
        )
      : [];
  const bars = spectrumBars((spectra.current ?? spectra.voltage).judged, solution.maxOrder, limits);
  const thd = bars ? Math.sqrt(bars.reduce((sum, { percent }) => sum + percent ** 2, 0)) : null;
  return (
    <SpectrumFigure
      {...size}
      fontFamily={FAMILY}
      textSize={LETTERS}
      quantity={pin.quantity}
      bars={bars}
      thdPercent={thd}
      maxOrder={solution.maxOrder}
    />
  );
}

function pinFigure(
  input: SheetInput,
  computed: SheetCase,
  request: Extract<FigureRequest, { pin: Pin }>,
  size: Size,
) {
  if (!computed.solution.converged) return null;
  const spectra = pinSpectra(input.study, computed.solution, request.pin);
  if (!spectra) return null;
  if (request.kind === 'waveform') return waveform(input, computed, spectra, size);
  if (request.kind === 'spectrum') return spectrum(input, computed, request.pin, spectra, size);
  return (
    <PhasorFigure
      {...size}
      ink={inkOf(input)}
      names={phaseNamesOf(input.study)}
      fontFamily={FAMILY}
      textSize={LETTERS}
      voltage={phasorsAt(spectra.voltage, 1)}
      current={spectra.current ? phasorsAt(spectra.current, 1) : null}
      order={1}
    />
  );
}

/** Composes the sheet's figures from the print figures of drawing and charts. */
export function sheetFigures(input: SheetInput): FigureComposer {
  return ({ request }, width, height) => {
    const computed = input.cases.find(({ caseId }) => caseId === request.caseId);
    if (!computed) return null;
    const size = { width, height };
    if (request.kind === 'drawing') return drawing(input, computed, request.window, size);
    if (request.kind === 'impedance') return impedance(input, computed, request, size);
    return pinFigure(input, computed, request, size);
  };
}
