import { Suspense } from 'react';
import { BrowserRouter, Navigate, Outlet, Route, Routes } from 'react-router';
import { Home } from './home.tsx';
import { lazyPage } from './lazy-page.ts';
import { NotFound } from './not-found.tsx';
import { PageBoundary } from './page-boundary.tsx';
import { paths } from './paths.ts';
import { Gate } from './shell/gate.tsx';

const FirstAidPage = lazyPage(
  async () => (await import('../features/first-aid/pages/first-aid.page.tsx')).FirstAidPage,
);
const SignInPage = lazyPage(async () => (await import('../features/access/pages/sign-in.page.tsx')).SignInPage);
const ForgottenPage = lazyPage(async () => (await import('../features/access/pages/forgotten.page.tsx')).ForgottenPage);
const LinkPage = lazyPage(async () => (await import('../features/access/pages/link.page.tsx')).LinkPage);
const SetUpPage = lazyPage(async () => (await import('../features/settings/pages/set-up.page.tsx')).SetUpPage);
const RunSheetPage = lazyPage(
  async () => (await import('../features/run-sheet/pages/run-sheet.page.tsx')).RunSheetPage,
);
const WorkPage = lazyPage(async () => (await import('../features/job-work/pages/work.page.tsx')).WorkPage);
const WalkRoundPage = lazyPage(
  async () => (await import('../features/walk-round/pages/walk-round.page.tsx')).WalkRoundPage,
);
const WalkRecordPage = lazyPage(
  async () => (await import('../features/walk-round/pages/walk-record.page.tsx')).WalkRecordPage,
);
const CollectPage = lazyPage(async () => (await import('../features/billing/pages/collect.page.tsx')).CollectPage);
const CustomerPage = lazyPage(
  async () => (await import('../features/billing/pages/customer-page.page.tsx')).CustomerPage,
);
const MessagesPage = lazyPage(async () => (await import('../features/messages/pages/messages.page.tsx')).MessagesPage);
const MessageSettingsPage = lazyPage(
  async () => (await import('../features/messages/pages/message-settings.page.tsx')).MessageSettingsPage,
);
const UnsubscribePage = lazyPage(
  async () => (await import('../features/messages/pages/unsubscribe.page.tsx')).UnsubscribePage,
);
const BookPage = lazyPage(async () => (await import('../features/online-booking/pages/book.page.tsx')).BookPage);
const OnlineSettingsPage = lazyPage(
  async () => (await import('../features/online-booking/pages/online-settings.page.tsx')).OnlineSettingsPage,
);
const MoneyPage = lazyPage(async () => (await import('../features/billing/pages/money.page.tsx')).MoneyPage);
const CashPage = lazyPage(async () => (await import('../features/billing/pages/cash.page.tsx')).CashPage);
const MoneyDayPage = lazyPage(async () => (await import('../features/billing/pages/money-day.page.tsx')).MoneyDayPage);
const TaxesPage = lazyPage(async () => (await import('../features/billing/pages/taxes.page.tsx')).TaxesPage);
const ClockPage = lazyPage(async () => (await import('../features/run-sheet/pages/clock.page.tsx')).ClockPage);
const Shell = lazyPage(async () => (await import('./shell/shell.tsx')).Shell);
const BoardPage = lazyPage(async () => (await import('../features/board/pages/board.page.tsx')).BoardPage);
const CustomersPage = lazyPage(
  async () => (await import('../features/customers/pages/customers.page.tsx')).CustomersPage,
);
const CustomerDataPage = lazyPage(
  async () => (await import('../features/customers/pages/customer-data.page.tsx')).CustomerDataPage,
);
const ServiceMenuPage = lazyPage(
  async () => (await import('../features/service-menu/pages/service-menu.page.tsx')).ServiceMenuPage,
);
const DuePage = lazyPage(async () => (await import('../features/booking/pages/due.page.tsx')).DuePage);
const VansPage = lazyPage(async () => (await import('../features/people/pages/vans.page.tsx')).VansPage);
const PeoplePage = lazyPage(async () => (await import('../features/people/pages/people.page.tsx')).PeoplePage);
const HoursPage = lazyPage(async () => (await import('../features/people/pages/hours.page.tsx')).HoursPage);
const PayWeekPage = lazyPage(async () => (await import('../features/pay/pages/pay-week.page.tsx')).PayWeekPage);
const PaydaysPage = lazyPage(async () => (await import('../features/pay/pages/paydays.page.tsx')).PaydaysPage);
const PayWorkingPage = lazyPage(
  async () => (await import('../features/pay/pages/pay-working.page.tsx')).PayWorkingPage,
);
const RatesPage = lazyPage(async () => (await import('../features/pay/pages/rates.page.tsx')).RatesPage);
const StatementsPage = lazyPage(async () => (await import('../features/pay/pages/statements.page.tsx')).StatementsPage);
const StatementPage = lazyPage(async () => (await import('../features/pay/pages/statement.page.tsx')).StatementPage);
const SettingsPage = lazyPage(async () => (await import('../features/settings/pages/settings.page.tsx')).SettingsPage);
const LoginsPage = lazyPage(async () => (await import('../features/access/pages/logins.page.tsx')).LoginsPage);
const AccountPage = lazyPage(async () => (await import('../features/access/pages/account.page.tsx')).AccountPage);
const RecordsPage = lazyPage(async () => (await import('../features/records/pages/records.page.tsx')).RecordsPage);
const LocalMailPage = lazyPage(
  async () => (await import('../features/access/pages/local-mail.page.tsx')).LocalMailPage,
);

