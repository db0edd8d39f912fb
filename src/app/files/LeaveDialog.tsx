import { Button, Dialog, Heading, Modal, ModalOverlay } from 'react-aria-components';
import { useStore } from 'zustand';
import { isUnsaved, useWorkbench, workbench } from '../../store/index.ts';
import { leaving } from './leaveStudy.ts';

function stay(): void {
  leaving.setState({ go: null });
}

async function saveFirst(go: () => void): Promise<void> {
  await workbench.getState().saveFile();
  if (isUnsaved(workbench.getState())) return;
  stay();
  go();
}

/** Asked before another study takes the table while the open one has changes that are in no file. */
export function LeaveDialog() {
  const go = useStore(leaving, (state) => state.go);
  const title = useWorkbench((state) => state.study?.title ?? '');
  if (!go) return null;
  return (
    <ModalOverlay isOpen onOpenChange={stay} isDismissable className="veil">
      <Modal className="notice">
        <Dialog role="alertdialog">
          <Heading slot="title">{title} has changes that are in no file</Heading>
          <p>Another study will take its place, and what can be undone goes with it.</p>
          <div className="choices">
            <Button autoFocus onPress={() => void saveFirst(go)}>
              Save it first
            </Button>
            <Button
              onPress={() => {
                stay();
                go();
              }}
            >
              Leave the changes
            </Button>
            <Button onPress={stay}>Stay here</Button>
          </div>
        </Dialog>
      </Modal>
    </ModalOverlay>
  );
}
