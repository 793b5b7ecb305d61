import { type ReactNode, useState } from 'react';
import { chapterKinds } from '../../../shared/domain/words';
import { Button, ButtonLink } from '../../../src/components/Button';
import { Caution } from '../../../src/components/Caution';
import { CheckField, CheckGroup } from '../../../src/components/CheckField';
import { Chip, LinkChip, ToggleChip } from '../../../src/components/Chip';
import { Combobox } from '../../../src/components/Combobox';
import { ConfirmDialog } from '../../../src/components/ConfirmDialog';
import { Dialog } from '../../../src/components/Dialog';
import { Disclosure } from '../../../src/components/Disclosure';
import { EmptyState } from '../../../src/components/EmptyState';
import { ErrorPage } from '../../../src/components/ErrorPage';
import { ErrorPanel } from '../../../src/components/ErrorPanel';
import { FileButton } from '../../../src/components/FileButton';
import { GoButton } from '../../../src/components/GoButton';
import { Icon } from '../../../src/components/Icon';
import { IconButton } from '../../../src/components/IconButton';
import { type IconName, icons } from '../../../src/components/icons';
import { Key } from '../../../src/components/Key';
import { MediaRow } from '../../../src/components/MediaRow';
import { PageTitle, Section } from '../../../src/components/PageTitle';
import { Progress } from '../../../src/components/Progress';
import { SearchBox } from '../../../src/components/SearchBox';
import { SkeletonRows } from '../../../src/components/Skeleton';
import { Still } from '../../../src/components/Still';
import { Table } from '../../../src/components/Table';
import { Tabs } from '../../../src/components/Tabs';
import { TapeStrip } from '../../../src/components/TapeStrip';
import { SelectField, TextAreaField, TextField } from '../../../src/components/TextField';
import { TextButton, TextLink } from '../../../src/components/TextLink';
import { tell } from '../../../src/components/toasts';
import { Waiting } from '../../../src/components/Waiting';

const movements = [
  { value: 'a', label: 'Air squat', note: 'no kit', tape: 'demo' as const },
  { value: 'b', label: 'Box step-up', note: 'box' },
  { value: 'c', label: 'Ring row', note: 'rings' },
  { value: 'd', label: 'Towel row', note: 'towel' },
  { value: 'e', label: 'Rope skip', note: 'rope' },
  { value: 'f', label: 'Prone row hold', note: 'no kit' },
];

const lines = [
  { start: '3:05.0', length: '1:45', kind: 'demo' as const, shows: 'Box step-up', block: 'Workout · line 1' },
  {
    start: '4:50.4',
    length: '0:51',
    kind: 'substitution' as const,
    shows: 'Low box step-up',
    block: 'Workout · line 1',
  },
  { start: '6:27.3', length: '1:26', kind: 'workout' as const, shows: 'The workout, once through', block: 'Workout' },
];

function Row({ children }: { children: ReactNode }) {
  return <div className="flex flex-wrap items-center gap-3">{children}</div>;
}

