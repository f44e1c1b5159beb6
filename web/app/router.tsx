import { createBrowserRouter } from 'react-router-dom';
import { Loading } from '../components/loading.tsx';
import { designRoutes } from './design/design-routes.ts';
import { deskCaseRoutes, deskRoutes } from './desk-routes.ts';
import { AppLayout } from './layouts/app-layout.tsx';
import { RequireRole } from './layouts/require-role.tsx';
import { ErrorPage } from './pages/error-page.tsx';
import { HomePage } from './pages/home-page.tsx';
import { NotFoundPage } from './pages/not-found-page.tsx';
import { paths } from './paths.ts';
import { ruleRoutes, ruleTrialRoutes, ruleWritingRoutes } from './rule-routes.ts';

/** The first public page comes with the shell; every other page is loaded when it is opened. */
export const router = createBrowserRouter([
  {
    element: <AppLayout />,
    errorElement: <ErrorPage />,
    HydrateFallback: Loading,
    children: [
      {
        errorElement: <ErrorPage />,
        children: [
          { path: paths.home.path, element: <HomePage /> },
          {
            path: paths.publicCase.path,
            lazy: async () => ({ Component: (await import('./pages/case-page.tsx')).CasePage }),
          },
          {
            path: paths.caseFindings.path,
            lazy: async () => ({
              Component: (await import('./pages/case-findings-page.tsx')).CaseFindingsPage,
            }),
          },
          {
            path: paths.method.path,
            lazy: async () => ({ Component: (await import('./pages/method-page.tsx')).MethodPage }),
          },
          ...ruleRoutes,
          {
            path: paths.signIn.path,
            lazy: async () => ({
              Component: (await import('./pages/sign-in-page.tsx')).SignInPage,
            }),
          },
          {
            path: paths.invitation.path,
            lazy: async () => ({
              Component: (await import('./pages/invitation-page.tsx')).InvitationPage,
            }),
          },
          {
            element: <RequireRole roles={['applicant']} />,
            children: [
              {
                path: paths.applications.path,
                lazy: async () => ({
                  Component: (await import('./pages/applications-page.tsx')).ApplicationsPage,
                }),
              },
              {
                path: paths.newApplication.path,
                lazy: async () => ({
                  Component: (await import('./pages/new-application-page.tsx')).NewApplicationPage,
                }),
              },
              {
                path: paths.application.path,
                lazy: async () => ({
                  Component: (await import('./pages/application-page.tsx')).ApplicationPage,
                }),
              },
            ],
          },
          {
            element: <RequireRole roles={['board', 'planner', 'administrator']} />,
            children: [
              {
                path: paths.hearings.path,
                lazy: async () => ({
                  Component: (await import('./pages/hearings-page.tsx')).HearingsPage,
                }),
              },
              ...deskCaseRoutes,
            ],
          },
          {
            element: <RequireRole roles={['planner', 'administrator']} />,
            children: [...deskRoutes, ...ruleTrialRoutes],
          },
          { element: <RequireRole roles={['administrator']} />, children: ruleWritingRoutes },
          ...designRoutes,
          { path: '*', element: <NotFoundPage /> },
        ],
      },
    ],
  },
]);
