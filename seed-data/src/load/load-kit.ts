import type { DemoKit, DemoRevision } from '../demo-types.js';
import { generateFiles } from '../generate-files.js';
import { waitFor, type ShopBrowser } from './shop-browser.js';

interface RevisionAnswer {
  id: string;
  label: string;
  state: string;
  parts: { id: string; code: string; file: { measuring: string; fault: string | null } | null }[];
  gates: { name: string; state: string; reason: string }[];
  release: { state: string; fault: string | null };
}

interface ComparisonAnswer {
  rows: { deviation: { state: string } | null }[];
}

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

  for (const { fileName, bytes } of generateFiles(kit, revision))
    await maker.upload(`${at}/files`, fileName, bytes);
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
  for (const { code, name, quantity, orientation, printSpec: own, voice } of revision.parts) {
    const part = parts.find((one) => one.code === code);
    if (!part) throw new Error(`${kit.name} ${revision.label}: no uploaded file became part ${code}.`);
    await maker.put(`${at}/parts/${part.id}`, { code, name, quantity, orientation, printSpec: own, voice });
  }
  await waitFor(
    'The measuring',
    () => maker.get<RevisionAnswer>(at),
    (one) => one.parts.every(({ file }) => file?.measuring === 'measured' || file?.measuring === 'refused'),
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
