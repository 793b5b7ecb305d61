import type { Block } from '../../../shared/contracts/sessions';
import { kindNames } from './chapterNames';

/** How the blocks of a session are told apart in a list: by kind and title, and by a number where that is not enough. */
export function blockNames(blocks: readonly Pick<Block, 'id' | 'kind' | 'title'>[]): Map<string, string> {
  const name = ({ kind, title }: Pick<Block, 'kind' | 'title'>) =>
    title === '' || title.toLowerCase() === kind ? kindNames[kind] : `${kindNames[kind]} · ${title}`;
  const named = blocks.map((block) => ({ id: block.id, name: name(block) }));
  const seen = new Map<string, number>();
  return new Map(
    named.map(({ id, name: text }) => {
      const alike = named.filter((other) => other.name === text).length;
      const place = (seen.get(text) ?? 0) + 1;
      seen.set(text, place);
      return [id, alike > 1 ? `${text} ${place}` : text];
    }),
  );
}
