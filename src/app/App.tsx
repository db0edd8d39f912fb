import { useCallback, useState } from 'react';
import { useWorkbench } from '../store/index.ts';
import { CommandList } from './commands/CommandList.tsx';
import { KeyMap } from './commands/KeyMap.tsx';
import { useCommandKeys } from './commands/useCommandKeys.ts';
import { useCommands } from './commands/useCommands.ts';
import { Compare } from './compare/Compare.tsx';
import { CorrectionPlace } from './correction/CorrectionPlace.tsx';
import { StudyDetails } from './details/StudyDetails.tsx';
import { DropTarget } from './files/DropTarget.tsx';
import { FileDrawers } from './files/FileDrawers.tsx';
import { LeaveDialog } from './files/LeaveDialog.tsx';
import { NoticeDialog, NoticeLine } from './files/NoticeDialog.tsx';
import { Header } from './header/Header.tsx';
import { SheetConnection } from './sheet/SheetConnection.tsx';
import { RailConnection } from './site/RailConnection.tsx';
import { SitePlace } from './site/SitePlace.tsx';
import { useTheme } from './theme/useTheme.ts';

type OpenDialog = 'commands' | 'keys' | 'details' | null;

/** The shell: header, the place looked at, the rail, and what may lie above them. */
export function App() {
  useTheme();
  const place = useWorkbench((state) => state.view.place);
  const study = useWorkbench((state) => state.study);
  const compared = useWorkbench((state) => state.view.compared);
  const [dialog, setDialog] = useState<OpenDialog>(null);
  const openList = useCallback(() => setDialog('commands'), []);
  const [detailsField, setDetailsField] = useState<string | null>(null);
  const openDetails = useCallback((field: string | null) => {
    setDetailsField(field);
    setDialog('details');
  }, []);
  const close = useCallback(() => {
    setDialog(null);
    setDetailsField(null);
  }, []);
  const commands = useCommands(setDialog);
  useCommandKeys(commands, openList);
  return (
    <div className="workbench" data-place={place}>
      <Header commands={commands} onCommandList={openList} />
      <NoticeLine />
      <main className="place">
        {place === 'site' && <SitePlace onDetails={openDetails} />}
        {place === 'site' && study && compared && <Compare study={study} compared={compared} />}
        {place === 'correction' && <CorrectionPlace />}
        {place === 'sheet' && <SheetConnection />}
      </main>
      {place !== 'sheet' && <RailConnection />}
      <CommandList commands={commands} open={dialog === 'commands'} onOpenChange={close} />
      <KeyMap commands={commands} open={dialog === 'keys'} onClose={close} />
      {dialog === 'details' && <StudyDetails firstField={detailsField} onClose={close} />}
      <FileDrawers />
      <LeaveDialog />
      <NoticeDialog />
      <DropTarget />
    </div>
  );
}
