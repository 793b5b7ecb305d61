import { type Action, may } from '../../shared/domain/permissions';
import type { Role } from '../../shared/domain/words';
import { teamPath } from '../lib/session';
import type { Place } from './layouts/navigation';

type TeamPlace = Omit<Place, 'to'> & { page: string; needs: Action };

const floor: TeamPlace[] = [
  { page: 'today', label: 'Today', icon: 'list', needs: 'readLibrary' },
  { page: 'find', label: 'Find', icon: 'search', needs: 'readLibrary' },
  { page: 'dictionary', label: 'Movements', icon: 'book', needs: 'readLibrary' },
  { page: 'my-kit', label: 'My kit', icon: 'kit', needs: 'keepOwn' },
];

const desk: TeamPlace[] = [
  { page: 'sessions', label: 'Sessions', icon: 'calendar', needs: 'readDrafts' },
  { page: 'footage', label: 'Footage', icon: 'film', needs: 'readDrafts' },
  { page: 'movements', label: 'Movements', icon: 'book', needs: 'editMovement' },
  { page: 'words', label: 'Words', icon: 'captions', needs: 'editWords' },
  { page: 'kit', label: 'Kit', icon: 'kit', needs: 'editKit' },
  { page: 'people', label: 'People', icon: 'people', needs: 'managePeople' },
];

const placesFor =
  (places: TeamPlace[]) =>
  (slug: string, role: Role): Place[] =>
    places
      .filter(({ needs }) => may(role, needs))
      .map(({ page, label, icon }) => ({ to: teamPath(slug, page), label, icon }));

export const floorPlaces = placesFor(floor);
export const deskPlaces = placesFor(desk);
