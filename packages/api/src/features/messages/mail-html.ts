/** Colours of the day ground, as in the screens' tokens: mail programs know no custom properties. */
const INK = '#141b18';
const INK_2 = '#38433f';
const GROUND = '#d9dfdd';
const CLAY = '#ad3d14';
const ON_CLAY = '#fff8f4';
const FACE = `font-family:'Roboto Flex Variable','Roboto Flex','Helvetica Neue',Arial,sans-serif`;
const HANG = `font-family:'Roboto Flex Variable','Roboto Flex','Arial Narrow','Helvetica Neue',Arial,sans-serif;font-stretch:30%;font-weight:850;text-transform:uppercase`;
const TABLE = 'role="presentation" cellpadding="0" cellspacing="0" border="0" width="100%"';

export interface MailParts {
  company: string;
  aside: string;
  subject: string;
  body: string;
  link: { url: string; words: string };
  footer: string;
  stop: { url: string; words: string };
}

/** One table with its styles inline and no picture: the rail is a double border, the bead a round cell. */
export function mailHtml({ company, aside, subject, body, link, footer, stop }: MailParts): string {
  const paragraphs = body
    .split(/\n{2,}/)
    .map((part) => `<p style="${FACE};margin:0 0 14px;font-size:16px;line-height:23px;color:${INK}">${lines(part)}</p>`)
    .join('');
  return `<!doctype html><html lang="en"><head><meta charset="utf-8"><meta name="viewport" content="width=device-width, initial-scale=1"><title>${escaped(subject)}</title></head>
<body style="margin:0;background:${GROUND}"><table ${TABLE} bgcolor="${GROUND}" style="background:${GROUND}"><tr><td align="center"><table ${TABLE} style="max-width:560px"><tr><td style="padding:18px 0 22px 18px">
<table ${TABLE}><tr><td dir="auto" style="${HANG};font-size:28px;line-height:28px;color:${INK}">${escaped(company)}</td><td align="right" valign="bottom" style="${FACE};font-size:13px;line-height:17px;color:${INK_2};padding:0 18px 0 12px;white-space:nowrap">${escaped(aside)}</td></tr></table>
<table ${TABLE} style="margin-top:12px"><tr><td style="border-top:5px double ${INK};border-left:5px double ${INK};border-top-left-radius:28px;padding:16px 18px 6px 0"><table ${TABLE}><tr><td width="34" valign="top" style="width:34px;padding-top:10px"><div style="width:17px;height:17px;margin-left:-11px;border-radius:50%;background:${CLAY};font-size:0;line-height:0">&nbsp;</div></td><td dir="auto">
<h1 style="${HANG};margin:0 0 12px;font-size:36px;line-height:36px;color:${INK}">${escaped(subject)}</h1>
${paragraphs}
<table ${TABLE}><tr><td align="center" bgcolor="${CLAY}" style="border-radius:4px"><a href="${escaped(link.url)}" style="${FACE};display:block;padding:15px 12px 16px;font-size:20px;line-height:24px;font-weight:800;text-transform:uppercase;text-decoration:none;color:${ON_CLAY}">${escaped(link.words)}</a></td></tr></table>
<p style="${FACE};margin:16px 0 0;font-size:13px;line-height:19px;color:${INK_2}">${lines(footer)}<br><a href="${escaped(stop.url)}" style="color:${INK_2}">${escaped(stop.words)}</a></p>
</td></tr></table></td></tr></table></td></tr></table></td></tr></table></body></html>`;
}

function lines(text: string): string {
  return escaped(text).replace(/\r?\n/g, '<br>');
}

function escaped(text: string): string {
  return text.replace(/[&<>"']/g, (letter) => `&#${letter.charCodeAt(0)};`);
}
