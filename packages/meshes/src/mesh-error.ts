/** What is wrong with a mesh file. Codes are stable; sentences may be reworded. */
export type MeshErrorCode =
  | 'empty'
  | 'not-an-stl'
  | 'no-triangles'
  | 'too-many-triangles'
  | 'truncated'
  | 'count-mismatch'
  | 'bad-stl-text'
  | 'non-finite-coordinate'
  | 'no-volume'
  | 'not-a-zip'
  | 'unsupported-zip'
  | 'too-many-entries'
  | 'duplicate-entry'
  | 'unsafe-path'
  | 'inflates-too-far'
  | 'crc'
  | 'no-relationships'
  | 'no-model'
  | 'ambiguous-model'
  | 'bad-encoding'
  | 'doctype-forbidden'
  | 'bad-xml'
  | 'bad-model'
  | 'unsupported-extension'
  | 'bad-index'
  | 'unknown-object'
  | 'component-cycle'
  | 'nothing-to-build';

/** A file that cannot be measured. The message is one sentence for people: it names the file and the fault. */
export class MeshError extends Error {
  readonly code: MeshErrorCode;
  readonly fileName: string;

  constructor(code: MeshErrorCode, fileName: string, fault: string) {
    super(`“${fileName}” ${fault}`);
    this.name = 'MeshError';
    this.code = code;
    this.fileName = fileName;
  }
}

/** Makes the errors of one file, so that deep readers need not carry its name around. */
export type Refuse = (code: MeshErrorCode, fault: string) => MeshError;

export function refuser(fileName: string): Refuse {
  return (code, fault) => new MeshError(code, fileName, fault);
}
