import { CaseMenu } from '../cases/CaseMenu.tsx';
import { type Command, shownKeys } from '../commands/command.ts';
import { FindingsMenu } from '../findings/FindingsMenu.tsx';
import { PlaceTabs } from './PlaceTabs.tsx';
import { StudyMenu } from './StudyMenu.tsx';
import { VerdictCounts } from './VerdictCounts.tsx';

interface Props {
  commands: readonly Command[];
  caseFormOpen: boolean;
  onCaseFormClose(): void;
  onDetails(): void;
  onCommandList(): void;
}

/** One quiet line: study, case, places, verdict counts. */
export function Header(props: Props) {
  const { commands, onCommandList } = props;
  return (
    <header className="header">
      <h1>Varwright</h1>
      <StudyMenu commands={commands} />
      <CaseMenu commands={commands} formOpen={props.caseFormOpen} onFormClose={props.onCaseFormClose} />
      <PlaceTabs />
      <FindingsMenu onDetails={props.onDetails} />
      <VerdictCounts />
      <button type="button" className="command-key" onClick={onCommandList} aria-label="Command list">
        {shownKeys('Mod+K')}
      </button>
    </header>
  );
}