/** Starts on the crew's page while the session is still asked for; a phone at the door opens it next. */
export function preloadFirstPage(): void {
  const { pathname } = window.location;
  const isPhoneAtTheDoor = pathname === '/' && window.matchMedia('(max-width: 600px)').matches;
  // A page that does not come is fetched again, and told of, when it is shown.
  if (isPhoneAtTheDoor || pathname.startsWith(paths.runSheet)) void RunSheetPage.preload().catch(() => undefined);
}

/**
 * Pages load when they are opened, so that a phone never fetches the board. The plain router is enough, and half the
 * weight of the one with data loading: pages fetch through their queries.
 */
export function Router() {
  return (
    <BrowserRouter>
      <PageBoundary>
        <Suspense>
          <Routes>
            <Route path={paths.firstAid} element={<FirstAidPage />} />
            <Route path={paths.signIn} element={<SignInPage />} />
            <Route path={paths.forgotten} element={<ForgottenPage />} />
            <Route path={paths.link} element={<LinkPage />} />
            <Route path={paths.setUp} element={<SetUpPage />} />
            <Route path={paths.customerPage} element={<CustomerPage />} />
            <Route path={paths.book} element={<BookPage />} />
            <Route path={paths.unsubscribe} element={<UnsubscribePage />} />
            <Route element={<Gate />}>
              <Route path={paths.runSheet} element={<RunSheetPage />} />
              <Route path={`${paths.runSheet}/:day`} element={<RunSheetPage />} />
              <Route path={paths.collect(':day', ':visitId')} element={<CollectPage />} />
              <Route path={`${paths.runSheet}/:day/job/:visitId/:part`} element={<WorkPage />} />
              <Route path={paths.walkRound(':visitId')} element={<WalkRoundPage />} />
              <Route path={paths.clock} element={<ClockPage />} />
              <Route element={<Shelled />}>
                <Route index element={<Home />} />
                <Route path={paths.board} element={<BoardPage />} />
                <Route path={paths.walkRecord(':visitId')} element={<WalkRecordPage />} />
                <Route path={`${paths.board}/:day`} element={<BoardPage />} />
                <Route path={paths.customers} element={<CustomersPage />} />
                <Route path={`${paths.customers}/:id`} element={<CustomersPage />} />
                <Route path={paths.customerData(':id')} element={<CustomerDataPage />} />
                <Route path={paths.dueAgain} element={<DuePage />} />
                <Route path={paths.messages} element={<MessagesPage />} />
                <Route path={paths.messageSettings} element={<MessageSettingsPage />} />
                <Route path={paths.services} element={<ServiceMenuPage />} />
                <Route path={paths.vans} element={<VansPage />} />
                <Route path={paths.people} element={<PeoplePage />} />
                <Route path={paths.hours} element={<HoursPage />} />
                <Route path={paths.payWeeks} element={<PayWeekPage />} />
                <Route path={paths.paydays} element={<PaydaysPage />} />
                <Route path={`${paths.payWeeks}/:day`} element={<PayWeekPage />} />
                <Route path={`${paths.payWeeks}/:day/:personId`} element={<PayWorkingPage />} />
                <Route path={paths.rates} element={<RatesPage />} />
                <Route path={paths.statements} element={<StatementsPage />} />
                <Route path={`${paths.statements}/:day/:personId`} element={<StatementPage />} />
                <Route path={paths.money} element={<MoneyPage />} />
                <Route path={paths.cash} element={<CashPage />} />
                <Route path={paths.moneyDay(':day')} element={<MoneyDayPage />} />
                <Route path={paths.taxes} element={<TaxesPage />} />
                <Route path={paths.onlineBooking} element={<OnlineSettingsPage />} />
                <Route path={paths.settings} element={<SettingsPage />} />
                <Route path={paths.logins} element={<LoginsPage />} />
                <Route path={paths.account} element={<AccountPage />} />
                <Route path={paths.records} element={<RecordsPage />} />
                <Route path={paths.localMail} element={<LocalMailPage />} />
                <Route path="/index.html" element={<Navigate to="/" replace />} />
                <Route path="*" element={<NotFound />} />
              </Route>
            </Route>
          </Routes>
        </Suspense>
      </PageBoundary>
    </BrowserRouter>
  );
}

/** The desk's bar stays while the page below it loads. */
function Shelled() {
  return (
    <Shell>
      <Suspense>
        <Outlet />
      </Suspense>
    </Shell>
  );
}
