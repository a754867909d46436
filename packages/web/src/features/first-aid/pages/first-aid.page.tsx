import { useNavigate } from 'react-router';
import { Icon } from '../../../components/icon.tsx';
import { useKeptFacts } from '../components/where-we-are.tsx';
import { firstAid, spill } from '../first-aid.ts';
import type { Steps } from '../first-aid.ts';
import './first-aid.css';

/** The US emergency number and Poison Help, the line of the poison centers (public numbers, from memory). */
const EMERGENCY = '911';
const POISON_HELP = '1-800-222-1222';

/** First help: whom to call, what to say, what to do. Needs neither sign-in nor signal, and comes before dispatch. */
export function FirstAidPage() {
  const { address, company } = useKeptFacts();
  const navigate = useNavigate();
  const number = company?.emergencyNumber ?? EMERGENCY;
  return (
    <main className="ph aid" id="main">
      <header className="aid-head">
        <button type="button" className="btn bare" aria-label="Back" onClick={() => void navigate(-1)}>
          <Icon name="left" />
        </button>
        <h1 className="t-hang">First help</h1>
      </header>
      <a className="ph-main" href={`tel:${number}`}>
        <Icon name="phone" /> Call {number}
      </a>
      <section className="aid-say" aria-label="What to say">
        <h2>Say this</h2>
        {address ? (
          <p className="t-name">{address}</p>
        ) : (
          <p>Where you are: house number, street, town. Look at the mailbox or open the map.</p>
        )}
        <p>A mobile car detailing crew. Who is hurt, how, and by which product. Then stay on the line.</p>
      </section>
      <p className="aid-two">
        <a className="btn" href={`tel:${POISON_HELP}`}>
          Poison Help {POISON_HELP}
        </a>
        {company?.phone ? (
          <a className="btn" href={`tel:${company.phone}`}>
            Then dispatch {company.phone}
          </a>
        ) : null}
      </p>
      {[...firstAid, spill].map((topic) => (
        <Topic key={topic.key} topic={topic} />
      ))}
      <p className="caution">
        <b>Caution.</b> This is common first aid, not medical advice. The people on the emergency line, section 4 of the
        product’s safety data sheet and your own training come before it.
      </p>
    </main>
  );
}

function Topic({ topic: { title, steps } }: { topic: Steps }) {
  return (
    <details className="aid-topic">
      <summary>{title}</summary>
      <ol>
        {steps.map((step) => (
          <li key={step}>{step}</li>
        ))}
      </ol>
    </details>
  );
}
