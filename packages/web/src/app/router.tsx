import { Navigate, createBrowserRouter } from 'react-router';
import { Home } from './home.tsx';
import { NotFound, PageFault } from './not-found.tsx';
import { paths } from './paths.ts';
import { Gate } from './shell/gate.tsx';

/** Pages load when they are opened, so that a phone never fetches the board. */
export function createRouter() {
  return createBrowserRouter([
    {
      errorElement: <PageFault />,
      // Pages show their own loading; before the first one there is only the ground.
      HydrateFallback: () => null,
      children: [
        {
          path: paths.signIn,
          lazy: async () => ({ Component: (await import('../features/access/pages/sign-in.page.tsx')).SignInPage }),
        },
        {
          path: paths.forgotten,
          lazy: async () => ({
            Component: (await import('../features/access/pages/forgotten.page.tsx')).ForgottenPage,
          }),
        },
        {
          path: paths.link,
          lazy: async () => ({ Component: (await import('../features/access/pages/link.page.tsx')).LinkPage }),
        },
        {
          path: paths.setUp,
          lazy: async () => ({ Component: (await import('../features/settings/pages/set-up.page.tsx')).SetUpPage }),
        },
        {
          element: <Gate />,
          children: [
            {
              path: paths.runSheet,
              lazy: async () => ({
                Component: (await import('../features/run-sheet/pages/run-sheet.page.tsx')).RunSheetPage,
              }),
            },
            {
              path: `${paths.runSheet}/:day`,
              lazy: async () => ({
                Component: (await import('../features/run-sheet/pages/run-sheet.page.tsx')).RunSheetPage,
              }),
            },
            {
              path: paths.clock,
              lazy: async () => ({ Component: (await import('../features/run-sheet/pages/clock.page.tsx')).ClockPage }),
            },
            {
              lazy: async () => ({ Component: (await import('./shell/shell.tsx')).Shell }),
              children: [
                { index: true, element: <Home /> },
                {
                  path: paths.board,
                  lazy: async () => ({ Component: (await import('../features/board/pages/board.page.tsx')).BoardPage }),
                },
                {
                  path: `${paths.board}/:day`,
                  lazy: async () => ({ Component: (await import('../features/board/pages/board.page.tsx')).BoardPage }),
                },
                {
                  path: paths.customers,
                  lazy: async () => ({
                    Component: (await import('../features/customers/pages/customers.page.tsx')).CustomersPage,
                  }),
                },
                {
                  path: `${paths.customers}/:id`,
                  lazy: async () => ({
                    Component: (await import('../features/customers/pages/customers.page.tsx')).CustomersPage,
                  }),
                },
                {
                  path: paths.services,
                  lazy: async () => ({
                    Component: (await import('../features/service-menu/pages/service-menu.page.tsx')).ServiceMenuPage,
                  }),
                },
                {
                  path: paths.vans,
                  lazy: async () => ({ Component: (await import('../features/people/pages/vans.page.tsx')).VansPage }),
                },
                {
                  path: paths.people,
                  lazy: async () => ({
                    Component: (await import('../features/people/pages/people.page.tsx')).PeoplePage,
                  }),
                },
                {
                  path: paths.hours,
                  lazy: async () => ({
                    Component: (await import('../features/people/pages/hours.page.tsx')).HoursPage,
                  }),
                },
                {
                  path: paths.payWeeks,
                  lazy: async () => ({
                    Component: (await import('../features/pay/pages/pay-week.page.tsx')).PayWeekPage,
                  }),
                },
                {
                  path: paths.paydays,
                  lazy: async () => ({
                    Component: (await import('../features/pay/pages/paydays.page.tsx')).PaydaysPage,
                  }),
                },
                {
                  path: `${paths.payWeeks}/:day`,
                  lazy: async () => ({
                    Component: (await import('../features/pay/pages/pay-week.page.tsx')).PayWeekPage,
                  }),
                },
                {
                  path: `${paths.payWeeks}/:day/:personId`,
                  lazy: async () => ({
                    Component: (await import('../features/pay/pages/pay-working.page.tsx')).PayWorkingPage,
                  }),
                },
                {
                  path: paths.rates,
                  lazy: async () => ({ Component: (await import('../features/pay/pages/rates.page.tsx')).RatesPage }),
                },
                {
                  path: paths.statements,
                  lazy: async () => ({
                    Component: (await import('../features/pay/pages/statements.page.tsx')).StatementsPage,
                  }),
                },
                {
                  path: '/statements/:day/:personId',
                  lazy: async () => ({
                    Component: (await import('../features/pay/pages/statement.page.tsx')).StatementPage,
                  }),
                },
                {
                  path: paths.settings,
                  lazy: async () => ({
                    Component: (await import('../features/settings/pages/settings.page.tsx')).SettingsPage,
                  }),
                },
                {
                  path: paths.logins,
                  lazy: async () => ({
                    Component: (await import('../features/access/pages/logins.page.tsx')).LoginsPage,
                  }),
                },
                {
                  path: paths.account,
                  lazy: async () => ({
                    Component: (await import('../features/access/pages/account.page.tsx')).AccountPage,
                  }),
                },
                {
                  path: paths.records,
                  lazy: async () => ({
                    Component: (await import('../features/records/pages/records.page.tsx')).RecordsPage,
                  }),
                },
                {
                  path: paths.localMail,
                  lazy: async () => ({
                    Component: (await import('../features/access/pages/local-mail.page.tsx')).LocalMailPage,
                  }),
                },
                { path: '/index.html', element: <Navigate to="/" replace /> },
                { path: '*', element: <NotFound /> },
              ],
            },
          ],
        },
      ],
    },
  ]);
}
