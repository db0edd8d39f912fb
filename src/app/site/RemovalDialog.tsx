import { Button, Dialog, Heading, Modal, ModalOverlay } from 'react-aria-components';
import { useStore } from 'zustand';
import { useWorkbench } from '../../store/index.ts';
import { removalWords } from '../../study/index.ts';
import { removeNow, removing } from './removal.ts';

function keep(): void {
  removing.setState({ chosen: null });
}

/** Asked once before a removal takes along what hangs below. */
export function RemovalDialog() {
  const chosen = useStore(removing, (state) => state.chosen);
  const study = useWorkbench((state) => state.study);
  if (!chosen || !study) return null;
  return (
    <ModalOverlay isOpen onOpenChange={keep} isDismissable className="veil">
      <Modal className="notice">
        <Dialog role="alertdialog">
          <Heading slot="title">Remove {removalWords(study, chosen)}?</Heading>
          <p>Nothing else feeds what hangs below, so it goes as well. Undo brings all of it back.</p>
          <div className="choices">
            <Button autoFocus onPress={() => removeNow(chosen)}>
              Remove
            </Button>
            <Button onPress={keep}>Keep</Button>
          </div>
        </Dialog>
      </Modal>
    </ModalOverlay>
  );
}
