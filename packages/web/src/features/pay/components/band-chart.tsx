import { formatDay } from '@driprail/shared/domain/time/format';
import type { Band, BandRow } from './rate-bands.ts';
import type { TimeAxis } from './time-axis.ts';

interface Props {
  axis: TimeAxis;
  today: string;
  rows: BandRow[];
  rules: BandRow[];
  /** The band that a link asked for. */
  askedId: string | null;
}

const stateWords = { past: 'past', now: 'now', next: 'to come' };

/** Start-dated bands: time runs along the rail, one row a rule, the bead is today. */
export function BandChart({ axis, today, rows, rules, askedId }: Props) {
  const now = axis.at(today);
  return (
    <div className="bands-box">
      <div className="yrs" aria-hidden>
        {axis.ticks.map((tick) => (
          <span key={tick.day} style={{ left: `${tick.at}%` }}>
            {tick.label}
          </span>
        ))}
        <i className="bead" style={{ left: `calc(${now}% - 6px)` }} />
        <span className="td" style={{ left: `calc(${now}% + 4px)` }}>
          {formatDay(today).slice(4)}
        </span>
      </div>
      <h2 className="sr">Rates</h2>
      <Rows label="Rates" rows={rows} axis={axis} now={now} askedId={askedId} />
      <h2 className="bands-h" id="rules">
        Company pay rules
      </h2>
      <Rows label="Company pay rules" rows={rules} axis={axis} now={now} askedId={askedId} holdsBefore />
    </div>
  );
}

interface RowsProps extends Pick<Props, 'axis' | 'askedId'> {
  label: string;
  rows: BandRow[];
  now: number;
  /** The first rules hold before their start too; a rate that has not started is none. */
  holdsBefore?: boolean;
}

function Rows({ label, rows, axis, now, askedId, holdsBefore = false }: RowsProps) {
  return (
    <ul className="bands" aria-label={label}>
      {rows.map((row) => (
        <li key={row.key}>
          <h3>
            {row.title}
            <small>{row.note}</small>
          </h3>
          <div className="tr">
            {holdsBefore ? null : <NoneYet band={row.bands[0]} axis={axis} />}
            {row.bands
              .filter((band) => band.to === null || band.to > axis.from)
              .map((band) => {
                const left = holdsBefore && band === row.bands[0] ? 0 : axis.at(band.from);
                const width = axis.at(band.to ?? axis.to) - left;
                return (
                  <div
                    key={band.id}
                    className={`bd2 is-${band.state} ${band.id === askedId ? 'is-asked' : ''}`}
                    style={{ left: `${left}%`, width: `${width}%` }}
                    title={`${band.value}, ${band.note}`}
                  >
                    <b>{band.value}</b>
                    <span>
                      {band.note}
                      <span className="state">, {stateWords[band.state]}</span>
                    </span>
                  </div>
                );
              })}
            <i className="nowl" style={{ left: `${now}%` }} aria-hidden />
          </div>
        </li>
      ))}
    </ul>
  );
}

function NoneYet({ band, axis }: { band: Band | undefined; axis: TimeAxis }) {
  const width = axis.at(band?.from ?? axis.to);
  if (width < 4) return null;
  return (
    <div className="bd2 is-none" style={{ left: 0, width: `${width}%` }}>
      <span>None</span>
    </div>
  );
}
