/** Pictures that people may send: their contents decide, not their names. */
export type PictureType = 'image/png' | 'image/jpeg' | 'image/webp';

/**
 * What a picture is from its first bytes (PNG: ISO/IEC 15948, 5.2; JPEG: ITU-T T.81, B.1.1.3; WebP: RFC 9649, 2.4).
 * @returns null for everything else
 */
export const pictureTypeOf = (bytes: Buffer): PictureType | null => {
  const has = (signature: string, at = 0): boolean =>
    bytes.subarray(at, at + signature.length).toString('latin1') === signature;
  if (has('\x89PNG\r\n\x1a\n')) return 'image/png';
  if (has('\xff\xd8\xff')) return 'image/jpeg';
  if (has('RIFF') && has('WEBP', 8)) return 'image/webp';
  return null;
};
