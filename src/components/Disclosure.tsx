import type { ReactNode } from 'react';
import { Icon } from './Icon';

/** More that not everybody needs, one press away. */
export function Disclosure({ title, open, children }: { title: ReactNode; open?: boolean; children: ReactNode }) {
  return (
    <details open={open} className="group border-b border-line">
      <summary className="flex min-h-target list-none items-center gap-2 font-bold [&::-webkit-details-marker]:hidden">
        <Icon name="chevron" size={16} className="-rotate-90 group-open:rotate-0" />
        {title}
      </summary>
      <div className="pb-3 ps-6">{children}</div>
    </details>
  );
}
