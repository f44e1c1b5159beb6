/** Every address of the client: `path` for the router, `href` for links. */
export const paths = {
  home: { path: '/', href: (search?: { q?: string }) => withSearch('/', search) },
  signIn: {
    path: '/sign-in',
    href: (search?: { next?: string }) => withSearch('/sign-in', search),
  },
  invitation: {
    path: '/invitation',
    href: (search?: { token?: string }) => withSearch('/invitation', search),
  },
  method: { path: '/method', href: () => '/method' },
  publicCase: {
    path: '/cases/:reference',
    href: (reference: string, search?: { receptor?: string }) =>
      withSearch(`/cases/${reference}`, search),
  },
  applications: { path: '/applications', href: () => '/applications' },
  newApplication: { path: '/applications/new', href: () => '/applications/new' },
  application: {
    path: '/applications/:reference',
    href: (reference: string) => `/applications/${reference}`,
  },
  desk: { path: '/desk', href: () => '/desk' },
  deskCase: {
    path: '/desk/:reference',
    href: (reference: string, part?: string) =>
      part === undefined ? `/desk/${reference}` : `/desk/${reference}/${part}`,
  },
  hearings: { path: '/hearings', href: () => '/hearings' },
  adminRules: { path: '/admin/rules', href: () => '/admin/rules' },
} as const;

function withSearch(path: string, search: Record<string, string | undefined> = {}): string {
  const parameters = new URLSearchParams();
  for (const [name, value] of Object.entries(search)) {
    if (value !== undefined && value !== '') parameters.set(name, value);
  }
  const text = parameters.toString();
  return text === '' ? path : `${path}?${text}`;
}
