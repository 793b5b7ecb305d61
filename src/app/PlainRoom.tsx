import { Suspense } from 'react';
import { Outlet } from 'react-router-dom';
import { Waiting } from '../components/Waiting';
import { PlainLayout } from './layouts/PlainLayout';

/** Pages outside a team: one column. */
export function PlainRoom() {
  return (
    <PlainLayout>
      <Suspense fallback={<Waiting label="The page is on its way" />}>
        <Outlet />
      </Suspense>
    </PlainLayout>
  );
}
