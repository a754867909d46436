import { STYLE } from './pay-page.style.ts';

export interface PageFacts {
  label: string;
  amountCents: number;
  backUrl: string;
}

/** The customer may pay, or play the bank that refuses. */
export function openPage(facts: PageFacts, isRefused: boolean): string {
  const amount = dollars(facts.amountCents);
  const refusal = isRefused
    ? '<p class="tape" role="alert">The card was refused and nothing was taken. Pay tries it again.</p>'
    : '';
  return page(
    'Card payment',
    `<h1>${escaped(facts.label)}</h1>
    <p class="amount">${amount}</p>
    ${refusal}
    <form method="post">
      <button class="main" name="press" value="pay">Pay ${amount}</button>
      <button name="press" value="refuse">Card refused</button>
    </form>
    <p class="back"><a href="${escaped(facts.backUrl)}">Back without paying</a></p>`,
  );
}

export function paidPage(facts: PageFacts): string {
  return page(
    'Paid',
    `<h1>Paid</h1>
    <p class="amount">${dollars(facts.amountCents)}</p>
    <p>${escaped(facts.label)}. There is nothing more to do here.</p>
    <p class="back"><a href="${escaped(facts.backUrl)}">Back to the invoice</a></p>`,
  );
}

export function overPage(facts: PageFacts): string {
  return page(
    'Link ended',
    `<h1>This link has ended</h1>
    <p>${escaped(facts.label)}. Nothing was taken. Go back, where a new link can be asked for.</p>
    <p class="back"><a href="${escaped(facts.backUrl)}">Back to the invoice</a></p>`,
  );
}

export function unknownPage(): string {
  return page(
    'Link not known',
    `<h1>This link is not known</h1>
    <p>The stand-in keeps its links in memory and forgets them when Driprail stops. Open the invoice and press Pay again.</p>`,
  );
}

function page(title: string, body: string): string {
  return `<!doctype html>
<html lang="en">
<head>
<meta charset="utf-8">
<meta name="viewport" content="width=device-width, initial-scale=1">
<title>${title}</title>
<style>${STYLE}</style>
</head>
<body>
<p class="top">Card payment<small>Local stand-in</small></p>
<main>
  <i class="rail" aria-hidden="true"></i>
  <div class="hung">
    ${body}
  </div>
</main>
<footer>
  <p>This page stands in for the payment service on this machine. It asks for no card, and no money moves.</p>
</footer>
</body>
</html>
`;
}

const dollars = (cents: number) =>
  new Intl.NumberFormat('en-US', { style: 'currency', currency: 'USD' }).format(cents / 100);

const entities: Record<string, string> = { '&': '&amp;', '<': '&lt;', '>': '&gt;', '"': '&quot;', "'": '&#39;' };

const escaped = (text: string) => text.replace(/[&<>"']/g, (mark) => entities[mark] ?? mark);
