import { clsx } from 'clsx';
import { useId, useRef, useState } from 'react';
import { Icon } from './Icon';
import { IconButton } from './IconButton';
import { type Option, OptionList } from './OptionList';
import { pressInCombobox } from './optionKeys';

type Props = {
  label: string;
  placeholder?: string;
  value: string;
  onChange: (text: string) => void;
  /** Enter, or the keyboard's search key, without a suggestion */
  onSubmit: (text: string) => void;
  /** offered while typing; none shows no list */
  suggestions?: readonly Option[];
  onTake?: (option: Option) => void;
  /** `page` is the large one of a search page, `bar` fits a top bar */
  place?: 'page' | 'bar';
  autoFocus?: boolean;
};

/** One box to find things: the text is the value, suggestions only help to type it. */
export function SearchBox(props: Props) {
  const {
    label,
    placeholder = label,
    value,
    onChange,
    onSubmit,
    suggestions = [],
    onTake,
    place = 'page',
    autoFocus,
  } = props;
  const id = useId();
  const box = useRef<HTMLDivElement>(null);
  const field = useRef<HTMLInputElement>(null);
  const [state, setState] = useState<'open' | 'closed'>('closed');
  const [active, setActive] = useState(-1);
  const open = state === 'open' && suggestions.length > 0;

  const close = () => {
    setState('closed');
    setActive(-1);
  };
  const take = (option: Option) => {
    onTake?.(option);
    close();
  };

  return (
    <search>
      <form
        action="."
        onSubmit={(event) => {
          event.preventDefault();
          close();
          onSubmit(value.trim());
        }}
      >
        <div
          ref={box}
          className={clsx(
            'flex items-center gap-2.5 rounded border-edge bg-surface ps-3.5 pe-1 has-[input:focus-visible]:outline-3 has-[input:focus-visible]:outline-ink',
            place === 'page' ? 'min-h-13 border-2' : 'min-h-targetSmall border-thin',
          )}
        >
          <Icon name="search" size={place === 'page' ? 22 : 18} className="text-ink2" />
          <input
            ref={field}
            type="text"
            inputMode="search"
            enterKeyHint="search"
            role="combobox"
            aria-label={label}
            aria-autocomplete="list"
            aria-expanded={open}
            aria-controls={open ? id : undefined}
            aria-activedescendant={open && active >= 0 ? `${id}-${active}` : undefined}
            autoComplete="off"
            autoCorrect="off"
            autoCapitalize="none"
            spellCheck={false}
            // biome-ignore lint/a11y/noAutofocus: only for the page whose one purpose is the box
            autoFocus={autoFocus}
            placeholder={placeholder}
            value={value}
            className={clsx(
              'min-w-0 grow self-stretch bg-transparent py-1.5 outline-none',
              place === 'page' ? 'text-md' : 'text-base',
            )}
            onBlur={close}
            onChange={(event) => {
              onChange(event.target.value);
              setActive(-1);
              setState(event.target.value.trim() ? 'open' : 'closed');
            }}
            onKeyDown={(event) =>
              pressInCombobox(event, {
                state: open ? 'open' : 'closed',
                count: suggestions.length,
                active,
                open: () => setState('open'),
                close,
                point: setActive,
                take: (at) => suggestions[at] && take(suggestions[at]),
              })
            }
          />
          {value !== '' && (
            <IconButton
              icon="close"
              label="Empty the box"
              look="quiet"
              size="small"
              onClick={() => {
                onChange('');
                close();
                field.current?.focus();
              }}
            />
          )}
        </div>
        {open && (
          <OptionList
            {...{ id, active }}
            label={label}
            anchor={box}
            options={suggestions}
            onPoint={setActive}
            onTake={take}
          />
        )}
      </form>
    </search>
  );
}
