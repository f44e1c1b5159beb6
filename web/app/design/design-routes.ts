import type { RouteObject } from 'react-router-dom';

/** The design system on one page, for developers: the built client leaves it out. */
export const designRoutes: RouteObject[] = import.meta.env.DEV
  ? [
      {
        path: '/design',
        lazy: async () => ({ Component: (await import('./design-page.tsx')).DesignPage }),
      },
    ]
  : [];
