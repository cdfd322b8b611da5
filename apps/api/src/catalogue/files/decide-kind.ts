import { Refusal } from '../../http/refusal.js';
import { isMeshKind, kindByName, kindNames, nameForKind, type FileKind } from './file-kind.js';
import type { Identity } from './identify-contents.js';

/**
 * What a file counts as, and the name with the ending that fits. The contents decide; only what cannot be
 * told from them and is named as a mesh goes to the measuring room under its name, for that room can say
 * exactly what is wrong with it.
 * @throws Refusal `file-refused` with a sentence that names the file and the fault
 */
export const decideKind = (fileName: string, identity: Identity): { kind: FileKind; fileName: string } => {
  const claimed = kindByName(fileName);
  const isNamedAsMesh = claimed !== null && isMeshKind(claimed);
  if (identity.kind === null) {
    if (identity.isNothingKnown && isNamedAsMesh) return { kind: claimed, fileName };
    throw new Refusal('file-refused', `“${fileName}” ${identity.fault}`);
  }
  if (isNamedAsMesh && !isMeshKind(identity.kind))
    throw new Refusal(
      'file-refused',
      `“${fileName}” is named as a mesh, but its content is ${kindNames[identity.kind]}. Export the mesh again, or name the file for what it is.`,
    );
  return { kind: identity.kind, fileName: nameForKind(fileName, identity.kind) };
};
