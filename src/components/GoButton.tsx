import type { ComponentProps } from 'react';
import { Link, type LinkProps } from 'react-router-dom';
import { type GoSize, goLook } from './buttonLook';
import { pressOf } from './press';

type Props = Omit<ComponentProps<'button'>, 'type'> & {
  size?: GoSize;
  type?: 'button' | 'submit';
  /** what it is doing (“Publishing”), while it does it */
  busy?: string | undefined;
};

/** The one thing to do on a screen, as a torn piece of yellow tape. There is one a screen. */
export function GoButton({ size, type = 'button', busy, className, children, onClick, ...rest }: Props) {
  const press = pressOf(busy, onClick);
  return (
    <button {...rest} {...press} type={type} className={goLook(size, className)}>
      {busy ?? children}
    </button>
  );
}

/** The one place to go from a screen. */
export function GoLink({ size, className, ...rest }: LinkProps & { size?: GoSize }) {
  return <Link {...rest} className={goLook(size, className)} />;
}
