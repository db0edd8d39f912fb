import { Button, Dialog, Heading, Modal, ModalOverlay } from 'react-aria-components';
import { useWorkbench, workbench } from '../../store/index.ts';
import { LookingLine } from './LookingLine.tsx';
import { ReadOnlyLine } from './ReadOnlyLine.tsx';

/** What the user must read before going on: a refused file with every finding, a failed autosave. */
export function NoticeDialog() {
  const notice = useWorkbench((state) => state.notice);
  const dismiss = useWorkbench((state) => state.dismissNotice);
  if (notice?.severity !== 'error') return null;
  return (
    <ModalOverlay isOpen onOpenChange={dismiss} isDismissable className="veil">
      <Modal className="notice">
        <Dialog role="alertdialog">
          <Heading slot="title">{notice.title}</Heading>
          {notice.findings.length > 0 && (
            <ul className="findings">
              {notice.findings.map((finding) => (
                <li key={`${finding.path} ${finding.message}`} data-severity={finding.severity}>
                  <code>{finding.path}</code>
                  <span>{finding.message}</span>
                </li>
              ))}
            </ul>
          )}
          <Button autoFocus onPress={dismiss}>
            Close
          </Button>
        </Dialog>
      </Modal>
    </ModalOverlay>
  );
}

/** Quiet lines for what need not interrupt: another tab at work, a former state, warnings, a restart. */
export function NoticeLine() {
  const notice = useWorkbench((state) => state.notice);
  const { dismissNotice, saveFileAs } = workbench.getState();
  const workerMessage = useWorkbench((state) => state.status.workerMessage);
  const quiet = notice && notice.severity !== 'error' ? notice : null;
  return (
    <div className="notice-lines">
      <ReadOnlyLine />
      <LookingLine />
      {workerMessage && (
        <div className="notice-line" role="status">
          <span>{workerMessage}</span>
        </div>
      )}
      {quiet && (
        <div className="notice-line" role="status">
          <span>
            {quiet.title}
            {quiet.findings.length > 0 && ` ${quiet.findings.map((finding) => finding.message).join(' ')}`}
          </span>
          {quiet.offer === 'save' && <Button onPress={() => void saveFileAs()}>Save to a file</Button>}
          <Button onPress={dismissNotice}>Dismiss</Button>
        </div>
      )}
    </div>
  );
}
