import type { FormEventHandler, ReactNode } from 'react';
import { Logo } from '../../../components/logo.tsx';

/** Pages before sign-in: one column hung from the rail. They show nothing of the day's work. */
export function HungForm({
  title,
  company,
  onSubmit,
  children,
}: {
  title: string;
  company?: string;
  onSubmit?: FormEventHandler;
  children: ReactNode;
}) {
  return (
    <div className="door">
      <Logo className="logo" />
      {company ? <p className="co">{company}</p> : null}
      <div className="rail" />
      <i className="bead" />
      <main className="cols" id="main">
        <form className="col" onSubmit={onSubmit} noValidate>
          <h1 className="t-hang">{title}</h1>
          {children}
        </form>
        <div className="col bare" aria-hidden />
        <div className="col bare" aria-hidden />
        <div className="col bare" aria-hidden />
      </main>
    </div>
  );
}
