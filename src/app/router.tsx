import { createBrowserRouter, type RouteObject } from 'react-router-dom';
import { Waiting } from '../components/Waiting';
import { DeskRoom } from './DeskRoom';
import { FloorRoom } from './FloorRoom';
import { Home } from './Home';
import { PageFault } from './PageFault';
import { PlainRoom } from './PlainRoom';
import { SignedIn } from './SignedIn';
import { TeamRoom } from './TeamRoom';

/** Every address of the client; a page's code is fetched when it is first opened. */
const pages: RouteObject[] = [
  {
    element: <PlainRoom />,
    children: [
      { path: 'sign-in', lazy: async () => ({ Component: (await import('../pages/SignInPage')).SignInPage }) },
      { path: 'join', lazy: async () => ({ Component: (await import('../pages/JoinPage')).JoinPage }) },
      {
        path: 'forgot-password',
        lazy: async () => ({ Component: (await import('../pages/ForgotPasswordPage')).ForgotPasswordPage }),
      },
      {
        path: 'new-password',
        lazy: async () => ({ Component: (await import('../pages/NewPasswordPage')).NewPasswordPage }),
      },
      { path: '*', lazy: async () => ({ Component: (await import('../pages/NotFoundPage')).NotFoundPage }) },
    ],
  },
  {
    element: <SignedIn />,
    children: [
      { index: true, element: <Home /> },
      {
        element: <PlainRoom />,
        children: [
          { path: 'account', lazy: async () => ({ Component: (await import('../pages/AccountPage')).AccountPage }) },
        ],
      },
      {
        path: 't/:team',
        element: <TeamRoom />,
        children: [
          { index: true, element: <Home /> },
          {
            element: <FloorRoom />,
            children: [
              { path: 'today', lazy: async () => ({ Component: (await import('../pages/TodayPage')).TodayPage }) },
              { path: 'days/:date', lazy: async () => ({ Component: (await import('../pages/TodayPage')).TodayPage }) },
              { path: 'find', lazy: async () => ({ Component: (await import('../pages/FindPage')).FindPage }) },
              { path: 'my-kit', lazy: async () => ({ Component: (await import('../pages/MyKitPage')).MyKitPage }) },
              {
                path: 'dictionary',
                lazy: async () => ({ Component: (await import('../pages/DictionaryPage')).DictionaryPage }),
              },
              {
                path: 'dictionary/:movementId',
                lazy: async () => ({ Component: (await import('../pages/MovementPage')).MovementPage }),
              },
              {
                path: 'notices',
                lazy: async () => ({ Component: (await import('../pages/NoticesPage')).NoticesPage }),
              },
            ],
          },
          {
            element: <FloorRoom phoneTop="none" width="full" />,
            children: [
              {
                path: 'watch/:recordingId',
                lazy: async () => ({ Component: (await import('../pages/WatchPage')).WatchPage }),
              },
            ],
          },
          {
            element: <DeskRoom />,
            children: [
              {
                path: 'sessions',
                lazy: async () => ({ Component: (await import('../pages/SessionsPage')).SessionsPage }),
              },
              {
                path: 'sessions/:sessionId',
                lazy: async () => ({ Component: (await import('../pages/SessionPage')).SessionPage }),
              },
              {
                path: 'footage',
                lazy: async () => ({ Component: (await import('../pages/FootagePage')).FootagePage }),
              },
              {
                path: 'footage/:recordingId',
                lazy: async () => ({ Component: (await import('../pages/MarkPage')).MarkPage }),
              },
              {
                path: 'words',
                lazy: async () => ({ Component: (await import('../pages/WordsQueuePage')).WordsQueuePage }),
              },
              {
                path: 'words/:recordingId',
                lazy: async () => ({ Component: (await import('../pages/WordsPage')).WordsPage }),
              },
              {
                path: 'movements',
                lazy: async () => ({ Component: (await import('../pages/MovementsPage')).MovementsPage }),
              },
              {
                path: 'movements/:movementId',
                lazy: async () => ({ Component: (await import('../pages/MovementDeskPage')).MovementDeskPage }),
              },
              { path: 'kit', lazy: async () => ({ Component: (await import('../pages/KitPage')).KitPage }) },
              { path: 'people', lazy: async () => ({ Component: (await import('../pages/PeoplePage')).PeoplePage }) },
              { path: 'trail', lazy: async () => ({ Component: (await import('../pages/TrailPage')).TrailPage }) },
            ],
          },
        ],
      },
    ],
  },
];

export const router = createBrowserRouter([
  {
    errorElement: <PageFault />,
    hydrateFallbackElement: (
      <div className="p-5">
        <Waiting label="The page is on its way" />
      </div>
    ),
    children: pages,
  },
]);
