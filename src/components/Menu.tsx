import { clsx } from 'clsx';
import { type KeyboardEvent, type ReactNode, useId, useRef, useState } from 'react';
import { Link } from 'react-router-dom';
import { usePlacement } from '../lib/placement';
import { type ButtonLook, type ButtonSize, buttonLook } from './buttonLook';
import { Icon } from './Icon';
import type { IconName } from './icons';

export type MenuItem = {
  label: ReactNode;
  icon?: IconName;
  look?: 'plain' | 'danger';
  /** where one is, or what is chosen */
  current?: boolean;
} & ({ to: string; onSelect?: () => void } | { to?: undefined; onSelect: () => void });

type Props = {
  /** what the button shows */
  label: ReactNode;
  /** what it is called, when it shows only a picture or a name: “Quayside team, menu” */
  name?: string;
  items: readonly MenuItem[];
  /** more below the items, such as the choice of theme */
  children?: ReactNode;
  align?: 'start' | 'end';
  look?: ButtonLook;
  size?: ButtonSize;
  className?: string;
};

/** A button that opens a short list of links and actions. Escape or a press elsewhere closes it. */
export function Menu({
  label,
  name,
  items,
  children,
  align = 'end',
  look = 'quiet',
  size = 'regular',
  className,
}: Props) {
  const id = useId();
  const button = useRef<HTMLButtonElement>(null);
  const list = useRef<HTMLDivElement>(null);
  const [state, setState] = useState<'open' | 'closed'>('closed');
  usePlacement(button, list, state, align);

  const close = () => list.current?.hidePopover();
  const move = (event: KeyboardEvent) => {
    if (event.key !== 'ArrowDown' && event.key !== 'ArrowUp') return;
    const stops = [...(list.current?.querySelectorAll<HTMLElement>('a, button, input') ?? [])];
    const step = event.key === 'ArrowDown' ? 1 : -1;
    const at = stops.indexOf(document.activeElement as HTMLElement);
    event.preventDefault();
    stops[(at + step + stops.length) % stops.length]?.focus();
  };

  return (
    <>
      <button
        ref={button}
        type="button"
        popoverTarget={id}
        aria-expanded={state === 'open'}
        aria-label={name}
        className={buttonLook(look, size, className)}
      >
        {label}
        <Icon name="chevron" size={14} />
      </button>
      {/* biome-ignore lint/a11y/noStaticElementInteractions: arrows are a convenience, Tab reaches everything */}
      <div
        ref={list}
        id={id}
        popover="auto"
        className="floating min-w-48"
        onBeforeToggle={(event) => setState(event.newState)}
        onKeyDown={move}
      >
        <ul>
          {items.map((item, at) => (
            // biome-ignore lint/suspicious/noArrayIndexKey: a menu's lines keep their order
            <li key={at}>
              <MenuLine item={item} onDone={close} />
            </li>
          ))}
        </ul>
        {children && (
          <div className={clsx(items.length > 0 && 'mt-1 border-t border-line pt-2', 'px-2.5 pb-2')}>{children}</div>
        )}
      </div>
    </>
  );
}

function MenuLine({ item, onDone }: { item: MenuItem; onDone: () => void }) {
  const look = clsx(
    'flex min-h-target w-full items-center gap-3 rounded px-2.5 py-1.5 text-start leading-tight font-bold hover:bg-raised focus-visible:outline-offset-[-3px]',
    item.look === 'danger' && 'text-danger',
  );
  const inside = (
    <>
      {item.icon && <Icon name={item.icon} size={20} />}
      <span className="min-w-0 grow">{item.label}</span>
      {item.current && <Icon name="check" size={18} />}
    </>
  );
  const select = () => {
    onDone();
    item.onSelect?.();
  };
  if (item.to !== undefined) {
    return (
      <Link to={item.to} aria-current={item.current ? 'true' : undefined} className={look} onClick={select}>
        {inside}
      </Link>
    );
  }
  return (
    <button type="button" aria-current={item.current ? 'true' : undefined} className={look} onClick={select}>
      {inside}
    </button>
  );
}
