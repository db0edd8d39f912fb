import {
  Button,
  Header,
  Keyboard,
  Menu,
  MenuItem,
  MenuSection,
  MenuTrigger,
  Popover,
  SubmenuTrigger,
  Text,
} from 'react-aria-components';
import { useStore } from 'zustand';
import { shownKeys } from '../../keys/index.ts';
import { isUnsaved, useWorkbench } from '../../store/index.ts';
import type { Command } from '../commands/command.ts';
import { recentStudies, recentWords, refreshRecent } from '../files/recentStudies.ts';
import { samples } from '../files/samples.ts';

interface Props {
  commands: readonly Command[];
}

const ofThisStudy = [
  'study.save',
  'study.saveAs',
  'study.details',
  'study.states',
  'study.import',
  'study.assumptions',
  'edit.undo',
  'edit.redo',
];
const ofAnother = ['study.open', 'study.new', 'study.new60', 'study.quickStart'];
const ofTheLook = ['theme.light', 'theme.dark', 'theme.system'];

/** The open study by its title; what can be done with it, and the ways to another one, behind it. */
export function StudyMenu({ commands }: Props) {
  const byId = new Map(commands.map((command) => [command.id, command]));
  const items = (ids: readonly string[]) =>
    ids.flatMap((id) => {
      const command = byId.get(id);
      return command ? [<CommandItem key={id} command={command} />] : [];
    });
  return (
    <MenuTrigger onOpenChange={(open) => open && void refreshRecent()}>
      <TitleButton />
      <Popover className="popover">
        <Menu aria-label="Study" onAction={(id) => byId.get(String(id))?.run()}>
          <MenuSection>
            <Header>This study</Header>
            {items(ofThisStudy)}
          </MenuSection>
          <MenuSection>
            <Header>Another study</Header>
            {items(ofAnother)}
            <RecentItem commands={byId} />
            <SubmenuTrigger>
              <MenuItem textValue="Sample sites">
                <Text slot="label">Sample sites</Text>
                <span aria-hidden="true">▸</span>
              </MenuItem>
              <Popover className="popover">
                <Menu aria-label="Sample sites" onAction={(id) => byId.get(String(id))?.run()}>
                  {samples.map(({ id, title, story }) => (
                    <MenuItem key={id} id={`sample.${id}`} textValue={title}>
                      <div className="two-lines">
                        <Text slot="label">{title}</Text>
                        <Text slot="description">{story}</Text>
                      </div>
                    </MenuItem>
                  ))}
                </Menu>
              </Popover>
            </SubmenuTrigger>
          </MenuSection>
          <MenuSection>
            <Header>Paper or slate</Header>
            {items(ofTheLook)}
          </MenuSection>
        </Menu>
      </Popover>
    </MenuTrigger>
  );
}

function TitleButton() {
  const title = useWorkbench((state) => state.study?.title ?? 'No study yet');
  const unsaved = useWorkbench((state) => state.study !== null && isUnsaved(state));
  const hasFile = useWorkbench((state) => state.fileName !== null);
  const unkept = useWorkbench((state) => state.keptProblem);
  const words = unsaved && (hasFile ? 'changed since the file' : 'not in a file yet');
  return (
    <Button className="menu-button study-title">
      <span className="clipped">
        {title}
        {words && <span className="quiet"> · {words}</span>}
        {unkept && <span className="unkept"> · not kept in this browser</span>}
      </span>{' '}
      <span aria-hidden="true">▾</span>
    </Button>
  );
}

function CommandItem({ command }: { command: Command }) {
  const { id, words, keys, enabled } = command;
  return (
    <MenuItem id={id} isDisabled={enabled === false} textValue={words}>
      <Text slot="label">{words}</Text>
      {keys && <Keyboard>{shownKeys(keys)}</Keyboard>}
    </MenuItem>
  );
}

/** The studies last worked on, with when and in which file. */
function RecentItem({ commands }: { commands: ReadonlyMap<string, Command> }) {
  const documents = useStore(recentStudies, (state) => state.documents);
  return (
    <SubmenuTrigger>
      <MenuItem textValue="Recent studies" isDisabled={documents.length === 0}>
        <Text slot="label">Recent studies</Text>
        <span aria-hidden="true">▸</span>
      </MenuItem>
      <Popover className="popover">
        <Menu aria-label="Recent studies" onAction={(id) => commands.get(String(id))?.run()}>
          {documents.map((document) => (
            <MenuItem
              key={document.documentId}
              id={`recent.${document.documentId}`}
              textValue={document.title}
            >
              <div className="two-lines">
                <Text slot="label">{document.title}</Text>
                <Text slot="description">{recentWords(document)}</Text>
              </div>
            </MenuItem>
          ))}
        </Menu>
      </Popover>
    </SubmenuTrigger>
  );
}
