import { clsx } from 'clsx';
import type { ComponentProps } from 'react';
import { Link, type LinkProps } from 'react-router-dom';

const look = 'font-bold text-ink underline decoration-edge decoration-2 underline-offset-3 hover:decoration-ink';

/** A link in a sentence or a list. */
export function TextLink({ className, ...rest }: LinkProps) {
  return <Link {...rest} className={clsx(look, className)} />;
}

/** A button that reads as part of a sentence: “3 more need rings · show them”. */
export function TextButton({ className, ...rest }: ComponentProps<'button'>) {
  return <button type="button" {...rest} className={clsx('reach', look, className)} />;
}
