import { Button, Dialog, Heading, Modal, ModalOverlay } from 'react-aria-components';
import { drawingKeys, trayKeys } from '../../drawing/index.ts';
import { shownKeys } from '../../keys/index.ts';
import { tableKeys } from '../table/gridKeys.ts';
import type { Command } from './command.ts';

interface Props {
  commands: readonly Command[];
  open: boolean;
  onClose(): void;
}

const placesKeys: readonly { place: string; keys: readonly (readonly [string, string])[] }[] = [
  { place: 'On the drawing', keys: drawingKeys },
  { place: 'On the drawing: add a part', keys: trayKeys },
  {
    place: 'In a data slip',
    keys: [
      ['Enter', 'take the value and go on; after the last, back to the part'],
      ['Shift+Enter', 'take it and go back'],
      ['Mod+Enter', 'take it and close'],
      ['↑  ↓', 'step the value; with Shift ten times as far'],
      ['N  M  T  A', 'on an origin mark: nameplate, measured, typical, assumed'],
      ['Escape', 'put the old value back and close'],
    ],
  },
  { place: 'In a table', keys: tableKeys },
  {
    place: 'On the rail',
    keys: [
      ['←  →', 'one order'],
      ['Shift + ←  →', 'fine'],
      ['P', 'next peak'],
      ['Home', 'fundamental'],
      ['0 … 9', 'type an order or a frequency'],
    ],
  },
];

/** Every key, by where it works. */
export function KeyMap({ commands, open, onClose }: Props) {
  return (
    <ModalOverlay isOpen={open} onOpenChange={onClose} isDismissable className="veil">
      <Modal className="key-map">
        <Dialog>
          <Heading slot="title">Keys</Heading>
          <div className="key-columns">
            <section>
              <h3>Everywhere</h3>
              <dl>
                <div className="pair">
                  <dt>
                    <kbd>{shownKeys('Mod+K')}</kbd>
                  </dt>
                  <dd>find a command by its words</dd>
                </div>
                {commands
                  .filter((command) => command.keys)
                  .map((command) => (
                    <div key={command.id} className="pair">
                      <dt>
                        <kbd>{shownKeys(command.keys as string)}</kbd>
                      </dt>
                      <dd>{command.words}</dd>
                    </div>
                  ))}
              </dl>
            </section>
            {placesKeys.map(({ place, keys }) => (
              <section key={place}>
                <h3>{place}</h3>
                <dl>
                  {keys.map(([key, words]) => (
                    <div key={key} className="pair">
                      <dt>
                        <kbd>{shownKeys(key)}</kbd>
                      </dt>
                      <dd>{words}</dd>
                    </div>
                  ))}
                </dl>
              </section>
            ))}
          </div>
          <Button autoFocus onPress={onClose}>
            Close
          </Button>
        </Dialog>
      </Modal>
    </ModalOverlay>
  );
}
