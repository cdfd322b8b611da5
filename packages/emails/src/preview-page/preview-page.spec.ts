import { previewPage } from './preview-page.js';
import { sampleMessages } from './sample-messages.js';

describe('the preview page', () => {
  it('shows every sample wide, narrow and as text', () => {
    const page = previewPage();
    for (const { title } of sampleMessages) {
      expect(page).toContain(`<h2>${title}</h2>`);
      expect(page).toContain(`<iframe title="${title}, 680 px"`);
      expect(page).toContain(`<iframe title="${title}, 360 px"`);
    }
    expect(page.match(/<pre>[^<]*You get this because/g)).toHaveLength(sampleMessages.length);
  });
});
