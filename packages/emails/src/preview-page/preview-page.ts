import { escapeHtml } from '../escape-html.js';
import { lightPalette, darkPalette } from '../palette.js';
import { renderEmail } from '../render-email.js';
import { sampleMessages, sampleWorkshop } from './sample-messages.js';

const pageStyle = `
:root{color-scheme:light dark}
body{margin:0;padding:32px;background:${lightPalette.ground};color:${lightPalette.ink};font:16px/1.5 'Source Sans 3','Segoe UI',sans-serif}
h1,h2{line-height:1.2;margin:0 0 8px} section{border-top:1px solid ${lightPalette.ink};padding:24px 0}
.forms{display:flex;flex-wrap:wrap;gap:24px;align-items:flex-start}
iframe{border:1px solid ${lightPalette.hairline};height:600px;max-width:100%} pre{margin:0;white-space:pre-wrap;overflow-wrap:anywhere;max-width:80ch}
@media (prefers-color-scheme:dark){body{background:${darkPalette.ground};color:${darkPalette.ink}}section{border-color:${darkPalette.ink}}iframe{border-color:${darkPalette.hairline}}}
`.trim();

// The frames take the height of the mail in them, so that a whole mail is seen at once.
const fitFrames = `addEventListener('load', () => {
  for (const frame of document.querySelectorAll('iframe')) {
    frame.style.height = frame.contentDocument.documentElement.scrollHeight + 2 + 'px';
  }
});`;

/** One page with every mail from sample data: wide, narrow and as text. Follows the reader's light or dark. */
export function previewPage(): string {
  const sections = sampleMessages.map(({ title, message }) => {
    const { subject, html, text } = renderEmail(message, sampleWorkshop);
    const frame = (widthPx: number): string =>
      `<iframe title="${escapeHtml(title)}, ${widthPx} px" width="${widthPx}" sandbox="allow-same-origin" srcdoc="${escapeHtml(html)}"></iframe>`;
    return `<section><h2>${escapeHtml(title)}</h2><p>${escapeHtml(message.template)}: ${escapeHtml(subject)}</p><div class="forms">${frame(680)}${frame(360)}<pre>${escapeHtml(text)}</pre></div></section>`;
  });
  return `<!doctype html>
<html lang="en"><head><meta charset="utf-8"><meta name="viewport" content="width=device-width, initial-scale=1"><title>Mails of ${escapeHtml(sampleWorkshop.name)}</title><style>${pageStyle}</style></head>
<body><h1>Every mail, from sample data</h1>
${sections.join('\n')}
<script>${fitFrames}</script></body></html>
`;
}
