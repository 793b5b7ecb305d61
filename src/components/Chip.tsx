import { clsx } from 'clsx';
import type { ComponentProps, ReactNode } from 'react';
import { Link, type LinkProps } from 'react-router-dom';

const shape =
  'inline-flex min-h-targetSmall items-center justify-center gap-1.5 rounded border-thin px-3 py-1 text-sm leading-tight font-bold no-underline';
const off = 'border-edge text-ink hover:bg-raised';
const on = 'border-ink bg-ink text-ground';

/** A word that labels: a kit item, a role. Nothing happens when it is pressed. */
export function Chip({ children, className }: { children: ReactNode; className?: string }) {
  return (
    <span
      className={clsx('inline-flex items-center gap-1.5 rounded bg-raised px-2 py-0.5 text-sm font-bold', className)}
    >
      {children}
    </span>
  );
}

type ToggleProps = Omit<ComponentProps<'button'>, 'type'> & { pressed: boolean };

/** A filter or a switch that is on or off. */
export function ToggleChip({ pressed, className, ...rest }: ToggleProps) {
  return (
    <button
      {...rest}
      type="button"
      aria-pressed={pressed}
      className={clsx('reach', shape, pressed ? on : off, className)}
    />
  );
}

/** A chip that leads somewhere, such as to the kit that one trains with. */
export function LinkChip({ className, ...rest }: LinkProps) {
  return <Link {...rest} className={clsx('reach', shape, off, className)} />;
}
