import { PICTURE_WAYS, type PictureWay, type ReadingPicture } from '../../charts/index.ts';
import { freshEnvelope, type Workbench, workbench } from '../../store/index.ts';
import { busName, elementName, type Pin, type Study, tabularText } from '../../study/index.ts';
import type { Command } from '../commands/command.ts';
import { injectionsOf } from '../site/injectionsOf.ts';
import { readingOf } from '../site/readingOf.ts';
import { drawingPicture } from './drawingPicture.tsx';
import { copyText, type HandedOn, handOn } from './handOn.ts';
import { railPicture } from './railPicture.tsx';
import { readingPicture } from './readingPicture.tsx';
import { verdictValues } from './verdictValues.ts';

const pictures: readonly ReadingPicture[] = ['phasors', 'waveform', 'spectrum'];

/** The same words as a menu's, with what is handed on. */
function commandWords(way: PictureWay, what: string): string {
  const [verb = '', ...rest] = (PICTURE_WAYS.find((one) => one.way === way)?.words ?? '').split(' ');
  if (way === 'copyValues') return `Copy ${what} as a table`;
  return `${verb} ${what} ${rest.join(' ')}`.replace('…', '');
}

function handOnCommands(id: string, what: string, ways: readonly PictureWay[], make: () => HandedOn | null) {
  return ways.map(
    (way): Command => ({
      id: `copy.${id}.${way}`,
      words: commandWords(way, what),
      run: () => {
        const handed = make();
        if (handed) void handOn(handed, way);
        else workbench.getState().say(`There is nothing to hand on: ${what}`);
      },
    }),
  );
}

/** The rail's landscape as it is known now. */
export function railNow(state: Workbench, study: Study): HandedOn | null {
  const { answer, view } = state;
  const scan = answer?.scan?.bus === view.focusBus ? answer.scan : null;
  if (!scan || !answer) return null;
  return railPicture({
    study,
    focusBus: view.focusBus,
    scan,
    injected: injectionsOf(study, answer.solution),
    band: freshEnvelope(state) ?? undefined,
  });
}

function pinName(study: Study, pin: Pin): string {
  return pin.quantity === 'voltage'
    ? `${busName(study, pin.bus)}, voltage`
    : `${elementName(study, pin.element)}, current`;
}

function pinCommands(study: Study): Command[] {
  return (study.view?.pins ?? []).flatMap((pin, at) =>
    pictures.flatMap((picture) =>
      handOnCommands(
        `pin${at}.${picture}`,
        `the ${picture} of ${pinName(study, pin)}`,
        ['copySvg', 'copyPng', 'copyValues'],
        () => {
          const { answer, view } = workbench.getState();
          const reading = answer && readingOf(study, answer.solution, pin);
          return reading && !reading.absent ? readingPicture(study, reading, picture, view.order) : null;
        },
      ),
    ),
  );
}

/** Every picture and table of the site, copied or saved by its words. */
export function copyCommands(study: Study): Command[] {
  const every = PICTURE_WAYS.map(({ way }) => way);
  const drawing = () => drawingPicture(workbench.getState(), study);
  const rail = () => railNow(workbench.getState(), study);
  return [
    ...handOnCommands('drawing', 'the drawing', every.slice(0, 4), drawing),
    ...handOnCommands('parts', 'all parts', ['copyValues'], drawing),
    ...handOnCommands('rail', 'the rail', every, rail),
    {
      id: 'copy.verdicts',
      words: 'Copy the verdicts of this case as a table',
      run: () => {
        const verdicts = workbench.getState().answer?.verdicts ?? [];
        void copyText(tabularText(verdictValues(study, verdicts)), 'the verdicts of this case');
      },
    },
    ...pinCommands(study),
  ];
}
