import { redirect, type RouteObject } from 'react-router-dom';
import { paths } from './paths.ts';

/** The planner's queue, below RequireRole. */
export const deskRoutes: RouteObject[] = [
  {
    path: paths.desk.path,
    lazy: async () => ({ Component: (await import('./pages/desk/desk-page.tsx')).DeskPage }),
  },
];

/** One case on the desk, which the board reads too; what each may do comes with the case. */
export const deskCaseRoutes: RouteObject[] = [
  {
    path: paths.deskCase.path,
    lazy: async () => ({
      Component: (await import('./pages/desk/desk-case-page.tsx')).DeskCasePage,
    }),
    children: [
      { index: true, loader: () => redirect('intake') },
      {
        path: 'intake',
        lazy: async () => ({
          Component: (await import('./pages/desk/desk-intake-page.tsx')).DeskIntakePage,
        }),
      },
      {
        path: 'study',
        lazy: async () => ({
          Component: (await import('./pages/desk/desk-study-page.tsx')).DeskStudyPage,
        }),
      },
      {
        path: 'findings',
        lazy: async () => ({
          Component: (await import('./pages/desk/desk-findings-page.tsx')).DeskFindingsPage,
        }),
      },
      {
        path: 'comments',
        lazy: async () => ({
          Component: (await import('./pages/desk/desk-comments-page.tsx')).DeskCommentsPage,
        }),
      },
      {
        path: 'report',
        lazy: async () => ({
          Component: (await import('./pages/desk/desk-report-page.tsx')).DeskReportPage,
        }),
      },
      {
        path: 'log',
        lazy: async () => ({
          Component: (await import('./pages/desk/desk-log-page.tsx')).DeskLogPage,
        }),
      },
    ],
  },
];
