import { Link } from 'react-router';
import type { PayLine } from '@driprail/shared/domain/pay/pay-week.types';
import type { Customers } from './ledger.ts';
import { arithmeticParts, numberSteps, stepSources, trueMinus, withCustomer } from './working.ts';

interface Props {
  line: PayLine;
  /** All lines of the person's week, to name the jobs that sources point at. */
  lines: readonly PayLine[];
  customers: Customers;
  /** The owner may open what a figure comes from; the person paid reads the words. */
  hasLinks: boolean;
}

/** How an amount was worked: numbered steps, the arithmetic between words and result. */
export function WorkingSteps({ line, lines, customers, hasLinks }: Props) {
  const steps = numberSteps(line.working);
  return (
    <ol className="chain">
      {steps.map(({ step: plain, number }, index) => {
        const step = withCustomer(plain, line, customers);
        const { note, lead, links } = stepSources(step, line, lines);
        const isLast = index === steps.length - 1;
        return (
          <li key={`${index}:${step.label}`} className={number === null ? 'out' : isLast ? 'last' : ''}>
            <span className="t-hang k" aria-hidden={number === null ? true : undefined}>
              {number}
            </span>
            <div>
              <b>{step.label}</b>
              {note || links.length > 0 ? (
                <small>
                  {hasLinks || note !== '' ? note : step.note}
                  {hasLinks && links.length > 0 ? (
                    <>
                      {note ? '. ' : ''}
                      {lead ? `${lead} ` : ''}
                      {links.map((link, at) => (
                        <span key={link.key}>
                          {at > 0 ? ', ' : ''}
                          {link.to ? <Link to={link.to}>{link.label}</Link> : link.label}
                        </span>
                      ))}
                    </>
                  ) : null}
                </small>
              ) : null}
            </div>
            <span className="ar">
              {arithmeticParts(step.arithmetic).map((part, at) => (
                <span key={`${at}:${part.text}`}>
                  {part.isWord ? <i className={at === 0 ? 'is-first' : ''}>{part.text}</i> : part.text}
                </span>
              ))}
            </span>
            <span className="eq">{trueMinus(step.result)}</span>
          </li>
        );
      })}
    </ol>
  );
}
