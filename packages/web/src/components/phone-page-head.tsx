import type { ReactNode } from 'react';
import { Link } from 'react-router';
import { Icon } from './icon.tsx';
import './phone-page-head.css';

/** The head of a page below the run sheet: the way back, whose it is, and at the right what counts now. */
export function PhonePageHead({
  back,
  title,
  below,
  children,
}: {
  back: string;
  title: string;
  below: string;
  children?: ReactNode;
}) {
  return (
    <header className="ph-top">
      <Link to={back} aria-label="Back to the run sheet">
        <Icon name="back" />
      </Link>
      <div>
        <h1 className="t-hang">{title}</h1>
        <p>{below}</p>
      </div>
      {children}
    </header>
  );
}
