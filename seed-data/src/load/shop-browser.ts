type Json = Record<string, unknown>;

/** A browser of sorts: keeps cookies, sends the shop's own header, fails with the shop's own sentence. */
export class ShopBrowser {
  private readonly cookies = new Map<string, string>();

  constructor(private readonly shopUrl: string) {}

  get<T>(path: string): Promise<T> {
    return this.send<T>('GET', path);
  }

  post<T>(path: string, body: Json = {}): Promise<T> {
    return this.send<T>('POST', path, body);
  }

  put<T>(path: string, body: Json): Promise<T> {
    return this.send<T>('PUT', path, body);
  }

  patch<T>(path: string, body: Json): Promise<T> {
    return this.send<T>('PATCH', path, body);
  }

  /** One file a request, as the workshop's own page sends it. */
  async upload(path: string, fileName: string, bytes: Uint8Array): Promise<void> {
    const form = new FormData();
    form.append('file', new Blob([bytes as Uint8Array<ArrayBuffer>]), fileName);
    await this.read(path, await this.request('POST', path, { body: form }));
  }

  /** Reads a file to its end, so that the shop counts it as fetched. */
  async download(url: string): Promise<number> {
    const response = await this.request('GET', url.replace(/^\/api/, ''), {});
    if (!response.ok) throw new Error(`${url} answered ${response.status}.`);
    return (await response.arrayBuffer()).byteLength;
  }

  private async send<T>(method: string, path: string, body?: Json): Promise<T> {
    const init = body ? { body: JSON.stringify(body), headers: { 'Content-Type': 'application/json' } } : {};
    return this.read<T>(path, await this.request(method, path, init));
  }

  private async request(method: string, path: string, init: RequestInit): Promise<Response> {
    const cookie = [...this.cookies].map(([name, value]) => `${name}=${value}`).join('; ');
    const headers = {
      ...(init.headers as Record<string, string>),
      'X-Windchest': '1',
      ...(cookie ? { Cookie: cookie } : {}),
    };
    const response = await fetch(`${this.shopUrl}/api${path}`, { ...init, method, headers });
    for (const one of response.headers.getSetCookie()) {
      const [name = '', value = ''] = (one.split(';')[0] ?? '').split(/=(.*)/s);
      this.cookies.set(name, value);
    }
    return response;
  }

  private async read<T>(path: string, response: Response): Promise<T> {
    const text = await response.text();
    const answer: unknown = text ? JSON.parse(text) : undefined;
    if (!response.ok)
      throw new Error(
        `${path} answered ${response.status}: ${(answer as { detail?: string } | undefined)?.detail ?? text}`,
      );
    return answer as T;
  }
}

/** Asks again until the answer is as wished. */
export const waitFor = async <T>(
  what: string,
  ask: () => Promise<T>,
  isThere: (answer: T) => boolean,
  seconds = 120,
): Promise<T> => {
  const end = Date.now() + seconds * 1000;
  for (;;) {
    const answer = await ask();
    if (isThere(answer)) return answer;
    if (Date.now() > end) throw new Error(`${what} did not come about within ${seconds} seconds.`);
    await new Promise((resolve) => setTimeout(resolve, 250));
  }
};
