/** Driprail's grounds and rail for a page that comes without the web app; rank by size, as the font has one weight. */
export const STYLE = `
@font-face { font-family: Flex; src: url(/pay/font.woff2) format('woff2'); }
:root {
  color-scheme: light dark;
  --ground: #d9dfdd; --sheet: #f2f5f3; --ink: #141b18; --ink-2: #38433f; --line: #74817c;
  --seal: #10483f; --on-seal: #f1f8f5; --tape: #dcc274; --on-tape: #221c07; --rail: 1px;
}
@media (prefers-color-scheme: dark) {
  :root {
    --ground: #111614; --sheet: #212926; --ink: #e8edea; --ink-2: #bec8c4; --line: #74837d;
    --seal: #185a4c; --on-seal: #f2f9f6; --tape: #cbb05f; --on-tape: #1c1704;
  }
}
@media (prefers-contrast: more) {
  :root {
    color-scheme: light;
    --ground: #fff; --sheet: #fff; --ink: #000; --ink-2: #0c1210; --line: #000;
    --seal: #00332b; --on-seal: #fff; --tape: #ffdf6b; --on-tape: #000; --rail: 2px;
  }
}
* { box-sizing: border-box; }
body {
  margin: 0 auto; max-width: 520px; min-height: 100dvh; display: flex; flex-direction: column;
  background: var(--ground); color: var(--ink);
  font: 17px/24px Flex, system-ui, sans-serif; font-synthesis: none; font-variant-numeric: tabular-nums;
}
html { background: var(--ground); }
.top { display: flex; justify-content: space-between; align-items: baseline; margin: 0; padding: 18px 16px 12px; font-size: 22px; line-height: 26px; }
.top small { font-size: 15px; line-height: 20px; color: var(--ink-2); }
main { position: relative; flex: 1; padding: 24px 16px 24px 46px; display: flex; }
.rail, .rail::after { position: absolute; border: solid var(--ink); border-width: var(--rail) 0 0 var(--rail); border-top-left-radius: 28px; }
.rail { inset: 0 0 0 20px; pointer-events: none; }
.rail::after { content: ''; inset: 4px 0 0 4px; border-top-left-radius: 24px; }
.hung { flex: 1; display: flex; flex-direction: column; }
h1 { margin: 4px 0 2px; font-size: 26px; line-height: 32px; font-weight: 400; text-wrap: balance; overflow-wrap: anywhere; }
.hung > p { margin: 8px 0; color: var(--ink-2); text-wrap: pretty; overflow-wrap: anywhere; }
.hung > .amount { margin: 0 0 12px; font-size: 56px; line-height: 64px; letter-spacing: -0.02em; color: var(--ink); }
.hung > .tape {
  margin: 4px 0 12px -8px; padding: 8px 14px; color: var(--on-tape); background: var(--tape);
  clip-path: polygon(0 0, 4px 18%, 1px 38%, 5px 58%, 2px 78%, 4px 100%, 100% 100%, calc(100% - 5px) 82%, calc(100% - 1px) 60%, calc(100% - 5px) 40%, calc(100% - 2px) 20%, 100% 0);
}
form { margin: auto 0 0 -8px; padding-top: 24px; display: grid; gap: 10px; }
@media (min-width: 700px) { form { margin-top: 0; max-width: 420px; } }
button {
  min-height: 52px; padding: 0 16px; font: inherit; color: var(--ink); background: var(--sheet);
  border: 1.5px solid var(--line); border-radius: 3px; cursor: pointer;
}
button.main { min-height: 68px; font-size: 24px; color: var(--on-seal); background: var(--seal); border-color: var(--seal); }
:focus-visible { outline: 2px solid var(--ink); outline-offset: 2px; border-radius: 2px; }
.hung > .back { margin: 4px 0 0; }
.back a { display: inline-block; padding: 12px 0; color: inherit; text-underline-offset: 2px; }
footer { border-top: 1px solid var(--ink); padding: 12px 16px 20px; }
footer p { margin: 0; font-size: 15px; line-height: 21px; color: var(--ink-2); text-wrap: pretty; }
`;
