import { clsx } from 'clsx';
import type { ComponentProps } from 'react';
import { type ButtonLook, type ButtonSize, buttonLook } from './buttonLook';
import { Icon } from './Icon';
import type { IconName } from './icons';
import { Key } from './Key';

type Props = Omit<ComponentProps<'button'>, 'children' | 'type'> & {
  icon: IconName;
  /** what it does; read out, and shown when the pointer rests on it */
  label: string;
  look?: ButtonLook;
  size?: Exclude<ButtonSize, 'large'>;
  /** for a switch: whether it is on */
  pressed?: boolean;
  /** the key that does the same, shown beside the icon */
  hotkey?: string;
};

/** A button whose picture says enough for those who see it. Where there is room, words are better: see Button. */
export function IconButton({
  icon,
  label,
  look = 'plain',
  size = 'regular',
  pressed,
  hotkey,
  className,
  ...rest
}: Props) {
  const square = size === 'small' ? 'min-w-targetSmall' : 'min-w-target';
  return (
    <button
      {...rest}
      type="button"
      aria-label={label}
      title={label}
      aria-pressed={pressed}
      className={buttonLook(look, size, clsx('px-1!', square, className))}
    >
      <Icon name={icon} size={size === 'small' ? 18 : 22} fill={pressed ? 'filled' : 'none'} />
      {hotkey && <Key name={hotkey} />}
    </button>
  );
}
