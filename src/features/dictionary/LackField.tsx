import type { ComponentProps } from 'react';
import type { KitNeed } from '../../../shared/domain/kit/kit';
import { SelectField } from '../../components/TextField';
import type { KitById } from './kitWords';

type Props = Omit<ComponentProps<typeof SelectField>, 'options'> & { kit: KitById; needs: readonly KitNeed[] };

/** What is missing; the kit that the movement needs comes first. */
export function LackField({ kit, needs, ...field }: Props) {
  const needed = new Set(needs.flatMap(({ anyOf }) => anyOf.map(({ kitItemId }) => kitItemId)));
  const items = [...kit.values()];
  const option = ({ id, withoutText }: { id: string; withoutText: string }) => (
    <option key={id} value={id}>
      {withoutText}
    </option>
  );
  return (
    <SelectField {...field}>
      <option value="" disabled>
        Choose one
      </option>
      {needed.size > 0 && <optgroup label="It needs">{items.filter(({ id }) => needed.has(id)).map(option)}</optgroup>}
      <optgroup label="Room and person">
        <option value="space">no space</option>
        <option value="ability">not able to</option>
      </optgroup>
      <optgroup label="Other kit">{items.filter(({ id }) => !needed.has(id)).map(option)}</optgroup>
    </SelectField>
  );
}
