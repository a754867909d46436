import { useEffect, useId, useState } from 'react';
import { qrModules, qrPath } from './qr-modules.ts';
import type { QrModules } from './qr-modules.ts';

/** Light modules around the code that a camera needs to find it: four, by ISO/IEC 18004. */
const QUIET = 4;
/** Cameras look for dark on light: neither follows the ground. */
const DARK = '#000';
const LIGHT = '#fff';

type State = { of: string; modules: QrModules | null };

/** A QR code with the words that say what it is for. What it holds stands in its place when it can't be drawn. */
export function Qr({ value, label }: { value: string; label: string }) {
  const [drawn, setDrawn] = useState<State | null>(null);
  useEffect(() => {
    let isCurrent = true;
    const take = (modules: QrModules | null) => isCurrent && setDrawn({ of: value, modules });
    qrModules(value).then(take, () => take(null));
    return () => {
      isCurrent = false;
    };
  }, [value]);

  if (drawn?.of === value && !drawn.modules) {
    return (
      <p>
        The code can’t be drawn just now. The address is <b className="break-all">{value}</b>
      </p>
    );
  }
  return <QrPicture modules={drawn?.of === value ? drawn.modules : null} label={label} />;
}

/** The code itself; while it is being made, the light square it will stand on. */
export function QrPicture({ modules, label }: { modules: QrModules | null; label: string }) {
  const caption = useId();
  const side = (modules?.size ?? 1) + 2 * QUIET;
  return (
    <figure className="m-0 w-full max-w-64">
      <svg
        role="img"
        aria-labelledby={caption}
        aria-busy={!modules}
        viewBox={`${-QUIET} ${-QUIET} ${side} ${side}`}
        shapeRendering="crispEdges"
        className="block aspect-square w-full rounded-1 border border-line-strong forced-color-adjust-none"
      >
        <rect x={-QUIET} y={-QUIET} width={side} height={side} fill={LIGHT} />
        {modules ? <path d={qrPath(modules)} fill={DARK} /> : null}
      </svg>
      <figcaption id={caption} className="pt-2 text-center text-lead">
        {label}
      </figcaption>
    </figure>
  );
}
