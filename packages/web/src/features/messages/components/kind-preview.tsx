import type { OutputOf } from '@driprail/shared/contracts/endpoint';
import type { previewMessage } from '@driprail/shared/contracts/message-settings.contract';

/** A message as it would be read; its links lead nowhere. */
export function KindPreview({ shown }: { shown: OutputOf<typeof previewMessage> | undefined }) {
  if (!shown)
    return <p className="empty">“Show how it reads” fills the words with the next job’s facts. Nothing is sent.</p>;
  return (
    <section className="ms-shown grid gap-2" aria-label="How it reads">
      <h2 className="sec">
        How it reads <span>{shown.jobNumber === null ? 'sample' : `job ${shown.jobNumber}`}</span>
      </h2>
      <p>
        <b dir="auto">{shown.subject}</b>
      </p>
      <iframe title="The mail" sandbox="" srcDoc={shown.html} />
      <p className="ms-body" dir="auto">
        <span className="t-2">As a text: </span>
        {shown.text}
      </p>
    </section>
  );
}
