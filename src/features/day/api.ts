import { queryOptions } from '@tanstack/react-query';
import { getMyDay } from '../../../shared/contracts/sessions';
import { call } from '../../lib/api';

/** @param date a calendar date; left out, it is today where the team is */
export const myDayQuery = (team: string, date: string | undefined) =>
  queryOptions({
    queryKey: ['my-day', team, date ?? 'today'],
    queryFn: ({ signal }) => call(getMyDay, { team, ...(date ? { date } : {}) }, { signal }),
  });
