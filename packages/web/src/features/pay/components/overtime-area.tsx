import { useId } from 'react';
import type { AreaDrawing } from './area-drawing.ts';

const WIDTH = 508;
const FLOOR = 172;
const TALLEST = 150;

/** Where area is money: hours along the floor, the rate up the side, the premium hatched on top of the last hours. */
export function OvertimeArea({ drawing }: { drawing: AreaDrawing }) {
  const id = useId();
  const { hours, overtimeHours, layers, regularRate, premium } = drawing;
  const up = (rate: number) => (rate / (regularRate * 1.5)) * TALLEST;
  const top = FLOOR - up(regularRate);
  const roof = FLOOR - TALLEST;
  const from = ((hours - overtimeHours) / hours) * WIDTH;
  const stack = layers.map((layer, index) => {
    const below = layers.slice(0, index).reduce((sum, other) => sum + up(other.rate), 0);
    return { ...layer, height: up(layer.rate), y: FLOOR - below - up(layer.rate), isFirst: index === 0 };
  });
  const thin = stack.filter((layer) => layer.height < 20);
  const labelY = (layer: (typeof stack)[number]) =>
    layer.height < 20 ? top - 8 - 17 * thin.indexOf(layer) : layer.y + layer.height / 2 + 4;
  const isRoomLeft = from > 250;
  return (
    <svg viewBox="0 0 590 196" role="img" aria-label={drawing.description} className="area">
      <defs>
        <pattern id={`${id}h`} width="6" height="6" patternUnits="userSpaceOnUse" patternTransform="rotate(45)">
          <path d="M0 0V6" stroke="var(--dr-ink)" strokeWidth="3" />
        </pattern>
        <pattern id={`${id}d`} width="5" height="5" patternUnits="userSpaceOnUse">
          <circle cx="1.5" cy="1.5" r="1.1" fill="var(--dr-ink-2)" />
        </pattern>
      </defs>
      {stack.map((layer) => (
        <rect
          key={layer.step}
          x="0"
          y={layer.y}
          width={WIDTH}
          height={layer.height}
          fill={layer.isFirst ? 'var(--dr-lane)' : `url(#${id}d)`}
          stroke="var(--dr-ink-2)"
        />
      ))}
      <rect
        x={from}
        y={roof}
        width={WIDTH - from}
        height={top - roof}
        fill={`url(#${id}h)`}
        stroke="var(--dr-ink)"
        strokeWidth="1.5"
      />
      <path
        d={`M${from} ${top}V${FLOOR + 8}M${WIDTH} ${FLOOR}v8M0.5 ${FLOOR}v8`}
        stroke="var(--dr-ink-2)"
        fill="none"
      />
      {stack.map((layer) => (
        <text key={layer.step} x="12" y={labelY(layer)}>
          {`${layer.step}\u2003${layer.label}`}
        </text>
      ))}
      <text
        x={isRoomLeft ? from - 8 : 12}
        y={isRoomLeft ? roof + 7 : roof - 6}
        textAnchor={isRoomLeft ? 'end' : 'start'}
        fontWeight="700"
      >
        {`${premium.step}\u2003${premium.label}`}
      </text>
      <g className="m">
        <text x="0" y={FLOOR + 21}>
          0 h
        </text>
        <text x={from - 4} y={FLOOR + 21} textAnchor="end">
          {Math.round((hours - overtimeHours) * 100) / 100} h
        </text>
        <text x={Math.max(from + 5, WIDTH - 46)} y={FLOOR + 21}>
          {drawing.hoursLabel}
        </text>
        <text x={WIDTH + 9} y={top + 4}>
          {regularRate.toFixed(2)}
        </text>
        <text x={WIDTH + 9} y={FLOOR + 4}>
          0
        </text>
        <text x={WIDTH + 9} y={roof + 6}>
          {(regularRate * 1.5).toFixed(2)}
        </text>
      </g>
    </svg>
  );
}
