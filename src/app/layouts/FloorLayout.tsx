import { clsx } from 'clsx';
import { type ReactNode, useRef } from 'react';
import { Link, NavLink } from 'react-router-dom';
import { Icon } from '../../components/Icon';
import { SkipLink } from '../../components/SkipLink';
import { Wordmark } from '../../components/Wordmark';
import { useRoom } from '../../lib/theme';
import type { Place } from './navigation';
import { usePageFocus } from './usePageFocus';

type Props = {
  places: readonly Place[];
  /** where the mark leads */
  home: string;
  /** a SearchBox for the top bar, from 768 px; below, finding is a place of its own */
  search?: ReactNode;
  /** at the end of the bar: the kit, the person */
  right?: ReactNode;
  /** `none` leaves the phone's top to the page, such as a picture */
  phoneTop?: 'mark' | 'none';
  /** `full` for pages that lay out the whole width, `column` for reading */
  width?: 'column' | 'full';
  children: ReactNode;
};

/** Watching and training: picture first, everything in reach of a thumb. */
export function FloorLayout({ places, home, search, right, phoneTop = 'mark', width = 'column', children }: Props) {
  useRoom('floor');
  const main = useRef<HTMLElement>(null);
  usePageFocus(main);
  return (
    <div className="floor-frame flex min-h-dvh flex-col">
      <SkipLink />
      <header
        className={clsx(
          'flex min-h-13 items-center gap-x-2 px-4.5 md:gap-x-5 pt-1 md:min-h-15 md:border-b-thin md:border-line md:px-[max(1.5rem,calc(50%-54.5rem))] md:pt-0',
          phoneTop === 'none' && 'max-md:hidden',
        )}
      >
        <Link to={home} className="flex min-h-target flex-none items-center no-underline">
          <Wordmark />
        </Link>
        {search && <div className="hidden min-w-40 max-w-85 flex-1 md:block">{search}</div>}
        <nav aria-label="Places" className="hidden self-stretch md:flex">
          <ul className="flex">
            {places.map((place) => (
              <li key={place.to} className="flex">
                <NavLink to={place.to} end={place.match === 'exact'} className="place-wide">
                  {place.label}
                </NavLink>
              </li>
            ))}
          </ul>
        </nav>
        {right && <div className="ms-auto flex min-w-0 items-center gap-2 [&>*]:min-w-0">{right}</div>}
      </header>
      <main
        ref={main}
        id="main"
        tabIndex={-1}
        className={clsx(
          'mx-auto flex w-full grow flex-col px-4.5 pb-[calc(var(--nav)+1.5rem)] md:px-6 md:pt-5',
          width === 'column' ? 'max-w-3xl' : 'max-w-[112rem]',
        )}
      >
        {children}
      </main>
      <nav
        aria-label="Places"
        className="fixed inset-x-0 bottom-0 z-30 h-[var(--nav)] border-t-thin border-line bg-surface pb-[env(safe-area-inset-bottom)] md:hidden"
      >
        <ul className="flex h-full">
          {places.map((place) => (
            <li key={place.to} className="min-w-0 flex-1">
              <NavLink to={place.to} end={place.match === 'exact'} className="place-phone">
                <Icon name={place.icon} />
                {place.label}
              </NavLink>
            </li>
          ))}
        </ul>
      </nav>
    </div>
  );
}
