import { clsx } from 'clsx';
import type { ComponentProps } from 'react';
import { inputLook } from './Field';

type Props = Omit<ComponentProps<'select'>, 'className' | 'children'> & {
  /** read out; what is chosen says the rest */
  label: string;
  options: readonly { value: string | number; label: string }[];
  className?: string;
};

/** A choice in a row of tools, no wider than its words. */
export function SmallSelect({ label, options, className, ...select }: Props) {
  return (
    <label className={clsx('min-w-0', className)}>
      <span className="sr-only">{label}</span>
      <select
        {...select}
        className={clsx(
          inputLook,
          'min-h-targetSmall! w-auto! max-w-full py-0.5! ps-2! pe-1! text-sm! font-bold max-sm:text-base!',
        )}
      >
        {options.map((option) => (
          <option key={option.value} value={option.value}>
            {option.label}
          </option>
        ))}
      </select>
    </label>
  );
}
