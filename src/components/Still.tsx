import { clsx } from 'clsx';
import { useState } from 'react';

type Props = {
  /** none yet: floor tape is drawn where somebody will stand */
  src?: string | null;
  /** only where the words beside it don't say what it shows */
  alt?: string;
  /** on the picture's corner: “0:48”, or that there is none: “not filmed” */
  length?: string;
  /** give it a width: `w-23` in a plan line, `w-37` in a result */
  className?: string;
  loading?: 'lazy' | 'eager';
};

/** A picture of a moment, 16 by 9. Its place is kept while it loads. */
export function Still({ src, alt = '', length, className, loading = 'lazy' }: Props) {
  const [brokenSrc, setBrokenSrc] = useState<string | null>(null);
  const usable = src && src !== brokenSrc;
  return (
    <span
      className={clsx(
        'relative block aspect-video self-start flex-none overflow-hidden rounded-still bg-raised',
        className,
      )}
    >
      {usable ? (
        <img
          src={src}
          alt={alt}
          loading={loading}
          decoding="async"
          width={320}
          height={180}
          className="size-full object-cover"
          onError={() => setBrokenSrc(src)}
        />
      ) : (
        <EmptyFloor label={alt} />
      )}
      {length && (
        <span className="absolute right-1 bottom-1 rounded-still bg-shade px-1.25 py-px text-[min(0.75rem,15px)] leading-normal font-bold text-onShade">
          {length}
        </span>
      )}
    </span>
  );
}

/** Marks on a floor and nobody there yet. */
function EmptyFloor({ label }: { label: string }) {
  return (
    <span className="block size-full" {...(label ? { role: 'img', 'aria-label': `${label}: no picture yet` } : {})}>
      <svg viewBox="0 0 160 90" className="size-full" preserveAspectRatio="xMidYMid slice" aria-hidden="true">
        <path d="M0 62h160v28H0z" fill="var(--line)" />
        <path d="M18 76h50M96 82h46" stroke="var(--yellow)" strokeWidth="3" />
        <path
          d="M66 30h10M84 30h10M66 54h10M84 54h10M66 30v7M66 47v7M94 30v7M94 47v7"
          stroke="var(--edge)"
          strokeWidth="2.4"
        />
      </svg>
    </span>
  );
}
