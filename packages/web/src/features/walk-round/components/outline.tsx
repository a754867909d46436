import type { MouseEvent } from 'react';
import type { MarkBody } from '@driprail/shared/contracts/walk-round.contract';
import type { Body } from '@driprail/shared/domain/walk-round/body';
import { bodyNames } from '@driprail/shared/domain/walk-round/body';
import { markKindNames } from '@driprail/shared/domain/walk-round/marks';
import { middleOf, sheetSize } from '@driprail/shared/domain/walk-round/places';
import art from './outlines.svg?url&no-inline';
import { signOf } from './mark-signs.ts';

interface OutlineProps {
  body: Body;
  marks: readonly (MarkBody & { isAddition?: boolean })[];
  /** In thousandths of the sheet; left out, the outline only shows. */
  onPlace?: (x: number, y: number) => void;
}

const wheels = ['left front wheel', 'right front wheel', 'left rear wheel', 'right rear wheel'];

/** A body's outline with its marks, numbered as in the list beside it; marks inside the car stand in the list alone. */
export function Outline({ body, marks, onPlace }: OutlineProps) {
  const place = (event: MouseEvent<SVGSVGElement>) => {
    const box = event.currentTarget.getBoundingClientRect();
    const part = (at: number, from: number, size: number) =>
      Math.min(1000, Math.max(0, Math.round(((at - from) / size) * 1000)));
    onPlace?.(part(event.clientX, box.left, box.width), part(event.clientY, box.top, box.height));
  };
  return (
    <svg
      className={onPlace ? 'wr-car is-open' : 'wr-car'}
      viewBox={`0 0 ${sheetSize.width} ${sheetSize.height}`}
      role="img"
      aria-label={`${bodyNames[body]}: left side, top, right side, front, rear and wheels, with ${marks.length} marks`}
      onClick={onPlace ? place : undefined}
    >
      <use href={`${art}#walk-${body}`} />
      <g className="names" aria-hidden>
        {wheels.map((name, index) => (
          <text key={name} x={43.5 + index * 87} y={556}>
            {name.replace(' wheel', '')}
          </text>
        ))}
      </g>
      {marks.map((mark, index) =>
        middleOf(mark.place) || mark.place === 'elsewhere' ? (
          <MarkOn key={mark.id} mark={mark} number={index + 1} />
        ) : null,
      )}
    </svg>
  );
}

function MarkOn({ mark, number }: { mark: MarkBody & { isAddition?: boolean }; number: number }) {
  const x = (mark.x / 1000) * sheetSize.width;
  const y = (mark.y / 1000) * sheetSize.height;
  // The number stands where there is room.
  const side = x > sheetSize.width - 30 ? -17 : 17;
  const isNew = mark.carriedFrom === null;
  return (
    <g className={`dm${isNew ? ' is-new' : ''}${mark.answer === 'gone' ? ' is-gone' : ''}`}>
      <title>{`${number}, ${markKindNames[mark.kind]}, ${mark.place}`}</title>
      <path transform={`translate(${x - 10} ${y - 10})`} d={signOf[mark.kind]} />
      <circle className="n" cx={x + side} cy={y - 6} r="10" />
      <text x={x + side} y={y - 1.4}>
        {number}
      </text>
    </g>
  );
}
