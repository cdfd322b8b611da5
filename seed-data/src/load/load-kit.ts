import { createHash } from 'node:crypto';
import { isDeepStrictEqual } from 'node:util';
import type { DemoKit, DemoPart, DemoRevision } from '../demo-types.js';
import { generateFiles, type GeneratedFile } from '../generate-files.js';
import { waitFor, type ShopBrowser } from './shop-browser.js';

type PartWords = Pick<
  DemoPart,
  'code' | 'name' | 'quantity' | 'orientation' | 'printSpec' | 'voice' | 'isGauge'
>;
interface RevisionAnswer {
  id: string;
  label: string;
  state: string;
  parts: (PartWords & {
    id: string;
    file: { measuring: string } | null;
    variants: { file: { measuring: string } }[];
  })[];
  gates: { name: string; state: string; reason: string }[];
  release: { state: string; fault: string | null };
}

interface ComparisonAnswer {
  rows: { deviation: { state: string } | null }[];
}
const wordsOf = ({ code, name, quantity, orientation, printSpec, voice, isGauge }: PartWords): PartWords => ({
  code,
  name,
  quantity,
  orientation,
  printSpec,
  voice,
  isGauge,
});

const isMeasured = (file: { measuring: string } | null): boolean =>
  file?.measuring === 'measured' || file?.measuring === 'refused';

/** Drafts a kit with its licences. @returns its id */
export const draftKit = async (maker: ShopBrowser, kit: DemoKit): Promise<string> => {
  const { id } = await maker.post<{ id: string }>('/workshop/kits', {
    name: kit.name,
    slug: kit.slug,
    tagline: kit.tagline,
    description: kit.description,
    colour: kit.colour,
  });
  for (const licence of kit.licences)
    await maker.post(`/workshop/kits/${id}/licences`, { ...licence, isOffered: true });
  return id;
};

/** Offers files by their hash first: what an earlier revision has is not sent again. */
const sendFiles = async (maker: ShopBrowser, at: string, files: readonly GeneratedFile[]): Promise<void> => {
  const answers = await maker.post<{ answer: string; detail: string }[]>(`${at}/offers`, {
    files: files.map(({ fileName, bytes }) => ({
      fileName,
      sha256: createHash('sha256').update(bytes).digest('hex'),
      bytes: bytes.length,
    })),
  });
  for (const [index, { fileName, bytes }] of files.entries()) {
    const { answer, detail } = answers[index] ?? { answer: 'refused', detail: 'It was not answered.' };
    if (answer === 'refused') throw new Error(`${fileName}: ${detail}`);
    if (answer === 'send') await maker.upload(`${at}/files`, fileName, bytes);
  }
};

/** Uploads a revision, sets its parts and notes, waits for the measurements, releases it. */
export const releaseRevision = async (
  maker: ShopBrowser,
  kitId: string,
  kit: DemoKit,
  revision: DemoRevision,
): Promise<void> => {
  const isFirst = kit.revisions[0] === revision;
  const previous = kit.revisions[kit.revisions.indexOf(revision) - 1];
  const step = previous && previous.mark !== revision.mark ? 'mark' : 'issue';
  const draft = await maker.post<RevisionAnswer>(`/workshop/kits/${kitId}/revisions`, { step });
  if (draft.label !== revision.label)
    throw new Error(`${kit.name}: the shop starts ${draft.label}, the demo has ${revision.label}.`);
  const at = `/workshop/revisions/${draft.id}`;

  await sendFiles(maker, at, generateFiles(kit, revision));
  const { assemblyNotes, changeNotes, cautions, printSpec, hardware, buildVolume, declaredCents, room } =
    revision;
  await maker.patch(at, {
    assemblyNotes,
    changeNotes,
    cautions,
    printSpec,
    hardware,
    buildVolume,
    declaredCents,
    room,
  });

  const { parts } = await maker.get<RevisionAnswer>(at);
  for (const wanted of revision.parts) {
    const part = parts.find(({ code }) => code === wanted.code);
    if (!part) throw new Error(`${kit.name} ${revision.label}: no uploaded file became part ${wanted.code}.`);
    // Parts that were carried over are what they were.
    const body = wordsOf(wanted);
    if (!isDeepStrictEqual(wordsOf(part), body)) await maker.put(`${at}/parts/${part.id}`, body);
  }
  await waitFor(
    'The measuring',
    () => maker.get<RevisionAnswer>(at),
    (one) =>
      one.parts.every(({ file, variants }) =>
        [file, ...variants.map((variant) => variant.file)].every((each) => isMeasured(each)),
      ),
  );
  await waitFor(
    'The comparing',
    () => maker.get<ComparisonAnswer>(`${at}/comparison`),
    ({ rows }) => rows.every(({ deviation }) => deviation?.state !== 'waiting'),
  );
  if (!isFirst)
    for (const { code, mark, reason } of revision.marks)
      await maker.put(`${at}/marks`, { code, mark, reason });

  const ready = await maker.get<RevisionAnswer>(at);
  const open = ready.gates.filter((gate) => gate.state === 'open');
  if (open.length > 0)
    throw new Error(
      `${kit.name} ${revision.label}: ${open.map((gate) => `${gate.name}: ${gate.reason}`).join('; ')}`,
    );
  await maker.post(`${at}/release`);
  const released = await waitFor(
    'The release',
    () => maker.get<RevisionAnswer>(at),
    (one) => one.state === 'released' || one.release.state === 'failed',
  );
  if (released.release.fault) throw new Error(`${kit.name} ${revision.label}: ${released.release.fault}`);
};
