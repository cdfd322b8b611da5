import { faultOf, unreachable } from './api-fault.js';
import { ownHeader } from './api-client.js';

/** Longer sides are made smaller before a picture is sent: wide enough for any page here. */
const LONGEST_SIDE_PX = 1600;
const QUALITY = 0.85;

/**
 * Draws a picture anew, upright and not larger than needed, so that nothing of what the camera wrote beside it
 * leaves the browser. One that the browser cannot read is sent as it is; the server says what is wrong with it.
 */
const redrawn = async (file: File): Promise<Blob> => {
  const bitmap = await createImageBitmap(file, { imageOrientation: 'from-image' }).catch(() => null);
  if (!bitmap) return file;
  const scale = Math.min(1, LONGEST_SIDE_PX / Math.max(bitmap.width, bitmap.height));
  const canvas = document.createElement('canvas');
  canvas.width = Math.max(1, Math.round(bitmap.width * scale));
  canvas.height = Math.max(1, Math.round(bitmap.height * scale));
  canvas.getContext('2d')?.drawImage(bitmap, 0, 0, canvas.width, canvas.height);
  bitmap.close();
  const type = file.type === 'image/png' && scale === 1 ? 'image/png' : 'image/jpeg';
  return new Promise((resolve) => canvas.toBlob((blob) => resolve(blob ?? file), type, QUALITY));
};

/** Sends one picture to an address of the API. @throws ApiFault */
export async function sendPicture<T>(
  address: string,
  file: File,
  fields: Record<string, string> = {},
): Promise<T> {
  const form = new FormData();
  for (const [name, value] of Object.entries(fields)) form.append(name, value);
  form.append('picture', await redrawn(file), file.name);
  const response = await fetch(address, {
    method: 'POST',
    credentials: 'same-origin',
    headers: { Accept: 'application/json, application/problem+json', ...ownHeader },
    body: form,
  }).catch((): never => {
    throw unreachable();
  });
  if (!response.ok) throw await faultOf(response);
  return (await response.json()) as T;
}
