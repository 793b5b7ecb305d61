import { ToggleChip } from '../../components/Chip';
import { patternOptions } from './patternName';
import type { DictionaryAddress } from './useDictionaryAddress';

/** One row on a phone, moved with the finger; all of them where there is room. */
export function PatternChips({ address }: { address: DictionaryAddress }) {
  return (
    <fieldset className="-mx-4.5 mt-2 flex min-w-0 gap-2 overflow-x-auto px-4.5 py-1.5 md:mx-0 md:flex-wrap md:px-0">
      <legend className="sr-only">Pattern</legend>
      {patternOptions.map(({ value, label }) => (
        <ToggleChip
          key={value}
          pressed={address.pattern === value}
          className="flex-none whitespace-nowrap"
          onClick={() => address.choosePattern(address.pattern === value ? undefined : value)}
        >
          {label}
        </ToggleChip>
      ))}
    </fieldset>
  );
}
