import {
  type ProblemBody,
  type ProblemError,
  type ProblemSlug,
  problemTypes,
} from '#shared/contracts/problems';

interface ProblemDetails {
  /** What went wrong here, as one sentence. Default: the title of the type. */
  detail?: string;
  /** What to do about it. Default: the remedy of the type. */
  fix?: string;
  errors?: ProblemError[];
  /** The present state, with `version-stale`. */
  present?: unknown;
  /** Sent as Retry-After. */
  retryAfterSeconds?: number;
}

/** An expected failure of a request; whatever else is thrown answers as `internal`. */
export class Problem extends Error {
  constructor(
    readonly slug: ProblemSlug,
    readonly details: ProblemDetails = {},
  ) {
    super(details.detail ?? problemTypes[slug].title);
    this.name = 'Problem';
  }

  get status(): number {
    return problemTypes[this.slug].status;
  }

  body(requestId: string): ProblemBody {
    const type = problemTypes[this.slug];
    const { detail, fix, errors, present } = this.details;
    return {
      type: `/problems/${this.slug}`,
      title: type.title,
      status: type.status,
      detail: detail ?? `${type.title}.`,
      fix: fix ?? type.fix,
      ...(errors ? { errors } : {}),
      ...(present === undefined ? {} : { present }),
      requestId,
    };
  }
}
