import type { ReactNode } from 'react';

export interface Sum {
  label: string;
  value: ReactNode;
}

/** A page's hanging name, a line above it, a few level figures, and what one can do. */
export function PageHead({
  title,
  above,
  sums = [],
  actions,
}: {
  title: ReactNode;
  above?: ReactNode;
  sums?: Sum[];
  actions?: ReactNode;
}) {
  return (
    <div className="dk-head">
      <div>
        <div className="sub">{above}</div>
        <h1 className="t-hang">{title}</h1>
      </div>
      <dl className="dk-sums">
        {sums.map((sum) => (
          <div key={sum.label}>
            <dt>{sum.label}</dt>
            <dd>{sum.value}</dd>
          </div>
        ))}
      </dl>
      <div className="dk-acts no-print">{actions}</div>
    </div>
  );
}

/** The page below the rail. `bead` gives the bead's place along it, in pixels from the left, where the page has a present. */
export function RailPage({ bead, children }: { bead?: number; children: ReactNode }) {
  return (
    <main className="dk" id="main">
      <div className="rail" />
      {bead === undefined ? null : <i className="bead" style={{ left: bead, top: -4 }} />}
      {children}
    </main>
  );
}
