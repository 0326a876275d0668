import { type ProblemBody, type ProblemError, problemSchema } from '#shared/contracts/problems';

/** What the server refused, with its remedy; also what the network itself could not do. */
export class Problem extends Error {
  readonly slug: string;
  readonly status: number;
  readonly title: string;
  readonly detail: string;
  readonly fix: string;
  readonly errors: ProblemError[];
  readonly requestId: string | null;
  readonly present: unknown;

  constructor(body: Omit<ProblemBody, 'requestId'> & { requestId: string | null }) {
    super(`${body.title}: ${body.detail}`);
    this.name = 'Problem';
    this.slug = body.type.replace(/^.*\//, '');
    this.status = body.status;
    this.title = body.title;
    this.detail = body.detail;
    this.fix = body.fix;
    this.errors = body.errors ?? [];
    this.requestId = body.requestId;
    this.present = body.present;
  }
}

export async function problemFromResponse(response: Response): Promise<Problem> {
  const body: unknown = await response.json().catch(() => null);
  const parsed = problemSchema.safeParse(body);
  if (parsed.success) return new Problem(parsed.data);
  return new Problem({
    type: '/problems/unreadable-answer',
    title: 'The server gave an answer that cannot be read',
    status: response.status,
    detail: `It answered ${response.status} without saying why.`,
    fix: 'Load the page again. If it stays, give the request number to your administrator.',
    requestId: response.headers.get('X-Request-Id'),
  });
}

export function problemFromNetwork(): Problem {
  return new Problem({
    type: '/problems/no-connection',
    title: 'The server did not answer',
    status: 0,
    detail: 'The connection was refused or lost; what you entered is still here.',
    fix: 'Check the connection, then try again.',
    requestId: null,
  });
}

/** What any thrown value becomes on a page: never a stack trace. */
export function asProblem(error: unknown): Problem {
  if (error instanceof Problem) return error;
  return new Problem({
    type: '/problems/page-failed',
    title: 'This page could not be drawn',
    status: 500,
    detail: 'Something went wrong in the browser; nothing was sent or lost on the server.',
    fix: 'Load the page again.',
    requestId: null,
  });
}

/** A problem that the page shows with its remedy is no fault of the page; anything else is. */
export function reportFault(error: unknown): void {
  if (!(error instanceof Problem)) reportError(error);
}
