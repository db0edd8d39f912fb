import { shownKeys } from '../../keys/index.ts';
import { CaseMenu } from '../cases/CaseMenu.tsx';
import type { Command } from '../commands/command.ts';
import { FindingsCount } from '../findings/FindingsCount.tsx';
import { PlaceTabs } from './PlaceTabs.tsx';
import { StudyMenu } from './StudyMenu.tsx';
import { VerdictCounts } from './VerdictCounts.tsx';

interface Props {
  commands: readonly Command[];
  onCommandList(): void;
}

/** One quiet line: study, case, places, verdict counts. */
export function Header({ commands, onCommandList }: Props) {
  return (
    <header className="header">
      <div className="header-study">
        <h1>Varwright</h1>
        <StudyMenu commands={commands} />
        <CaseMenu commands={commands} />
      </div>
      <PlaceTabs />
      <div className="header-counts">
        <FindingsCount />
        <VerdictCounts />
        <button type="button" className="command-key" onClick={onCommandList} aria-label="Command list">
          {shownKeys('Mod+K')}
        </button>
      </div>
    </header>
  );
}
