import type { z } from 'zod';
import type { PublishRemark } from '../../../shared/contracts/sessions';
import { Disclosure } from '../../components/Disclosure';
import { TextLink } from '../../components/TextLink';
import { teamPath } from '../../lib/session';

export type Remark = z.infer<typeof PublishRemark>;

/** More than these would push what can be done about them out of sight. */
const shownAtOnce = 5;

/** Remarks on a session, each a link to its place where it has one. */
export function RemarkList({ team, remarks }: { team: string; remarks: readonly Remark[] }) {
  const rest = remarks.slice(shownAtOnce);
  return (
    <>
      <ul>{remarks.slice(0, shownAtOnce).map((remark) => item(team, remark))}</ul>
      {rest.length === 1 && <ul>{rest.map((remark) => item(team, remark))}</ul>}
      {rest.length > 1 && (
        <Disclosure title={`${rest.length} more`}>
          <ul>{rest.map((remark) => item(team, remark))}</ul>
        </Disclosure>
      )}
    </>
  );
}

function item(team: string, { text, recordingId, movementId }: Remark) {
  const to =
    recordingId !== null
      ? teamPath(team, 'footage', recordingId)
      : movementId !== null
        ? teamPath(team, 'movements', movementId)
        : null;
  return (
    <li key={text} className="border-b border-line py-1.5 text-sm last:border-b-0">
      {to ? (
        <TextLink to={to} className="font-normal! decoration-1!">
          {text}
        </TextLink>
      ) : (
        text
      )}
    </li>
  );
}
