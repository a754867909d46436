import { useQuery } from '@tanstack/react-query';
import { Qr } from '../../../components/qr.tsx';
import { Loaded } from '../../../components/states.tsx';
import { payLinkQuery } from '../api/collect.queries.ts';

/** The customer's own page as a code: the card is given there, on the customer's phone, and never touches this one. */
export function CollectCard({
  jobId,
  customerName,
  phone,
  isOnline,
}: {
  jobId: string;
  customerName: string;
  /** Null outside its hours. */
  phone: string | null;
  isOnline: boolean;
}) {
  const link = useQuery({ ...payLinkQuery(jobId), enabled: isOnline });
  if (!isOnline && !link.data)
    return (
      <p className="tape">
        <b>No signal.</b> A card needs it. Take cash or a check, or leave it: the invoice stays on the customer’s page.
      </p>
    );
  return (
    <Loaded query={link} what="the code">
      {({ url }) => (
        <>
          <div className="grid place-items-center py-2">
            <Qr value={url} label={`${customerName} scans this, adds a tip and pays`} />
          </div>
          {phone ? (
            <a
              className="btn w-full"
              href={`sms:${phone.replace(/[^+\d]/g, '')}?&body=${encodeURIComponent(`Your invoice: ${url}`)}`}
            >
              Text the link instead
            </a>
          ) : null}
          <p className="t-2 py-2">This screen says so when the payment is in.</p>
        </>
      )}
    </Loaded>
  );
}
