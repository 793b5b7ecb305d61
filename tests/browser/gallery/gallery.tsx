import { createRoot } from 'react-dom/client';
import { BrowserRouter } from 'react-router-dom';
import { DeskLayout } from '../../../src/app/layouts/DeskLayout';
import { FloorLayout } from '../../../src/app/layouts/FloorLayout';
import { PlainLayout } from '../../../src/app/layouts/PlainLayout';
import { LinkChip } from '../../../src/components/Chip';
import { LiveRegion } from '../../../src/components/LiveRegion';
import { Menu } from '../../../src/components/Menu';
import { SearchBox } from '../../../src/components/SearchBox';
import { ThemeChoice } from '../../../src/components/ThemeChoice';
import { ToastRegion } from '../../../src/components/ToastRegion';
import { type ThemeChoice as Choice, chooseTheme } from '../../../src/lib/theme';
import './gallery.css';
import { FloorPage } from './FloorPage';
import { Parts } from './Parts';
import { SignInPage } from './SignInPage';

/** Every building block on one page, to look at: ?page=parts|floor|plain&room=floor|desk&theme=light|dark */
const asked = new URLSearchParams(location.search);
chooseTheme((asked.get('theme') ?? 'room') as Choice);

const person = (
  <Menu
    name="Quayside team, Ines: menu"
    label={
      <span className="min-w-0 truncate">
        <span className="max-sm:hidden">Quayside team · </span>
        <b className="text-ink">Ines</b>
      </span>
    }
    items={[
      { label: 'Quayside team', icon: 'people', onSelect: () => undefined, current: true },
      { label: 'Harbour team', icon: 'people', onSelect: () => undefined },
      { label: 'Sign out', icon: 'signOut', onSelect: () => undefined },
    ]}
  >
    <ThemeChoice />
  </Menu>
);

const floorPlaces = [
  { to: location.pathname, label: 'Today', icon: 'list' },
  { to: '/find', label: 'Find', icon: 'search' },
  { to: '/kit', label: 'My kit', icon: 'kit' },
  { to: '/you', label: 'You', icon: 'person' },
] as const;

const deskPlaces = [
  { to: '/sessions', label: 'Sessions', icon: 'calendar' },
  { to: location.pathname, label: 'Footage', icon: 'film' },
  { to: '/movements', label: 'Movements', icon: 'book' },
  { to: '/words', label: 'Words', icon: 'captions' },
  { to: '/people', label: 'People', icon: 'people' },
] as const;

function Gallery() {
  if (asked.get('page') === 'plain') {
    return (
      <PlainLayout>
        <SignInPage />
      </PlainLayout>
    );
  }
  if (asked.get('room') === 'desk') {
    return (
      <DeskLayout places={deskPlaces} home="/" right={person}>
        <Parts />
      </DeskLayout>
    );
  }
  return (
    <FloorLayout
      places={floorPlaces}
      home="/"
      right={asked.get('page') === 'floor' ? <LinkChip to="/kit">Hotel kit</LinkChip> : person}
      search={
        <SearchBox
          label="Find a movement or a word"
          place="bar"
          value=""
          onChange={() => undefined}
          onSubmit={() => undefined}
        />
      }
    >
      {asked.get('page') === 'floor' ? <FloorPage /> : <Parts />}
    </FloorLayout>
  );
}

const root = document.getElementById('root');
if (root)
  createRoot(root).render(
    <BrowserRouter>
      <Gallery />
      <ToastRegion />
      <LiveRegion />
    </BrowserRouter>,
  );
