import { useQuery } from '@tanstack/react-query';
import { useEffect } from 'react';
import { useLocation, useNavigate } from 'react-router-dom';
import { z } from 'zod';
import { movementQuery } from './api';

/** What a page was opened with: just added, reached by a merged one's link, or by merging. */
const Arrival = z.object({
  added: z.boolean().optional(),
  /** the address of a movement that was merged into this one led here */
  ledOn: z.boolean().optional(),
  /** the name that was just merged into this one */
  gone: z.string().optional(),
});

/** A movement's page; the link of a merged one leads on to what it became. @param pathOf a movement's page in this room */
export function useMovementPage(team: string, movementId: string, pathOf: (movementId: string) => string) {
  const navigate = useNavigate();
  const location = useLocation();
  const query = useQuery(movementQuery(team, movementId));
  const became = query.data && query.data.movement.id !== movementId ? query.data.movement.id : null;
  // biome-ignore lint/correctness/useExhaustiveDependencies: leads on once a movement
  useEffect(() => {
    if (became) navigate(pathOf(became), { replace: true, state: { ledOn: true } });
  }, [became]);
  const arrival = Arrival.safeParse(location.state);
  return { query, page: became ? undefined : query.data, arrival: arrival.success ? arrival.data : {} };
}