export function Parts() {
  const [movement, setMovement] = useState<string | null>('b');
  const [text, setText] = useState('row');
  const [at, setAt] = useState<'list' | 'words'>('list');
  const [window, setWindow] = useState<'none' | 'dialog' | 'confirm'>('none');
  const [mine, setMine] = useState(true);

  return (
    <div className="flex flex-col gap-8">
      <PageTitle
        title="Step, row, skip"
        meta="Tue 3 March · draft"
        actions={
          <>
            <ButtonLink to="/shots" size="small">
              Shot list
            </ButtonLink>
            <GoButton size="small">Publish at 18:00</GoButton>
          </>
        }
      />
      <Section title="Tape">
        <ul className="grid grid-cols-1 gap-x-6 gap-y-2 sm:grid-cols-2">
          {chapterKinds.map((kind) => (
            <li key={kind} className="flex items-center gap-3 text-sm font-bold">
              <span className="w-24">{kind}</span>
              <TapeStrip kind={kind} className="min-w-0 flex-1!" />
              <TapeStrip kind={kind} laid="suggested" className="w-12" />
              <TapeStrip kind={kind} size="thin" className="w-8" />
            </li>
          ))}
        </ul>
        <div className="mt-4 flex gap-0.75">
          {chapterKinds.map((kind, index) => (
            <TapeStrip
              key={kind}
              kind={kind}
              size="tall"
              label={kind}
              className="min-w-0"
              style={{ flex: index + 2 }}
            />
          ))}
        </div>
      </Section>
      <Section title="Buttons">
        <Row>
          <GoButton>Publish</GoButton>
          <GoButton disabled>Publish</GoButton>
          <GoButton busy="Publishing">Publish</GoButton>
          <Button>Keep as draft</Button>
          <Button look="quiet">Not here</Button>
          <Button look="danger">Delete</Button>
          <Button disabled>Off</Button>
          <Button size="small">
            <Icon name="edit" size={18} /> Edit
          </Button>
          <IconButton icon="bookmark" label="Keep" />
          <IconButton icon="bookmark" label="Kept" pressed />
          <IconButton icon="undo" label="Undo" hotkey="Mod+z" size="small" />
          <FileButton label="Choose recordings" onFiles={() => undefined}>
            <Icon name="upload" /> Add footage
          </FileButton>
        </Row>
        <div className="mt-3 max-w-md">
          <GoButton size="large" className="w-full">
            Start the clock · 12:00
          </GoButton>
        </div>
        <div className="mt-3">
          <Row>
            <ToggleChip pressed={mine} onClick={() => setMine(!mine)}>
              My kit
            </ToggleChip>
            <ToggleChip pressed={false}>Demo</ToggleChip>
            <LinkChip to="/kit">Hotel kit</LinkChip>
            <Chip>coach</Chip>
            <Key name="Space" />
            <Key name="Shift+ArrowLeft" />
            <TextLink to="/x">a link</TextLink>
            <span>
              3 more need rings · <TextButton>show them</TextButton>
            </span>
          </Row>
        </div>
      </Section>
      <Section title="Icons">
        <div className="flex flex-wrap gap-3">
          {(Object.keys(icons) as IconName[]).map((name) => (
            <span key={name} title={name}>
              <Icon name={name} size={24} />
            </span>
          ))}
        </div>
      </Section>
      <Section title="Fields">
        <div className="mb-5 max-w-md">
          <SearchBox
            label="Find a movement or a word"
            value={text}
            onChange={setText}
            onSubmit={() => undefined}
            suggestions={movements.filter((option) => option.label.toLowerCase().includes(text))}
          />
        </div>
        <div className="grid items-start gap-5 sm:grid-cols-2 lg:grid-cols-3">
          <TextField label="Title" defaultValue="Ankles, then step-ups" />
          <TextField label="Date" type="date" hint="In the team’s time zone." defaultValue="2026-03-03" />
          <TextField label="E-mail" optional error="This does not look like an address." defaultValue="ines@" />
          <SelectField
            label="Kind"
            options={chapterKinds.map((kind) => ({ value: kind, label: kind }))}
            defaultValue="demo"
          />
          <Combobox
            label="Movement"
            hint="Type a few letters."
            options={movements}
            value={movement}
            onChange={setMovement}
            onCreate={() => undefined}
            createLabel="New movement"
          />
          <TextField label="Off" disabled defaultValue="not yours to change" />
          <TextAreaField label="Note" optional placeholder="What to watch for" />
          <CheckGroup legend="Kit">
            <CheckField label="A bar to hang from" defaultChecked />
            <CheckField label="Rope" hint="or a cable" />
          </CheckGroup>
          <CheckGroup legend="Role" error="Choose one.">
            <CheckField label="Coach" choose="one" name="role" />
            <CheckField label="Member" choose="one" name="role" />
          </CheckGroup>
        </div>
      </Section>
      <Section title="Rows and tables">
        <ul className="max-w-lg">
          <MediaRow
            size="large"
            title="Towel row"
            to="/b"
            still={{ length: '0:40' }}
            notes={['same pull, a door and a towel']}
            tape="substitution"
          />
          <MediaRow
            title="Box step-up"
            still={{ length: '0:48' }}
            notes={['Whole foot on the box']}
            figure="6 / side"
          />
        </ul>
        <p className="my-3 max-w-lg">
          “…squeeze the <mark>ring row</mark> at the top, don’t rush it…”
        </p>
        <Table
          caption="Chapters"
          columns={[
            { key: 'start', head: 'Start', role: 'figure', cell: (line) => <b>{line.start}</b>, width: 'w-20' },
            { key: 'length', head: 'Length', role: 'figure', cell: (line) => line.length, width: 'w-20' },
            {
              key: 'kind',
              head: 'Kind',
              headShown: 'hidden',
              cell: (line) => <TapeStrip kind={line.kind} label={line.kind} className="mt-1 w-10" />,
              width: 'w-16',
            },
            { key: 'shows', head: 'Shows', role: 'name', cell: (line) => line.shows },
            { key: 'block', head: 'Block', cell: (line) => <span className="text-ink2">{line.block}</span> },
          ]}
          rows={lines}
          rowKey={(line) => line.start}
          rowState={(line) => (line.kind === 'substitution' ? 'at' : 'plain')}
        />
      </Section>
      <Section title="Cautions, waits, errors">
        <div className="grid items-start gap-5 lg:grid-cols-2">
          <Caution todo="Check what you hang from.">Pull on it with both hands first.</Caution>
          <ErrorPanel
            title="The sessions did not arrive."
            message="A part of Tapeline does not answer right now. Try again in a moment."
            requestId="01J9-7Q2K-PX"
            onRetry={() => undefined}
          />
          <Progress label="take-1.mov" share={0.42} note="320 MB of 760 MB, about 4 min left" />
          <Progress label="Making the playback version" share={null} />
          <Progress label="take-2.mov" share={0.3} state="failed" note="The connection broke off. Try again." />
          <Waiting label="Looking" />
          <div className="flex flex-wrap gap-3">
            <Still length="0:48" className="w-37" />
            <Still src="/nothing.webp" alt="Box step-up" className="w-37" />
          </div>
          <SkeletonRows label="Sessions" count={2} still="small" />
          <EmptyState title="No session for today." action={<Button>Look at the week</Button>}>
            Your coach publishes most of them the evening before.
          </EmptyState>
          <Disclosure title="What was said">Nothing yet.</Disclosure>
        </div>
        <ErrorPage title="There is nothing here" requestId="01J9-7Q2K-PX" actions={<Button>To today</Button>}>
          The address is wrong, or it is not yours to see.
        </ErrorPage>
      </Section>
      <Section title="Views and windows">
        <Tabs
          label="Recording"
          at={at}
          onChange={setAt}
          tabs={[
            { name: 'list', label: 'Chapters', panel: 'Seven chapters.' },
            { name: 'words', label: 'Words', panel: '142 lines.' },
          ]}
        />
        <div className="mt-4">
          <Row>
            <Button onClick={() => setWindow('dialog')}>Open a window</Button>
            <Button onClick={() => setWindow('confirm')}>Delete the take</Button>
            <Button onClick={() => tell('Take 1 is ready.', { label: 'Watch', onSelect: () => undefined })}>
              Tell
            </Button>
          </Row>
        </div>
        <Dialog
          open={window === 'dialog'}
          onClose={() => setWindow('none')}
          title="New movement"
          actions={
            <>
              <Button onClick={() => setWindow('none')}>Leave it</Button>
              <GoButton onClick={() => setWindow('none')}>Add it</GoButton>
            </>
          }
        >
          <div className="flex flex-col gap-4">
            <TextField label="Name" defaultValue="Low box step-up" />
            <Combobox label="Stands in for" options={movements} value={movement} onChange={setMovement} />
          </div>
        </Dialog>
        <ConfirmDialog
          open={window === 'confirm'}
          onClose={() => setWindow('none')}
          onConfirm={() => setWindow('none')}
          title="Delete take 1?"
          confirm="Delete it"
        >
          Its seven chapters go with it. This cannot be undone.
        </ConfirmDialog>
      </Section>
    </div>
  );
}
