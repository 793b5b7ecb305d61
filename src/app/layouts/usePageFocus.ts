import { type RefObject, useEffect, useRef } from 'react';
import { useLocation } from 'react-router-dom';

/**
 * After a change of page the focus goes to the page's main part, as a full load would, so that the Tab key
 * and a screen reader go on from there. A field that the page itself gave the focus keeps it.
 */
export function usePageFocus(main: RefObject<HTMLElement | null>): void {
  const { pathname } = useLocation();
  const before = useRef(pathname);
  useEffect(() => {
    if (before.current === pathname) return;
    before.current = pathname;
    if (main.current?.contains(document.activeElement)) return;
    main.current?.focus({ preventScroll: true });
  }, [pathname, main]);
}
