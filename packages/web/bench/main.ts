import { print, runBenches } from '../../api/bench/measure.ts';
import { testPostgresFromEnvironment } from '../../api/src/testing/database.ts';
import { benchOpenOffline } from './open-offline.bench.ts';

/** Prints what a browser measures, as ratios of this one run. */
runBenches(async () => print(await benchOpenOffline(testPostgresFromEnvironment())));
