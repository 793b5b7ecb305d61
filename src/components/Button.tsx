import type { ComponentProps } from 'react';
import { Link, type LinkProps } from 'react-router-dom';
import { type ButtonLook, type ButtonSize, buttonLook } from './buttonLook';
import { pressOf } from './press';

type Props = Omit<ComponentProps<'button'>, 'type'> & {
  look?: ButtonLook;
  size?: ButtonSize;
  type?: 'button' | 'submit';
  /** what it is doing, in a word or two (“Saving”): shown in place of the label, and nothing more can be pressed */
  busy?: string | undefined;
};

export function Button({ look, size, type = 'button', busy, className, children, onClick, ...rest }: Props) {
  const press = pressOf(busy, onClick);
  return (
    <button {...rest} {...press} type={type} className={buttonLook(look, size, className)}>
      {busy ?? children}
    </button>
  );
}

/** A link that is as heavy as a button: it leads somewhere and changes nothing. */
export function ButtonLink({ look, size, className, ...rest }: LinkProps & { look?: ButtonLook; size?: ButtonSize }) {
  return <Link {...rest} className={buttonLook(look, size, className)} />;
}
