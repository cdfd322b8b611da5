import { blockHtml } from './block-html.js';
import type { EmailContent } from './email-content.js';
import type { EmailWorkshop } from './email-message.js';
import { escapeHtml, escapeLink } from './escape-html.js';
import { styleBlock, styles } from './mail-styles.js';
import { texts } from './texts.js';

// Keeps the first words of the body out of the line a mail list shows after the subject.
const preheaderFill = '&#847;&zwnj;&nbsp;'.repeat(60);

function footerHtml({ reason, stop }: EmailContent, workshop: EmailWorkshop): string {
  const line = (html: string): string => `<p class="w-soft" style="${styles.footerText}">${html}</p>`;
  const lines = [line(escapeHtml(reason))];
  if (stop) {
    lines.push(
      line(
        `<a class="w-soft" href="${escapeLink(stop.link)}" style="${styles.softLink}">${escapeHtml(stop.label)}</a>`,
      ),
    );
  }
  if (workshop.replyTo) lines.push(line(escapeHtml(texts.replies(workshop.replyTo))));
  lines.push(line(escapeHtml([workshop.name, workshop.address].filter(Boolean).join(', '))));
  return lines.join('\n');
}

/** The whole document: tables for layout, because mail clients lay out nothing else alike. */
export function renderHtml(content: EmailContent, workshop: EmailWorkshop): string {
  return `<!doctype html>
<html lang="en">
<head>
<meta charset="utf-8">
<meta name="viewport" content="width=device-width, initial-scale=1">
<meta name="color-scheme" content="light dark">
<meta name="supported-color-schemes" content="light dark">
<meta name="format-detection" content="telephone=no, date=no, address=no, email=no">
<title>${escapeHtml(content.subject)}</title>
<style>${styleBlock}</style>
</head>
<body class="w-ground" style="${styles.body}">
<div style="${styles.preheader}">${escapeHtml(content.preheader)}${preheaderFill}</div>
<table role="presentation" width="100%" cellpadding="0" cellspacing="0" border="0"><tr><td class="w-ground" style="${styles.ground}">
<!--[if mso]><table role="presentation" width="600" align="center" cellpadding="0" cellspacing="0" border="0"><tr><td><![endif]-->
<table role="presentation" class="w-sheet" width="100%" align="center" cellpadding="0" cellspacing="0" border="0" style="${styles.sheet}">
<tr><td class="w-side w-rule" style="${styles.masthead}"><a class="w-ink" href="${escapeLink(workshop.baseUrl)}" style="${styles.mastheadLink}">${escapeHtml(workshop.name)}</a></td></tr>
<tr><td class="w-side" style="${styles.content}">
<h1 class="w-ink w-heading" style="${styles.heading}">${escapeHtml(content.heading)}</h1>
${content.blocks.map(blockHtml).join('\n')}
</td></tr>
<tr><td class="w-side w-hairline" style="${styles.footer}">
${footerHtml(content, workshop)}
</td></tr>
</table>
<!--[if mso]></td></tr></table><![endif]-->
</td></tr></table>
</body>
</html>
`;
}
