export type LetterParts = {
  paragraphs: string[];
  /** Ruled lines of a name and a value. */
  facts?: [string, string][];
  button?: { label: string; url: string };
  /** After the button: what else to know. */
  after?: string[];
  stopUrl?: string;
};

type Foot = { roomName: string | null };

const footLine = ({ roomName }: Foot): string =>
  roomName ? `From ${roomName}, which is kept in Kinwater.` : 'From Kinwater, which keeps fishrooms.';

/** The letter as plain text. */
export function textBody(parts: LetterParts, foot: Foot): string {
  const blocks = [
    ...parts.paragraphs,
    ...(parts.facts ? [parts.facts.map(([name, value]) => `${name}: ${value}`).join('\n')] : []),
    ...(parts.button ? [`${parts.button.label}:\n${parts.button.url}`] : []),
    ...(parts.after ?? []),
    ['-- ', footLine(foot), ...(parts.stopUrl ? [`No more letters like this: ${parts.stopUrl}`] : [])].join('\n'),
  ];
  return `${blocks.join('\n\n')}\n`;
}

const SIGNS: Record<string, string> = { '&': '&amp;', '<': '&lt;', '>': '&gt;', '"': '&quot;', "'": '&#39;' };
const escaped = (text: string): string => text.replace(/[&<>"']/g, (sign) => SIGNS[sign] ?? sign);

const INK = '#0c1c22';
const INK_2 = '#3a4d52';
const RULE = '#b9c6c6';
const FONT = "'Atkinson Hyperlegible Next',Verdana,Arial,sans-serif";

const paragraph = (text: string): string =>
  `<p style="margin:0 0 16px;font-size:17px;line-height:1.5">${escaped(text).replace(/\n/g, '<br>')}</p>`;

const factRow = ([name, value]: [string, string]): string =>
  `<tr><td style="padding:8px 16px 8px 0;vertical-align:top;white-space:nowrap;border-top:1px solid ${RULE};color:${INK_2}">${escaped(name)}</td>` +
  `<td style="padding:8px 0;border-top:1px solid ${RULE};font-weight:bold">${escaped(value)}</td></tr>`;

const buttonOf = ({ label, url }: { label: string; url: string }): string =>
  `<p style="margin:24px 0 8px"><a href="${escaped(url)}" style="display:inline-block;padding:16px 24px;background:${INK};` +
  `color:#ffffff;font-size:17px;font-weight:bold;text-decoration:none;border-radius:2px">${escaped(label)}</a></p>` +
  `<p style="margin:0 0 24px;font-size:13px;color:${INK_2};word-break:break-all">Or open ${escaped(url)}</p>`;

/** The same letter as a page for mail programs: tables and inline styles, no picture, nothing loaded from anywhere. */
export function htmlBody(subject: string, parts: LetterParts, foot: Foot): string {
  const { paragraphs, facts, button, after = [], stopUrl } = parts;
  const stop = stopUrl ? `<br><a href="${escaped(stopUrl)}" style="color:${INK_2}">No more letters like this</a>` : '';
  return [
    '<!doctype html><html lang="en"><head><meta charset="utf-8">',
    '<meta name="viewport" content="width=device-width,initial-scale=1">',
    `<title>${escaped(subject)}</title></head>`,
    `<body style="margin:0;padding:24px 16px;background:#ffffff;color:${INK};font-family:${FONT}">`,
    `<div style="max-width:560px;margin:0 auto"><h1 style="margin:0 0 16px;padding-top:16px;border-top:2px solid ${INK};`,
    `font-size:24px;line-height:1.25">${escaped(subject)}</h1>`,
    ...paragraphs.map(paragraph),
    facts
      ? `<table style="width:100%;border-collapse:collapse;margin:0 0 16px">${facts.map(factRow).join('')}</table>`
      : '',
    button ? buttonOf(button) : '',
    ...after.map(paragraph),
    `<p style="margin:32px 0 0;padding-top:12px;border-top:1px solid ${RULE};font-size:13px;color:${INK_2}">`,
    `${escaped(footLine(foot))}${stop}</p></div></body></html>`,
  ].join('');
}
