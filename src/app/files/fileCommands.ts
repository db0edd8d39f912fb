import { type KeptDocument, workbench } from '../../store/index.ts';
import { newStudy, type Study } from '../../study/index.ts';
import type { Command } from '../commands/command.ts';
import { openDrawer } from './fileDrawer.ts';
import { leaveStudy } from './leaveStudy.ts';
import { openSample } from './openSample.ts';
import { pickImport } from './pickImport.ts';
import { openFromRecent, recentWords } from './recentStudies.ts';
import { samples } from './samples.ts';

function begin(frequencyHz: 50 | 60): void {
  leaveStudy(() => workbench.getState().openStudy(newStudy({ title: 'New study', frequencyHz })));
}

/** Everything about files: this study's, another one's, and what this browser keeps. */
export function fileCommands(study: Study | null, recent: readonly KeptDocument[]): Command[] {
  const { openFile, saveFile, saveFileAs } = workbench.getState();
  const enabled = study !== null;
  return [
    { id: 'study.new', words: 'New study, 50 Hz', run: () => begin(50) },
    { id: 'study.new60', words: 'New study, 60 Hz', run: () => begin(60) },
    { id: 'study.open', words: 'Open a study…', keys: 'Mod+O', run: () => leaveStudy(() => void openFile()) },
    { id: 'study.save', words: 'Save the study', keys: 'Mod+S', enabled, run: () => void saveFile() },
    {
      id: 'study.saveAs',
      words: 'Save the study as…',
      keys: 'Mod+Shift+S',
      enabled,
      run: () => void saveFileAs(),
    },
    {
      id: 'study.states',
      words: 'Earlier states of the study…',
      enabled,
      run: () => openDrawer({ kind: 'states' }),
    },
    {
      id: 'study.import',
      words: 'Bring parts from another study…',
      enabled,
      run: () => void pickImport(),
    },
    ...recent.map((document) => ({
      id: `recent.${document.documentId}`,
      words: `Recent: ${document.title}, ${recentWords(document)}`,
      run: () => openFromRecent(document),
    })),
    ...samples.map((sample) => ({
      id: `sample.${sample.id}`,
      words: `Sample: ${sample.title}`,
      run: () => leaveStudy(() => void openSample(sample)),
    })),
  ];
}
