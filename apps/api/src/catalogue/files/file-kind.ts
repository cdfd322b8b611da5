import type { RevisionFile } from '@windchest/contracts';

export type FileKind = RevisionFile['kind'];

/** Kinds that are printed parts and go to the measuring room. STEP is kept as a document: it holds no triangles. */
export const isMeshKind = (kind: FileKind): boolean => kind === 'stl' || kind === '3mf';

/** How a kind is served and named. */
export const contentTypes: Record<FileKind, string> = {
  stl: 'model/stl',
  '3mf': 'model/3mf',
  step: 'model/step',
  pdf: 'application/pdf',
  text: 'text/plain; charset=utf-8',
  png: 'image/png',
  jpeg: 'image/jpeg',
  webp: 'image/webp',
  wav: 'audio/wav',
  mp3: 'audio/mpeg',
  ogg: 'audio/ogg',
  flac: 'audio/flac',
};

const endings: Record<FileKind, readonly string[]> = {
  stl: ['stl'],
  '3mf': ['3mf'],
  step: ['step', 'stp'],
  pdf: ['pdf'],
  text: ['md', 'txt', 'markdown', 'text', 'csv'],
  png: ['png'],
  jpeg: ['jpg', 'jpeg'],
  webp: ['webp'],
  wav: ['wav'],
  mp3: ['mp3'],
  ogg: ['ogg', 'oga', 'opus'],
  flac: ['flac'],
};

export const kindNames: Record<FileKind, string> = {
  stl: 'an STL mesh',
  '3mf': 'a 3MF mesh',
  step: 'a STEP drawing',
  pdf: 'a PDF document',
  text: 'plain text',
  png: 'a PNG picture',
  jpeg: 'a JPEG picture',
  webp: 'a WebP picture',
  wav: 'a WAV sound',
  mp3: 'an MP3 sound',
  ogg: 'an Ogg sound',
  flac: 'a FLAC sound',
};

const endingOf = (fileName: string): string =>
  /\.([A-Za-z0-9]{1,8})$/.exec(fileName)?.[1]?.toLowerCase() ?? '';

/** What a name says it holds; null where it says nothing known. */
export const kindByName = (fileName: string): FileKind | null => {
  const ending = endingOf(fileName);
  return (Object.keys(endings) as FileKind[]).find((kind) => endings[kind].includes(ending)) ?? null;
};

/** The name with the ending that its contents ask for: the content decides, not the name. */
export const nameForKind = (fileName: string, kind: FileKind): string => {
  const claimed = kindByName(fileName);
  if (claimed === kind) return fileName;
  const right = endings[kind][0];
  if (claimed) return `${fileName.slice(0, -endingOf(fileName).length)}${right}`;
  return kind === 'text' ? fileName : `${fileName}.${right}`;
};
