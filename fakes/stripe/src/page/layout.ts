import { html, type Markup } from './markup.js';

export function layout(title: string, content: Markup): string {
  return html`<!doctype html>
    <html lang="en">
      <head>
        <meta charset="utf-8" />
        <meta name="viewport" content="width=device-width, initial-scale=1" />
        <meta name="robots" content="noindex" />
        <meta name="color-scheme" content="light dark" />
        <title>${title} · local stand-in</title>
        <link rel="stylesheet" href="/pay/page.css" />
        <link rel="icon" href="data:," />
      </head>
      <body>
        <header>
          <div>
            <h1>This is a local stand-in for a payment page. No money moves.</h1>
            <p>It is part of a development set-up. Never type the number of a real card here.</p>
          </div>
        </header>
        <main>${content}</main>
      </body>
    </html>`.html;
}
