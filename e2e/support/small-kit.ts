import { awaitMail, linkIn } from './mailbox.js';

interface Browser {
  get: <T>(path: string) => Promise<T>;
  post: <T>(path: string, body?: object) => Promise<T>;
  put: <T>(path: string, body: object) => Promise<T>;
  patch: <T>(path: string, body: object) => Promise<T>;
  upload: (path: string, fileName: string, bytes: Uint8Array) => Promise<void>;
  download: (url: string) => Promise<number>;
}
interface Seed {
  ShopBrowser: new (url: string) => Browser;
  waitFor: <T>(what: string, ask: () => Promise<T>, isThere: (answer: T) => boolean) => Promise<T>;
}
interface Revision {
  id: string;
  state: string;
  parts: { file: { measuring: string } | null }[];
  gates: { name: string; state: string; reason: string }[];
  release: { fault: string | null };
}
const { ShopBrowser, waitFor } =
  (await import('../../seed-data/dist/load/shop-browser.js')) as unknown as Seed;

export const newBrowser = (): Browser => new ShopBrowser(process.env['WINDCHEST_URL'] ?? '');

const FACES = [
  0, 2, 1, 0, 3, 2, 4, 5, 6, 4, 6, 7, 0, 1, 5, 0, 5, 4, 1, 2, 6, 1, 6, 5, 2, 3, 7, 2, 7, 6, 3, 0, 4, 3, 4, 7,
];

/** A closed box as a binary STL, standing on the bed. */
const box = (heightMm: number): Uint8Array => {
  const corners = [0, heightMm].flatMap((z) => [
    [0, 0, z],
    [20, 0, z],
    [20, 30, z],
    [0, 30, z],
  ]);
  const bytes = new DataView(new ArrayBuffer(84 + 12 * 50));
  bytes.setUint32(80, 12, true);
  FACES.forEach((corner, at) =>
    corners[corner]!.forEach((value, axis) =>
      bytes.setFloat32(84 + Math.floor(at / 3) * 50 + 12 + (at % 3) * 12 + axis * 4, value, true),
    ),
  );
  return new Uint8Array(bytes.buffer);
};

export interface SmallKit {
  readonly maker: Browser;
  readonly id: string;
  readonly slug: string;
  readonly name: string;
}

/** A free kit of small boxes, drafted by the maker. */
export const draftSmallKit = async (
  signIn: { email: string; passphrase: string },
  name: string,
): Promise<SmallKit> => {
  const maker = newBrowser();
  await maker.post('/session', { email: signIn.email, passphrase: signIn.passphrase });
  const slug = `${name.toLowerCase().replaceAll(' ', '-')}-${Date.now()}`;
  const { id } = await maker.post<{ id: string }>('/workshop/kits', {
    name,
    slug,
    tagline: 'Boxes that sound',
    description: 'Three boxes.',
    colour: 'teal',
  });
  await maker.post(`/workshop/kits/${id}/licences`, {
    kind: 'personal',
    name: 'For my own prints',
    terms: 'Print it for yourself.',
    priceMinor: 0,
    yearlyLimit: null,
    isOffered: true,
  });
  return { maker, id, slug, name };
};

export interface BoxPart {
  readonly code: string;
  readonly heightMm: number;
  /** What buyers should do about its change, and why. */
  readonly because?: string;
}

/** Uploads, marks what changed, and releases the next issue of a kit. */
export const releaseBoxes = async (
  { maker, id, slug }: SmallKit,
  parts: readonly BoxPart[],
): Promise<void> => {
  const draft = await maker.post<Revision>(`/workshop/kits/${id}/revisions`, { step: 'issue' });
  const at = `/workshop/revisions/${draft.id}`;
  for (const { code, heightMm } of parts) await maker.upload(`${at}/files`, `${code} Box.stl`, box(heightMm));
  await maker.patch(at, {
    assemblyNotes: `Push [[${parts[0]?.code}]] in.`,
    changeNotes: '## Changed\n\n- What is marked.\n',
    cautions: 'Air the room while you print.',
  });
  await waitFor(
    'The measuring',
    () => maker.get<Revision>(at),
    (one) => one.parts.every(({ file }) => file?.measuring === 'measured'),
  );
  for (const { code, because } of parts)
    if (because) await maker.put(`${at}/marks`, { code, mark: 'reprint needed', reason: because });
  const { gates } = await maker.get<Revision>(at);
  const open = gates.filter((gate) => gate.state === 'open');
  if (open.length > 0) throw new Error(open.map(({ name, reason }) => `${name}: ${reason}`).join('; '));
  await maker.post(`${at}/release`);
  const done = await waitFor(
    'The release',
    () => maker.get<Revision>(at),
    (one) => one.state === 'released' || one.release.fault !== null,
  );
  if (done.release.fault) throw new Error(done.release.fault);
  await maker.patch(`/workshop/kits/${id}`, { isListed: true });
  if (!slug) throw new Error('A kit without an address.');
};

/** Takes the kit without an account and fetches the newest revision by the mailed link: it is held from then on. */
export const takeAsGuest = async ({ slug }: SmallKit, email: string): Promise<void> => {
  const guest = newBrowser();
  const { licences } = await guest.get<{ licences: { id: string }[] }>(`/kits/${slug}`);
  await guest.post('/checkout', {
    items: licences.slice(0, 1).map(({ id }) => ({ licenceId: id })),
    email,
    country: 'DK',
    hasConsented: true,
    attempt: crypto.randomUUID(),
  });
  const token =
    linkIn(await awaitMail(email, /./), '/collect/')
      .split('/')
      .at(-1) ?? '';
  const { kits } = await guest.get<{ kits: { newest: { id: string } }[] }>(`/collect/${token}`);
  const { url } = await guest.post<{ url: string }>(`/collect/${token}/grants`, {
    kitSlug: slug,
    revisionId: kits[0]?.newest.id,
  });
  await guest.download(url);
};
