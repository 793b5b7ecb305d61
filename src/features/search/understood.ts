import type { Output } from '../../../shared/contracts/endpoint';
import type { find } from '../../../shared/contracts/search';
import { formatList } from '../../lib/format';

type Understood = Output<typeof find>['understood'];

/** “Showing ring row, without rings.” in its parts: what was understood of a query. */
export function understoodWords({ movements, without }: Understood): {
  movements: string | null;
  without: string | null;
} {
  return {
    movements:
      movements.length > 0
        ? formatList(
            movements.slice(0, 3).map(({ name }) => name),
            'or',
          ) + (movements.length > 3 ? ' and more' : '')
        : null,
    without:
      without.length > 0
        ? formatList(
            without.map(({ name }) => name),
            'or',
          )
        : null,
  };
}
