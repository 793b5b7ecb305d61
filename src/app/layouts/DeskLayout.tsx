import { clsx } from 'clsx';
import { type ReactNode, useRef, useState } from 'react';
import { Link, NavLink } from 'react-router-dom';
import { Button } from '../../components/Button';
import { Icon } from '../../components/Icon';
import { SkipLink } from '../../components/SkipLink';
import { Wordmark } from '../../components/Wordmark';
import { useRoom } from '../../lib/theme';
import type { Place } from './navigation';
import { usePageFocus } from './usePageFocus';

type Props = {
  places: readonly Place[];
  home: string;
  /** at the end of the bar: team and person */
  right?: ReactNode;
  children: ReactNode;
};

/** Planning, marking and correcting: dense, keyboard first. On a phone the places lie behind one button. */
export function DeskLayout({ places, home, right, children }: Props) {
  useRoom('desk');
  const main = useRef<HTMLElement>(null);
  const [menu, setMenu] = useState<'open' | 'closed'>('closed');
  usePageFocus(main);
  return (
    <div className="flex min-h-dvh flex-col">
      <SkipLink />
      <header className="flex flex-wrap items-center gap-x-2 border-b-thin border-line bg-surface px-4 md:flex-nowrap md:gap-x-4 md:px-[max(1.25rem,calc(50%-58.75rem))]">
        <Link to={home} className="flex min-h-13 items-center no-underline">
          <Wordmark />
        </Link>
        <Button
          look="quiet"
          size="small"
          className="md:hidden"
          aria-expanded={menu === 'open'}
          aria-controls="places"
          onClick={() => setMenu(menu === 'open' ? 'closed' : 'open')}
        >
          <Icon name={menu === 'open' ? 'close' : 'menu'} size={18} />
          Menu
        </Button>
        {right && (
          <div className="ms-auto flex min-w-0 flex-1 basis-0 items-center justify-end gap-1 text-sm md:order-last [&>*]:min-w-0">
            {right}
          </div>
        )}
        <nav
          id="places"
          aria-label="Places"
          className={clsx(
            'w-full pb-2 md:block md:w-auto md:self-stretch md:pb-0',
            menu === 'closed' && 'max-md:hidden',
          )}
        >
          <ul className="md:flex md:h-full">
            {places.map((place) => (
              <li key={place.to} className="md:flex">
                <NavLink
                  to={place.to}
                  end={place.match === 'exact'}
                  className="place-wide"
                  onClick={() => setMenu('closed')}
                >
                  {place.label}
                </NavLink>
              </li>
            ))}
          </ul>
        </nav>
      </header>
      <main ref={main} id="main" tabIndex={-1} className="mx-auto w-full max-w-[120rem] grow px-4 pt-3 pb-10 md:px-5">
        {children}
      </main>
    </div>
  );
}
