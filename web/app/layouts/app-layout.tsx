import { Suspense } from 'react';
import { Link, Outlet, ScrollRestoration } from 'react-router-dom';
import { Caution } from '../../components/caution.tsx';
import { Loading } from '../../components/loading.tsx';
import { NavLinks } from '../../components/nav-links.tsx';
import { SkipLink } from '../../components/skip-link.tsx';
import { PlaceMark } from '../../features/places/components/place-mark.tsx';
import { useSession } from '../../features/session/api/get-session.ts';
import { SessionMenu } from '../../features/session/components/session-menu.tsx';
import { usePlace } from '../../lib/place-context.ts';
import { paths } from '../paths.ts';
import { navigationFor } from './navigation.ts';

/** The sheet that every page is drawn on: the strip at the head, the page, the limits at the foot. */
export function AppLayout() {
  const { municipality } = usePlace();
  const session = useSession();
  const person = session.data?.person ?? null;
  return (
    <div className="flex min-h-screen flex-col">
      <SkipLink />
      <header className="border-b border-ink">
        <div className="sheet-width flex flex-wrap items-baseline gap-x-6 gap-y-1 py-3">
          <Link to={paths.home.href()} className="flex items-baseline gap-3">
            <span className="self-center">
              <PlaceMark />
            </span>
            <span className="text-lead font-strong">Noonmark</span>
            <span>{municipality.name}</span>
          </Link>
          <div className="no-print flex grow flex-wrap items-baseline justify-end gap-x-5 gap-y-1">
            <NavLinks
              label="Noonmark"
              links={navigationFor(person?.role ?? null)}
              className="me-auto sm:me-0"
            />
            <SessionMenu person={person} isLoading={session.isPending} />
          </div>
        </div>
      </header>
      <main id="main" tabIndex={-1} className="grow pb-16">
        <Suspense fallback={<Loading />}>
          <Outlet />
        </Suspense>
      </main>
      <footer className="border-t border-hairline">
        <div className="sheet-width py-5">
          <Caution methodHref={paths.method.href()} />
        </div>
      </footer>
      <ScrollRestoration getKey={(location) => location.pathname} />
    </div>
  );
}
