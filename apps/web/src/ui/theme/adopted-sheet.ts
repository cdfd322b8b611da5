const sheetsOfComponents = new WeakSet<CSSStyleSheet>();

/**
 * Where Emotion puts its rules. Its own sheet writes `<style>` elements, which `style-src 'self'` blocks even
 * while they are empty; a constructed style sheet is the script's own doing and needs neither nonce nor
 * `unsafe-inline`. Same members as the sheet it stands in for, since Emotion's `Global` makes further ones
 * from its constructor. The build gives it to Emotion in place of its own (`@emotion/sheet` in vite.config.ts).
 */
class AdoptedSheet {
  readonly isSpeedy = true;
  readonly tags: HTMLStyleElement[] = [];
  before: Element | null = null;
  readonly key: string;
  readonly container: Node;
  readonly nonce: string | undefined;
  private readonly rules = new CSSStyleSheet();

  constructor(options: { key: string; container: Node; nonce?: string }) {
    this.key = options.key;
    this.container = options.container;
    this.nonce = options.nonce;
    const isGlobal = options.key.endsWith('-global');
    if (!isGlobal) sheetsOfComponents.add(this.rules);
    // Components' rules stay last: global sheets name the order of the layers.
    const adopted = document.adoptedStyleSheets;
    const before = isGlobal ? adopted.findIndex((sheet) => sheetsOfComponents.has(sheet)) : -1;
    const at = before < 0 ? adopted.length : before;
    document.adoptedStyleSheets = [...adopted.slice(0, at), this.rules, ...adopted.slice(at)];
  }

  hydrate(): void {}

  insert(rule: string): void {
    try {
      this.rules.insertRule(rule, this.rules.cssRules.length);
    } catch {
      // A rule with another browser's vendor selector: this browser does not need it.
    }
  }

  flush(): void {
    document.adoptedStyleSheets = document.adoptedStyleSheets.filter((sheet) => sheet !== this.rules);
  }
}

export { AdoptedSheet as StyleSheet };
