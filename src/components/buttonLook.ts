import { clsx } from 'clsx';

export type ButtonLook = 'plain' | 'quiet' | 'danger';
export type ButtonSize = 'small' | 'regular' | 'large';

const base =
  'inline-flex items-center justify-center gap-2 rounded border-thin text-center font-extrabold no-underline select-none disabled:border-dashed disabled:text-ink2';

const looks = {
  plain: 'border-edge bg-surface text-ink enabled:hover:bg-raised [a&]:hover:bg-raised',
  quiet: 'border-transparent text-ink enabled:hover:bg-raised [a&]:hover:bg-raised',
  danger: 'border-danger bg-surface text-danger enabled:hover:bg-raised [a&]:hover:bg-raised',
} as const satisfies Record<ButtonLook, string>;

const sizes = {
  small: 'reach min-h-targetSmall px-3 py-1 text-sm',
  regular: 'min-h-target px-4 py-1.5 text-base leading-tight',
  large: 'min-h-15 px-5 py-2 text-lg',
} as const satisfies Record<ButtonSize, string>;

/** Classes that make a button, a link or a file picker look alike. */
export function buttonLook(look: ButtonLook = 'plain', size: ButtonSize = 'regular', className?: string): string {
  return clsx(base, looks[look], sizes[size], className);
}

export type GoSize = 'small' | 'regular' | 'large' | 'clock';

const goSizes = {
  small: 'reach min-h-targetSmall px-4 text-sm',
  regular: 'min-h-target px-5 text-base leading-tight',
  large: 'min-h-15 px-6 text-lg',
  clock: 'min-h-32 px-6 text-xl',
} as const satisfies Record<GoSize, string>;

/** The torn piece of yellow tape: see tape.css. */
export function goLook(size: GoSize = 'regular', className?: string): string {
  return clsx(
    'torn inline-flex items-center justify-center gap-2 py-1.5 text-center font-extrabold no-underline select-none',
    goSizes[size],
    className,
  );
}
