import { SearchBox } from '../../components/SearchBox';
import { SelectField } from '../../components/TextField';
import { patternOptions } from './patternName';
import type { DictionaryAddress } from './useDictionaryAddress';

/** The box and the pattern over the desk's list. */
export function DictionarySearch({ address }: { address: DictionaryAddress }) {
  return (
    <div className="flex flex-wrap gap-3">
      <div className="min-w-0 grow basis-64 sm:max-w-md">
        <SearchBox
          label="Find a movement"
          placeholder="A name, another name, a typo"
          place="bar"
          value={address.text}
          onChange={address.type}
          onSubmit={address.submit}
        />
      </div>
      <SelectField
        label="Pattern"
        labelled="hidden"
        className="w-44"
        value={address.pattern ?? ''}
        onChange={(event) =>
          address.choosePattern(patternOptions.find(({ value }) => value === event.target.value)?.value)
        }
      >
        <option value="">Every pattern</option>
        {patternOptions.map(({ value, label }) => (
          <option key={value} value={value}>
            {label}
          </option>
        ))}
      </SelectField>
    </div>
  );
}
