import { useMutation, useQueryClient } from '@tanstack/react-query';
import { useState } from 'react';
import { readNotice } from '../../shared/contracts/account';
import { Dialog } from '../components/Dialog';
import { GoButton } from '../components/GoButton';
import { call } from '../lib/api';
import { meQuery } from '../lib/session';

/** Once, before the first page: what the library is not, and who goes before it. */
export function FirstUseNotice() {
  // closed unread, it comes back with the next visit
  const [state, setState] = useState<'open' | 'later'>('open');
  const queries = useQueryClient();
  const read = useMutation({
    mutationFn: () => call(readNotice, {}),
    onSuccess: ({ me }) => queries.setQueryData(meQuery.queryKey, me),
  });
  return (
    <Dialog
      title="Before you train"
      open={state === 'open'}
      onClose={() => setState('later')}
      actions={
        <GoButton data-first-focus busy={read.isPending ? 'One moment' : undefined} onClick={() => read.mutate()}>
          I have read this
        </GoButton>
      }
    >
      <div className="space-y-3">
        <p>
          <strong>Training can hurt.</strong> What you see here is general education by your team’s coaches. It is not
          medical advice, and it is not made for you alone.
        </p>
        <p>
          Ask a doctor or a licensed professional first if you have a condition or an injury, are or were recently
          pregnant, or are new to exercise.
        </p>
        <p>
          <strong>Stop</strong> on sharp pain, chest pain, dizziness, numbness or unusual breathlessness, and get help.
        </p>
        <p>
          What your coach says on the day, and the rules of the place you train in, go before anything written here.
        </p>
        {read.isError && <p role="alert">That did not arrive. Check the connection and press again.</p>}
      </div>
    </Dialog>
  );
}
