import { createBrowserRouter, Outlet, RouterProvider } from 'react-router-dom';
import { InvitationPage } from './pages/invitation-page.tsx';
import { SetUpPage } from './pages/set-up-page.tsx';
import { SignInPage } from './pages/sign-in-page.tsx';
import { paths } from './paths.ts';

/** The client of a server that serves no place yet: to sign in, and to say which place it is. */
export function SetUpApp() {
  return <RouterProvider router={setUpRouter} />;
}

const setUpRouter = createBrowserRouter([
  {
    element: <SetUpLayout />,
    children: [
      { path: paths.signIn.path, element: <SignInPage /> },
      { path: paths.invitation.path, element: <InvitationPage /> },
      { path: '*', element: <SetUpPage /> },
    ],
  },
]);

function SetUpLayout() {
  return (
    <>
      <header className="border-b border-ink">
        <p className="sheet-width py-3 text-lead font-strong">Noonmark</p>
      </header>
      <main id="main" tabIndex={-1}>
        <Outlet />
      </main>
    </>
  );
}
