import type { Problem, ProblemCode } from '@windchest/contracts';

/** What the API, or the way to it, said no with. Screens switch on `code`. */
export class ApiFault extends Error {
  override readonly name = 'ApiFault';
  readonly status: number;
  readonly code: ProblemCode | 'unreachable';
  readonly title: string;
  readonly detail: string;
  readonly requestId: string | undefined;
  /** Sentences by field path, for forms. */
  readonly fields: Readonly<Record<string, string>>;

  constructor(problem: Partial<Omit<Problem, 'code'>> & { code: ProblemCode | 'unreachable' }) {
    super(problem.detail ?? problem.title ?? problem.code);
    this.status = problem.status ?? 0;
    this.code = problem.code;
    this.title = problem.title ?? 'That did not work';
    this.detail = problem.detail ?? '';
    this.requestId = problem.requestId;
    this.fields = problem.fields ?? {};
  }
}

export const unreachable = () =>
  new ApiFault({
    code: 'unreachable',
    title: 'The workshop cannot be reached',
    detail: 'Nothing was sent or changed. Check the connection and try again.',
  });

/** Reads `application/problem+json`; an answer of another kind comes from something in front of the API. */
export async function faultOf(response: Response): Promise<ApiFault> {
  const requestId = response.headers.get('x-request-id') ?? undefined;
  if (response.headers.get('content-type')?.includes('json')) {
    const problem = (await response.json().catch(() => null)) as Problem | null;
    if (problem?.code) return new ApiFault(problem);
  }
  return new ApiFault({
    status: response.status,
    code: response.status === 404 ? 'not-found' : response.status === 503 ? 'busy-try-again' : 'internal',
    title: 'The workshop did not answer as it should',
    detail: `It answered with status ${response.status}. Try again in a minute.`,
    requestId,
  });
}
