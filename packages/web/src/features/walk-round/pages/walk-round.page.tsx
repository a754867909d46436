import { useEffect, useState } from 'react';
import { useQuery } from '@tanstack/react-query';
import { Link, useNavigate, useParams } from 'react-router';
import type { WalkSheetDto } from '@driprail/shared/contracts/walk-round.contract';
import { paths } from '../../../app/paths.ts';
import { Icon } from '../../../components/icon.tsx';
import { Empty, Loaded } from '../../../components/states.tsx';
import { Picks } from '../../../components/picks.tsx';
import { useOutbox } from '../../../lib/outbox/outbox.ts';
import { useSession } from '../../../lib/session.tsx';
import { useIsLive } from '../../../lib/socket.ts';
import { useOnline } from '../../../lib/use-online.ts';
import { OutboxLine } from '../../run-sheet/index.ts';
import { useWalkPress } from '../api/use-walk-press.ts';
import { walkSheetQuery } from '../api/walk-round.queries.ts';
import { AfterStart } from '../components/after-start.tsx';
import { BeforeStart } from '../components/before-start.tsx';
import { Finished } from '../components/finished.tsx';
import { withWaiting } from '../components/shown-walk.ts';
import './walk-round.css';

/** The walk-round of a visit on a phone: before work it is made, once work began it stands and is added to. */
export function WalkRoundPage() {
  const { visitId = '' } = useParams();
  const { user } = useSession();
  const sheet = useQuery(walkSheetQuery(user.id, visitId));
  const isOnline = useOnline();
  const isLive = useIsLive();
  useEffect(() => {
    window.scrollTo(0, 0);
  }, []);
  return (
    <main className={isOnline ? 'ph wr' : 'ph wr is-adrift'} id="main">
      <header className="wr-top">
        <Link to={paths.runSheet} aria-label="Back to the run sheet">
          <Icon name="back" />
        </Link>
        <div>
          <h1 className="t-hang">{sheet.data?.customerName ?? 'Walk-round'}</h1>
          {sheet.data ? <p className="t-2">Walk-round, job {sheet.data.jobNumber}</p> : null}
        </div>
      </header>
      <OutboxLine isOnline={isOnline} isLive={isLive} />
      <Loaded query={sheet} what="the walk-round">
        {(data) => <WalkRound kept={data} />}
      </Loaded>
    </main>
  );
}

function WalkRound({ kept }: { kept: WalkSheetDto }) {
  const { user } = useSession();
  const { waiting } = useOutbox();
  const navigate = useNavigate();
  const sheet = withWaiting(kept, waiting, user.name);
  const pressing = useWalkPress(sheet);
  const [index, setIndex] = useState(0);
  const [anew, setAnew] = useState<string | null>(null);
  const car = sheet.cars[index] ?? sheet.cars[0];
  if (!car) return <Empty>This visit has no car yet. Ask dispatch.</Empty>;
  const key = car.vehicleId ?? 'none';
  const draftName = `${user.id}:walk:${sheet.visitId}:${key}`;
  const openCar = sheet.cars.findIndex((other) => other.photoSet !== 'none' && !other.walkRound && other !== car);
  return (
    <>
      {sheet.cars.length > 1 ? (
        <Picks
          options={sheet.cars.map((_car, at) => at)}
          value={index}
          nameOf={(at) => `${sheet.cars[at]?.vehicle || 'Car'}${sheet.cars[at]?.walkRound ? ' ✓' : ''}`}
          onPick={setIndex}
          className="grid grid-cols-2 gap-2 my-2"
        />
      ) : (
        <p className="wr-vehicle">{car.vehicle || 'Car'}</p>
      )}
      {sheet.hasBegun ? (
        <AfterStart key={key} car={car} startReason={sheet.startReason} pressing={pressing} />
      ) : car.walkRound && anew !== key ? (
        <Finished car={car} onAnew={() => setAnew(key)} />
      ) : (
        <BeforeStart
          key={key}
          car={car}
          draftName={draftName}
          pressing={pressing}
          onFinished={() => {
            setAnew(null);
            if (openCar >= 0) setIndex(openCar);
            else void navigate(paths.runSheet);
          }}
        />
      )}
    </>
  );
}
