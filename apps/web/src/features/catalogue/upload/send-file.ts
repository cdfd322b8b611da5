import { apiAddress } from '../../../lib/api-address.js';
import { ownHeader } from '../../../lib/api-client.js';
import { faultOf, unreachable } from '../../../lib/api-fault.js';

const isSuccess = (status: number) => status >= 200 && status < 300;

const faultOfAnswer = (request: XMLHttpRequest) =>
  faultOf(
    new Response(request.responseText, {
      status: request.status,
      headers: {
        'content-type': request.getResponseHeader('content-type') ?? '',
        'x-request-id': request.getResponseHeader('x-request-id') ?? '',
      },
    }),
  );

/**
 * Sends one file into a revision. By XMLHttpRequest, since `fetch` does not tell how much of a request has gone
 * out. Throws ApiFault.
 */
export function sendFile(
  revisionId: string,
  file: File,
  sha256: string,
  onProgress: (done: number) => void,
): Promise<void> {
  const body = new FormData();
  body.append('file', file, file.name);
  return new Promise((resolve, reject) => {
    const request = new XMLHttpRequest();
    request.open(
      'POST',
      apiAddress('POST /workshop/revisions/:revisionId/files', { params: { revisionId } }),
    );
    request.setRequestHeader('Accept', 'application/json, application/problem+json');
    Object.entries(ownHeader).forEach(([name, value]) => request.setRequestHeader(name, value));
    request.setRequestHeader('X-Content-Sha256', sha256);
    request.upload.onprogress = ({ loaded, total }) => onProgress(total > 0 ? loaded / total : 0);
    request.onload = () => {
      if (isSuccess(request.status)) resolve();
      else void faultOfAnswer(request).then(reject);
    };
    request.onerror = () => reject(unreachable());
    request.onabort = () => reject(unreachable());
    request.send(body);
  });
}
