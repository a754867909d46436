import { useState } from 'react';
import { Button } from '../../../components/button.tsx';
import { TextField } from '../../../components/field.tsx';
import { Picks } from '../../../components/picks.tsx';
import { Sheet, SheetFoot } from '../../../components/sheet.tsx';
import type { AtVisit } from '../api/work.queries.ts';
import { usePressWork } from '../api/work.queries.ts';
import { PressFault } from './press-fault.tsx';
import type { WorkView } from './work-view.ts';

const ways = ['Half as much', 'Half again as much', 'Twice as much', 'Not used', 'Another product', 'Ran out'];

/** What was used where it is not the usual amount: pick the product and how much; more words if they help. */
export function UsedSheet({ view, at, onClose }: { view: WorkView; at: AtVisit; onClose: () => void }) {
  const press = usePressWork(at);
  const products = productsOf(view);
  const [product, setProduct] = useState<string | null>(products.length === 1 ? (products[0]?.name ?? null) : null);
  const [way, setWay] = useState('');
  const [more, setMore] = useState('');
  const words = [product, way.toLowerCase(), more.trim()].filter(Boolean).join(', ');
  const lineId = products.find((one) => one.name === product)?.lineId ?? null;
  return (
    <Sheet title="Used otherwise" onClose={onClose} width={460}>
      <div className="ph-sheet">
        {products.length > 0 ? (
          <>
            <h3 className="sec">Product</h3>
            <Picks
              options={products.map((one) => one.name)}
              value={product}
              onPick={setProduct}
              className="grid grid-cols-2 gap-2 my-2"
            />
          </>
        ) : null}
        <h3 className="sec">How much</h3>
        <Picks options={ways} value={way} onPick={setWay} className="grid grid-cols-2 gap-2 my-2" />
        <TextField
          label="More, if it helps"
          value={more}
          maxLength={160}
          onChange={(event) => setMore(event.target.value)}
        />
        <PressFault error={press.error} />
      </div>
      <SheetFoot>
        <Button
          look="main"
          isBusy={press.isPending}
          disabled={way === '' && more.trim() === ''}
          onClick={() => press.mutate({ kind: 'used', lineId, words }, { onSuccess: onClose })}
        >
          Keep what was used
        </Button>
      </SheetFoot>
    </Sheet>
  );
}

/** Each product of the visit's steps once, with the first line that uses it. */
function productsOf({ lines }: WorkView): { name: string; lineId: string }[] {
  const found = new Map<string, string>();
  for (const line of lines)
    for (const step of line.steps) {
      const name = [step.product, step.ratio].filter(Boolean).join(' ');
      if (step.product && !found.has(name)) found.set(name, line.lineId);
    }
  return [...found].map(([name, lineId]) => ({ name, lineId }));
}
