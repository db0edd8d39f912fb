import { Button, Dialog, Heading, Modal, ModalOverlay } from 'react-aria-components';
import { useWorkbench } from '../../store/index.ts';

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

/** A quiet line for what need not interrupt: warnings of a file, a restarted computation. */
export function NoticeLine() {
  const notice = useWorkbench((state) => state.notice);
  const dismiss = useWorkbench((state) => state.dismissNotice);
  const workerMessage = useWorkbench((state) => state.status.workerMessage);
  const quiet = notice && notice.severity !== 'error' ? notice : null;
  if (!quiet && !workerMessage) return null;
  return (
    <div className="notice-line" role="status">
      {workerMessage && <span>{workerMessage}</span>}
      {quiet && (
        <>
          <span>
            {quiet.title}
            {quiet.findings.length > 0 && ` ${quiet.findings.map((finding) => finding.message).join(' ')}`}
          </span>
          <Button onPress={dismiss}>Dismiss</Button>
        </>
      )}
    </div>
  );
}
