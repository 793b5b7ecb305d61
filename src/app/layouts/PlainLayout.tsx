import { type ReactNode, useRef } from 'react';
import { Link } from 'react-router-dom';
import { SkipLink } from '../../components/SkipLink';
import { Wordmark } from '../../components/Wordmark';
import { lastRoom, useRoom } from '../../lib/theme';
import { usePageFocus } from './usePageFocus';

/** One column and nothing else: signing in, an invitation, a new password. In the room that one was in last. */
export function PlainLayout({ children }: { children: ReactNode }) {
  useRoom(lastRoom());
  const main = useRef<HTMLElement>(null);
  usePageFocus(main);
  return (
    <div className="mx-auto flex min-h-dvh w-full max-w-md flex-col px-5 pt-3 pb-12 sm:pt-[12vh]">
      <SkipLink />
      <header className="mb-6">
        <Link to="/" className="inline-flex min-h-target items-center no-underline">
          <Wordmark />
        </Link>
      </header>
      <main ref={main} id="main" tabIndex={-1}>
        {children}
      </main>
    </div>
  );
}
