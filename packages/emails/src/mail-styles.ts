import { darkPalette, lightPalette } from './palette.js';

const { ground, sheet, ink, soft, hairline } = lightPalette;
const family = `font-family:'Source Sans 3','Source Sans Pro','Segoe UI',-apple-system,Roboto,Helvetica,Arial,sans-serif`;
const text = (sizePx: number, linePx: number, colour: string, more = ''): string =>
  `${family};font-size:${sizePx}px;line-height:${linePx}px;color:${colour};${more}`;

// Long kit names must not push a narrow screen sideways; the older property is the one mail clients know.
const breakLongWords = 'word-break:break-word;overflow-wrap:anywhere';

/** Inline styles: many mail clients drop the style block, so the light design must stand without it. */
export const styles = {
  body: `margin:0;padding:0;background-color:${ground};-webkit-text-size-adjust:100%`,
  ground: `background-color:${ground};padding:32px 16px`,
  sheet: `max-width:600px;margin:0 auto;background-color:${sheet};border:1px solid ${hairline}`,
  masthead: `${breakLongWords};padding:20px 36px;border-bottom:1px solid ${ink}`,
  mastheadLink: text(18, 24, ink, 'font-weight:700;text-decoration:none'),
  content: `${breakLongWords};padding:32px 36px 36px`,
  heading: text(26, 32, ink, 'font-weight:700;letter-spacing:-0.01em;margin:0 0 16px'),
  paragraph: text(16, 25, ink, 'margin:0 0 16px;max-width:60ch'),
  softParagraph: text(14, 21, soft, 'margin:0 0 16px;max-width:60ch'),
  buttonCell: `background-color:${ink};border-radius:2px`,
  button: text(
    16,
    20,
    sheet,
    `display:inline-block;padding:12px 20px;font-weight:700;text-decoration:none;border:1px solid ${ink};border-radius:2px`,
  ),
  secondaryButton: text(
    16,
    20,
    ink,
    `display:inline-block;padding:12px 20px;font-weight:700;text-decoration:none;border:1px solid ${ink};border-radius:2px`,
  ),
  pastedLink: text(14, 21, soft, 'text-decoration:underline;word-break:break-all'),
  columnHead: text(
    13,
    18,
    soft,
    `padding:0 0 6px;border-bottom:1px solid ${ink};font-weight:400;white-space:nowrap`,
  ),
  cell: text(16, 23, ink, `padding:10px 0;border-bottom:1px solid ${hairline};vertical-align:top`),
  sumCell: text(16, 23, ink, 'padding:6px 0 0;vertical-align:top'),
  softSumCell: text(16, 23, soft, 'padding:6px 0 0;vertical-align:top'),
  totalCell: text(16, 23, ink, 'padding:6px 0 0;vertical-align:top;font-weight:700'),
  printedMark: `display:inline-block;width:18px;height:13px;margin-right:8px;vertical-align:-1px;background-image:repeating-linear-gradient(0deg,transparent 0,transparent 3px,rgba(23,34,50,0.45) 3px,rgba(23,34,50,0.45) 4px)`,
  detail: text(14, 20, soft),
  figure: 'text-align:right;white-space:nowrap;padding-left:16px;font-variant-numeric:tabular-nums',
  quote: `margin:0 0 16px;padding:2px 0 2px 16px;border-left:1px solid ${ink}`,
  subheading: text(20, 26, ink, 'font-weight:700;letter-spacing:-0.005em;margin:24px 0 8px'),
  minorHeading: text(16, 24, ink, 'font-weight:700;margin:20px 0 4px'),
  list: text(16, 25, ink, 'margin:0 0 16px;padding:0 0 0 22px;max-width:60ch'),
  listItem: 'margin:0 0 4px',
  code: `margin:0 0 16px;padding:10px 12px;border:1px solid ${hairline};font-family:Consolas,Menlo,monospace;font-size:14px;line-height:21px;color:${ink};white-space:pre-wrap`,
  rule: `border:0;border-top:1px solid ${hairline};margin:24px 0`,
  picture: 'display:block;width:100%;max-width:526px;height:auto;border:0',
  noteHead: text(14, 21, ink, `font-weight:700;margin:0;padding:16px 0 0;border-top:1px solid ${hairline}`),
  titleBlock: `border:1px solid ${ink};margin-top:20px`,
  titleCell: `padding:8px 12px 9px;vertical-align:top;width:50%`,
  ruleAbove: `border-top:1px solid ${ink}`,
  ruleBefore: `border-left:1px solid ${ink}`,
  titleLabel: text(13, 18, soft),
  titleValue: text(16, 22, ink, 'font-weight:700'),
  footer: `${breakLongWords};padding:20px 36px 24px;border-top:1px solid ${hairline}`,
  footerText: text(13, 19, soft, 'margin:0 0 4px'),
  link: `color:${ink};text-decoration:underline`,
  softLink: `color:${soft};text-decoration:underline`,
  preheader: 'display:none;max-height:0;max-width:0;overflow:hidden;opacity:0;mso-hide:all',
};

const dark = darkPalette;

/** For clients that read it: narrow screens lose the side borders, and night gets its own colours. */
export const styleBlock = `
:root{color-scheme:light dark;supported-color-schemes:light dark}
@media (max-width:620px){
.w-ground{padding:0!important}
.w-sheet{border-left:0!important;border-right:0!important}
.w-side{padding-left:20px!important;padding-right:20px!important}
.w-heading{font-size:24px!important;line-height:29px!important}
}
@media (prefers-color-scheme:dark){
.w-ground{background-color:${dark.ground}!important}
.w-sheet{background-color:${dark.sheet}!important;border-color:${dark.hairline}!important}
.w-ink{color:${dark.ink}!important}
.w-soft{color:${dark.soft}!important}
.w-rule{border-color:${dark.ink}!important}
.w-hairline{border-color:${dark.hairline}!important}
.w-button-cell{background-color:${dark.ink}!important}
.w-button{color:${dark.sheet}!important;border-color:${dark.ink}!important}
}
`.trim();
