import { faultOf, unreachable } from '../../../lib/api-fault.js';

/** The bytes of a part's preview. Throws ApiFault where they cannot be had. */
export async function loadPreview(address: string): Promise<ArrayBuffer> {
  const response = await fetch(address, { credentials: 'same-origin' }).catch(() => {
    throw unreachable();
  });
  if (!response.ok) throw await faultOf(response);
  return response.arrayBuffer().catch(() => {
    throw unreachable();
  });
}
