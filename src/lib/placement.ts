import { type RefObject, useLayoutEffect } from 'react';

export type Align = 'start' | 'end' | 'fill';

type Box = { top: number; bottom: number; left: number; right: number; width: number };
type Place = { top?: number; bottom?: number; left?: number; right?: number; width?: number; maxHeight: number };

const gap = 4;
const margin = 8;

/** Where a list lies beside what opened it, in px of the window: below, or above where there is more room. */
export function placeBeside(anchor: Box, window: { width: number; height: number }, align: Align): Place {
  const below = window.height - anchor.bottom - gap - margin;
  const above = anchor.top - gap - margin;
  const upwards = below < 200 && above > below;
  return {
    ...(upwards ? { bottom: window.height - anchor.top + gap } : { top: anchor.bottom + gap }),
    ...(align === 'end'
      ? { right: Math.max(margin, window.width - anchor.right) }
      : { left: Math.max(margin, anchor.left) }),
    ...(align === 'fill' ? { width: anchor.width } : {}),
    maxHeight: Math.max(upwards ? above : below, 120),
  };
}

const px = (value: number | undefined) => (value === undefined ? 'auto' : `${value}px`);

/** Keeps an open list beside its anchor while things scroll and the window changes. */
export function usePlacement(
  anchor: RefObject<HTMLElement | null>,
  list: RefObject<HTMLElement | null>,
  state: 'open' | 'closed',
  align: Align,
): void {
  useLayoutEffect(() => {
    if (state === 'closed') return;
    const place = () => {
      if (!anchor.current || !list.current) return;
      const box = anchor.current.getBoundingClientRect();
      const { clientWidth: width, clientHeight: height } = document.documentElement;
      const at = placeBeside(box, { width, height }, align);
      Object.assign(list.current.style, {
        top: px(at.top),
        bottom: px(at.bottom),
        left: px(at.left),
        right: px(at.right),
        width: px(at.width),
        maxHeight: px(at.maxHeight),
        maxWidth: px(width - 2 * margin),
      });
    };
    place();
    window.addEventListener('scroll', place, true);
    window.addEventListener('resize', place);
    return () => {
      window.removeEventListener('scroll', place, true);
      window.removeEventListener('resize', place);
    };
  }, [anchor, list, state, align]);
}
