import { useEffect, useRef } from 'react';
import SignaturePad from 'signature_pad';
import { Button } from '../../../components/button.tsx';

/** The pad's own measure; strokes are kept in it, so that they look the same on every screen. */
const PAD = { width: 300, height: 100 };

/** Initials as lines. */
export function Strokes({ strokes }: { strokes: number[][] }) {
  return (
    <svg
      className="wr-initials"
      viewBox={`0 0 ${PAD.width} ${PAD.height}`}
      role="img"
      aria-label="The customer’s initials"
    >
      {strokes.map((stroke, index) => (
        <polyline key={index} points={stroke.join(' ')} />
      ))}
    </svg>
  );
}

/** The customer signs with a finger; what was signed stays until it is cleared. */
export function Signature({
  value,
  onChange,
}: {
  value: number[][] | null;
  onChange: (strokes: number[][] | null) => void;
}) {
  const canvas = useRef<HTMLCanvasElement>(null);
  const pad = useRef<SignaturePad | null>(null);
  const latest = useRef({ value, onChange });
  useEffect(() => {
    latest.current = { value, onChange };
  });
  useEffect(() => {
    const element = canvas.current;
    if (!element) return undefined;
    const ratio = Math.max(1, window.devicePixelRatio);
    const scale = element.offsetWidth / PAD.width;
    element.width = element.offsetWidth * ratio;
    element.height = element.offsetHeight * ratio;
    element.getContext('2d')?.scale(ratio, ratio);
    const made = new SignaturePad(element, { penColor: getComputedStyle(element).color, minWidth: 1.2, maxWidth: 2.6 });
    pad.current = made;
    made.fromData((latest.current.value ?? []).map((stroke) => ({ ...penOf(made), points: pointsOf(stroke, scale) })));
    const onEnd = () => latest.current.onChange(strokesOf(made, scale));
    made.addEventListener('endStroke', onEnd);
    return () => {
      made.removeEventListener('endStroke', onEnd);
      made.off();
    };
  }, []);
  return (
    <div className="wr-sign">
      <canvas ref={canvas} aria-label="The customer signs here" />
      <Button
        disabled={value === null}
        onClick={() => {
          pad.current?.clear();
          onChange(null);
        }}
      >
        Clear
      </Button>
    </div>
  );
}

const tenths = (value: number) => Math.round(value * 10) / 10;

/** A dot is a stroke too: its one point is kept twice. */
function strokesOf(pad: SignaturePad, scale: number): number[][] {
  return pad.toData().map(({ points }) => {
    const [only] = points;
    const all = points.length === 1 && only ? [only, only] : points;
    return all.slice(0, 2000).flatMap(({ x, y }) => [tenths(x / scale), tenths(y / scale)]);
  });
}

function pointsOf(stroke: number[], scale: number) {
  return Array.from({ length: stroke.length / 2 }, (_, at) => ({
    x: (stroke[at * 2] ?? 0) * scale,
    y: (stroke[at * 2 + 1] ?? 0) * scale,
    pressure: 0.5,
    time: at * 10,
  }));
}

function penOf({ penColor, dotSize, minWidth, maxWidth, velocityFilterWeight, compositeOperation }: SignaturePad) {
  return { penColor, dotSize, minWidth, maxWidth, velocityFilterWeight, compositeOperation };
}
