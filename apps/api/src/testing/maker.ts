import { randomUUID } from 'node:crypto';
import type { Comparison, Gate, RevisionDetail, RevisionFile, WorkshopKit } from '@windchest/contracts';
import { writeBinaryStl } from '@windchest/meshes';
import type { Browser, TestApp } from './test-app.js';

const FACES = [
  [0, 2, 1, 0, 3, 2],
  [4, 5, 6, 4, 6, 7],
  [0, 1, 5, 0, 5, 4],
  [1, 2, 6, 1, 6, 5],
  [2, 3, 7, 2, 7, 6],
  [3, 0, 4, 3, 4, 7],
].flat();

const boxCorners = (xMm: number, yMm: number, zMm: number): number[][] =>
  [0, zMm].flatMap((z) => [
    [0, 0, z],
    [xMm, 0, z],
    [xMm, yMm, z],
    [0, yMm, z],
  ]);

/** A closed box as a binary STL, standing on the bed. */
export const boxStl = (xMm: number, yMm: number, zMm: number): Buffer => {
  const corners = boxCorners(xMm, yMm, zMm);
  return Buffer.from(writeBinaryStl(FACES.flatMap((corner) => corners[corner]!)));
};

/** The same box with its top in four triangles about the middle: another geometry hash, the same shape. */
export const fannedBoxStl = (xMm: number, yMm: number, zMm: number): Buffer => {
  const corners = [...boxCorners(xMm, yMm, zMm), [xMm / 2, yMm / 2, zMm]];
  const fan = [4, 5, 8, 5, 6, 8, 6, 7, 8, 7, 4, 8];
  const faces = [...FACES.slice(0, 6), ...fan, ...FACES.slice(12)];
  return Buffer.from(writeBinaryStl(faces.flatMap((corner) => corners[corner]!)));
};

/** A box without its lid. */
export const leakingBoxStl = (xMm: number, yMm: number, zMm: number): Buffer => {
  const corners = boxCorners(xMm, yMm, zMm);
  const faces = [...FACES.slice(0, 6), ...FACES.slice(12)];
  return Buffer.from(writeBinaryStl(faces.flatMap((corner) => corners[corner]!)));
};

/** The same triangles in the other order: other bytes, the same shape. */
export const reExported = (stl: Buffer): Buffer => {
  const triangles = Array.from({ length: (stl.length - 84) / 50 }, (_, at) =>
    stl.subarray(84 + 50 * at, 134 + 50 * at),
  );
  return Buffer.concat([stl.subarray(0, 84), ...triangles.toReversed()]);
};

export const draftKit = async (maker: Browser, name = 'Curlew'): Promise<WorkshopKit> => {
  const slug = `${name.toLowerCase().replaceAll(/[^a-z0-9]+/g, '-')}-${randomUUID().slice(0, 8)}`;
  const { body } = await maker
    .post('/api/workshop/kits')
    .send({ name, slug, tagline: 'A set of stopped pipes', description: 'Eight pipes.', colour: 'teal' })
    .expect(201);
  return body as WorkshopKit;
};

export const offerLicence = async (
  maker: Browser,
  kitId: string,
  priceMinor = 2400,
): Promise<WorkshopKit> => {
  const { body } = await maker
    .post(`/api/workshop/kits/${kitId}/licences`)
    .send({
      kind: 'personal',
      name: 'Personal prints',
      terms: 'Print it for yourself as often as you like.',
      priceMinor,
      yearlyLimit: null,
    })
    .expect(201);
  return body as WorkshopKit;
};

export const startRevision = async (
  maker: Browser,
  kitId: string,
  step: 'issue' | 'mark' = 'issue',
): Promise<RevisionDetail> => {
  const { body } = await maker.post(`/api/workshop/kits/${kitId}/revisions`).send({ step }).expect(201);
  return body as RevisionDetail;
};

export const readRevision = async (maker: Browser, revisionId: string): Promise<RevisionDetail> =>
  (await maker.get(`/api/workshop/revisions/${revisionId}`).expect(200)).body as RevisionDetail;

export const BOUNDARY = 'windchest-test-boundary';

/** A multipart body as browsers write it: the name goes out as it is, paths and all. */
export const multipart = (fileName: string, contents: Buffer | string): Buffer => {
  const escaped = fileName.replace(/[\n\r"]/g, (sign) => encodeURIComponent(sign));
  return Buffer.concat([
    Buffer.from(
      `--${BOUNDARY}\r\nContent-Disposition: form-data; name="file"; filename="${escaped}"\r\nContent-Type: application/octet-stream\r\n\r\n`,
    ),
    Buffer.from(contents),
    Buffer.from(`\r\n--${BOUNDARY}--\r\n`),
  ]);
};

/** Sends one file; answers the response as it came. */
export const sendFile = (maker: Browser, revisionId: string, fileName: string, contents: Buffer | string) =>
  maker
    .post(`/api/workshop/revisions/${revisionId}/files`)
    .set('Content-Type', `multipart/form-data; boundary=${BOUNDARY}`)
    .send(multipart(fileName, contents) as unknown as object);

export const upload = async (
  maker: Browser,
  revisionId: string,
  fileName: string,
  contents: Buffer | string,
): Promise<RevisionFile> =>
  (await sendFile(maker, revisionId, fileName, contents).expect(201)).body as RevisionFile;

export const writeNotes = (maker: Browser, revisionId: string, body: Partial<RevisionDetail>) =>
  maker.patch(`/api/workshop/revisions/${revisionId}`).send(body).expect(200);

export const compare = async (maker: Browser, revisionId: string, withId?: string): Promise<Comparison> =>
  (
    await maker
      .get(`/api/workshop/revisions/${revisionId}/comparison`)
      .query(withId ? { with: withId } : {})
      .expect(200)
  ).body as Comparison;

export const gateOf = (revision: RevisionDetail, name: Gate['name']): Gate =>
  revision.gates.find((gate) => gate.name === name)!;

export const release = async (shop: TestApp, maker: Browser, revisionId: string): Promise<RevisionDetail> => {
  // As the page does: the gates are read, and what they wait for is done.
  await readRevision(maker, revisionId);
  await shop.drain();
  await maker.post(`/api/workshop/revisions/${revisionId}/release`).expect(202);
  await shop.drain();
  return readRevision(maker, revisionId);
};

export interface ReleasedKit {
  readonly kit: WorkshopKit;
  readonly revision: RevisionDetail;
}

/** A kit in the shop, made through the workshop's own routes: two parts, a document, Mk 1.0 released. */
export const releasedKit = async (shop: TestApp, maker: Browser, name = 'Curlew'): Promise<ReleasedKit> => {
  const { id } = await draftKit(maker, name);
  await offerLicence(maker, id);
  const draft = await startRevision(maker, id);
  await upload(maker, draft.id, 'J-01 Locking tongue.stl', boxStl(20, 30, 40));
  await upload(maker, draft.id, 'H-03 Foot.stl', boxStl(60, 60, 12));
  await upload(maker, draft.id, 'Tuning table.md', '# Tuning\n\nC5 first.\n');
  await writeNotes(maker, draft.id, { assemblyNotes: 'Push [[J-01]] into [[H-03]].' });
  await shop.drain();
  const revision = await release(shop, maker, draft.id);
  const { body } = await maker.patch(`/api/workshop/kits/${id}`).send({ isListed: true }).expect(200);
  return { kit: body as WorkshopKit, revision };
};
