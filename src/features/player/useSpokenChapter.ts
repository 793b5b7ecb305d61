import { useEffect, useRef } from 'react';
import { announce } from '../../lib/announce';

/** Reads out the chapter that begins; not the one that the page starts with, which its heading says. */
export function useSpokenChapter(id: string | null, title: string | null): void {
  const before = useRef(id);
  useEffect(() => {
    if (before.current === id) return;
    before.current = id;
    if (title) announce(title);
  }, [id, title]);
}
