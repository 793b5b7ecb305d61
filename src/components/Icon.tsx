import { clsx } from 'clsx';
import { type IconName, icons } from './icons';

type Props = {
  name: IconName;
  /** px */
  size?: number;
  /** `filled` for a thing that is on, such as a kept bookmark */
  fill?: 'none' | 'filled';
  className?: string;
};

/** A picture beside or inside something that has words; it is never read out itself. */
export function Icon({ name, size = 22, fill = 'none', className }: Props) {
  return (
    <svg
      className={clsx('flex-none', className)}
      width={size}
      height={size}
      viewBox="0 0 24 24"
      fill={fill === 'filled' ? 'currentColor' : 'none'}
      stroke="currentColor"
      strokeWidth="2.4"
      strokeLinejoin="round"
      aria-hidden="true"
      focusable="false"
    >
      {icons[name]}
    </svg>
  );
}
