import { Link } from 'react-router';
import { paths } from '../../../app/paths.ts';
import { Empty } from '../../../components/states.tsx';

/** A visit that left this phone's run sheet while its page was open. */
export function NotYours() {
  return (
    <>
      <h1 className="t-hang">Not yours</h1>
      <Empty>
        This visit is not on your run sheet any more. <Link to={paths.runSheet}>Back to the run sheet</Link>
      </Empty>
    </>
  );
}
