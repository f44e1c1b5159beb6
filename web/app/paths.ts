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
  caseFindings: {
    path: '/cases/:reference/findings',
    href: (reference: string) => `/cases/${reference}/findings`,
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
  newRule: {
    path: '/admin/rules/new',
    href: (search?: { from?: string }) => withSearch('/admin/rules/new', search),
  },
  rule: {
    path: '/admin/rules/:id',
    href: (id: string, search?: { against?: string }) => withSearch(`/admin/rules/${id}`, search),
  },
  ruleEdit: { path: '/admin/rules/:id/edit', href: (id: string) => `/admin/rules/${id}/edit` },
  ruleTrial: {
    path: '/admin/rules/:id/trial',
    href: (id: string, search?: { case?: string }) =>
      withSearch(`/admin/rules/${id}/trial`, search),
  },
} as const;

function withSearch(path: string, search: Record<string, string | undefined> = {}): string {
  const parameters = new URLSearchParams();
  for (const [name, value] of Object.entries(search)) {
    if (value !== undefined && value !== '') parameters.set(name, value);
  }
  const text = parameters.toString();
  return text === '' ? path : `${path}?${text}`;
}
