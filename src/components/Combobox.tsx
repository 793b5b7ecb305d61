import { useId, useRef, useState } from 'react';
import { Field, type FieldTexts, inputLook } from './Field';
import { Icon } from './Icon';
import { type Option, OptionList } from './OptionList';
import { pressInCombobox } from './optionKeys';

type Props = FieldTexts & {
  /** all that can be chosen, or, with `onQuery`, what was found for the text */
  options: readonly Option[];
  /** the chosen option's value */
  value: string | null;
  /** how the chosen value reads, when it may not be among `options` (as with `onQuery`) */
  valueLabel?: string;
  onChange: (value: string | null, option: Option | null) => void;
  /** called as one types; the options are then taken as found elsewhere and not narrowed here */
  onQuery?: (text: string) => void;
  /** `busy` while options are fetched */
  state?: 'ready' | 'busy' | 'off';
  /** offers to make what was typed, when no option has just that name */
  onCreate?: (text: string) => void;
  /** how the offer reads: “New movement” */
  createLabel?: string;
  placeholder?: string;
  id?: string;
  className?: string;
};

const making = ' make';
const plain = (text: string) => text.normalize('NFKD').replace(/\p{M}/gu, '').toLowerCase().trim();

/** Options that hold every typed word, those that start with the text first. */
function narrowed(options: readonly Option[], text: string): Option[] {
  const words = plain(text).split(/\s+/);
  const fits = options.filter((option) => words.every((word) => plain(option.label).includes(word)));
  const starts = (option: Option) => (plain(option.label).startsWith(words[0] ?? '') ? 0 : 1);
  return fits.toSorted((a, b) => starts(a) - starts(b));
}

/**
 * A typed choice with completion. Leaving the field takes an option whose name was typed in full, else puts back what was chosen
 * before; where nothing was, what was typed stays and the field says that it is no choice yet. An emptied field chooses nothing.
 */
export function Combobox(props: Props) {
  const {
    options,
    value,
    valueLabel,
    onChange,
    onQuery,
    state = 'ready',
    onCreate,
    createLabel = 'New',
    placeholder,
  } = props;
  const { label, hint, error, optional, labelled, id, className } = props;
  const listId = useId();
  const field = useRef<HTMLInputElement>(null);
  const [typed, setTyped] = useState<string | null>(null);
  const [shown, setShown] = useState<'open' | 'closed'>('closed');
  const [active, setActive] = useState(-1);

  const chosenLabel =
    value === null ? '' : (options.find((option) => option.value === value)?.label ?? valueLabel ?? '');
  const isStray = shown === 'closed' && value === null && Boolean(typed?.trim());
  const text = (shown === 'open' || isStray ? typed : null) ?? chosenLabel;
  const fitting = typed?.trim() && !onQuery ? narrowed(options, typed) : options;
  const fresh = typed?.trim() ?? '';
  const isNew = onCreate && fresh !== '' && !options.some((option) => plain(option.label) === plain(fresh));
  const offers: readonly Option[] = isNew
    ? [...fitting, { value: making, label: `${createLabel}: “${fresh}”` }]
    : fitting;

  const close = () => {
    setShown('closed');
    setActive(-1);
  };
  const take = (option: Option) => {
    if (option.value === making) onCreate?.(text.trim());
    else onChange(option.value, option);
    setTyped(null);
    close();
  };
  const leave = () => {
    const exact = fresh && offers.find((option) => option.value !== making && plain(option.label) === plain(fresh));
    if (exact) return take(exact);
    if (typed !== null && typed.trim() === '' && value !== null) onChange(null, null);
    setTyped(value === null && fresh && onCreate ? typed : null);
    close();
  };

  const note = state === 'busy' ? 'Looking' : offers.length === 0 ? 'Nothing by that name' : undefined;
  return (
    <Field
      {...{ label, hint, optional, labelled, id, className }}
      error={isStray ? `“${fresh}” is not in the list. Choose one, or add it.` : error}
    >
      {(wiring) => (
        <div className="relative">
          <input
            {...wiring}
            ref={field}
            type="text"
            role="combobox"
            autoComplete="off"
            spellCheck={false}
            aria-autocomplete="list"
            aria-expanded={shown === 'open'}
            aria-controls={shown === 'open' ? listId : undefined}
            aria-activedescendant={shown === 'open' && active >= 0 ? `${listId}-${active}` : undefined}
            disabled={state === 'off'}
            placeholder={placeholder}
            value={text}
            className={`${inputLook} pe-10`}
            onClick={() => setShown('open')}
            onBlur={leave}
            onChange={(event) => {
              setTyped(event.target.value);
              setShown('open');
              setActive(event.target.value.trim() ? 0 : -1);
              onQuery?.(event.target.value);
            }}
            onKeyDown={(event) => {
              const used = pressInCombobox(event, {
                state: shown,
                count: offers.length,
                active,
                open: () => setShown('open'),
                close: () => {
                  setTyped(null);
                  close();
                },
                point: setActive,
                take: (at) => offers[at] && take(offers[at]),
              });
              // with the list open Enter never sends the form around it: it would send what was not chosen yet
              if (!used && event.key === 'Enter' && shown === 'open' && typed !== null) event.preventDefault();
            }}
          />
          <Icon name="chevron" size={16} className="pointer-events-none absolute inset-y-0 right-3 my-auto text-ink2" />
          {shown === 'open' && (
            <OptionList
              id={listId}
              label={typeof label === 'string' ? label : 'Choices'}
              anchor={field}
              options={offers}
              active={active}
              chosen={value}
              note={note}
              onPoint={setActive}
              onTake={take}
            />
          )}
          <span className="sr-only" role="status">
            {shown === 'open' && typed !== null ? (note ?? `${offers.length} to choose from`) : ''}
          </span>
        </div>
      )}
    </Field>
  );
}
