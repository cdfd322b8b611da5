const readAll = async (reader: FileSystemDirectoryReader): Promise<FileSystemEntry[]> => {
  const all: FileSystemEntry[] = [];
  // A reader hands entries out in lots, the last of which is empty.
  for (;;) {
    const lot = await new Promise<FileSystemEntry[]>((resolve, reject) =>
      reader.readEntries(resolve, reject),
    );
    if (lot.length === 0) return all;
    all.push(...lot);
  }
};

async function filesIn(entry: FileSystemEntry): Promise<File[]> {
  if (entry.isFile)
    return [
      await new Promise<File>((resolve, reject) => (entry as FileSystemFileEntry).file(resolve, reject)),
    ];
  const entries = await readAll((entry as FileSystemDirectoryEntry).createReader());
  return (await Promise.all(entries.map(filesIn))).flat();
}

/** What system programs leave in folders. */
const isLitter = (file: File) => file.name.startsWith('.') || file.name === 'Thumbs.db';

/** The files of a drop, those in dropped folders too. */
export async function droppedFiles(data: DataTransfer): Promise<File[]> {
  // Entries must be taken before the first await: the browser empties the drop afterwards.
  const entries = [...data.items].flatMap((item) => item.webkitGetAsEntry() ?? []);
  const plain = [...data.files];
  if (!entries.some((entry) => entry.isDirectory)) return plain;
  const files = (await Promise.all(entries.map(filesIn))).flat();
  return files.filter((file) => !isLitter(file));
}

export const holdsFiles = (event: { dataTransfer: DataTransfer | null }): boolean =>
  event.dataTransfer?.types.includes('Files') ?? false;
