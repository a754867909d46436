import type { SizeClass } from '@driprail/shared/contracts/fields';
import type { Offer } from '@driprail/shared/domain/job-work/judge-change';
import { formatMinutes } from '@driprail/shared/domain/time/format';
import { money } from '../../../lib/format.ts';

const order = ['add_on', 'single', 'package'] as const;

interface OfferPicksProps {
  offers: Offer[];
  sizeClass: SizeClass;
  pickedId: string | null;
  /** Null opens the list again. */
  onPick: (serviceId: string | null) => void;
}

/** What can be sold for this size class, add-ons first, with price and minutes of one person. */
export function OfferPicks({ offers, sizeClass, pickedId, onPick }: OfferPicksProps) {
  const sold = offers
    .flatMap((offer) => {
      const price = offer.prices.find((one) => one.sizeClass === sizeClass);
      return price ? [{ offer, price }] : [];
    })
    .sort((a, b) => order.indexOf(a.offer.kind) - order.indexOf(b.offer.kind));
  return (
    <>
      <h2 className="sec">From the menu {pickedId ? <span>press it again for another</span> : null}</h2>
      <div className="wk-offers" role="group" aria-label="From the menu">
        {sold
          .filter(({ offer }) => pickedId === null || offer.serviceId === pickedId)
          .map(({ offer, price }) => (
            <button
              key={offer.serviceId}
              type="button"
              className={offer.serviceId === pickedId ? 'btn is-picked' : 'btn'}
              aria-pressed={offer.serviceId === pickedId}
              onClick={() => onPick(offer.serviceId === pickedId ? null : offer.serviceId)}
            >
              <span>{offer.name}</span>
              <span className="t-fig">{money(price.priceCents)}</span>
              <small>
                {formatMinutes(price.minutes)}
                {offer.weather ? `. ${offer.weather}` : ''}
              </small>
            </button>
          ))}
      </div>
    </>
  );
}
