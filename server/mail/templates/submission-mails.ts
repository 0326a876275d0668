import type { Summary } from '#rules/engine/finding';
import { formatDate } from '#shared/format/dates';
import { type MailContent, mailContent } from './mail-content';

interface Submission {
  project: { number: string; title: string };
  mixDesignation: string;
  revision: number;
  contractor: string;
  agency: string;
  submittedOn: string;
  dueOn: string;
  summary: Summary;
  seal: string;
  /** Where the reader opens it. */
  address: string;
}

/** Receipt to the contractor. */
export function receiptMail(submission: Submission): MailContent {
  return mailContent({
    subject: `${reference(submission)}: received`,
    paragraphs: [
      `${submission.agency} received ${submission.mixDesignation} revision ${submission.revision} for ${submission.project.number}, ${submission.project.title}, on ${formatDate(submission.submittedOn)}.`,
      `An answer is due by ${formatDate(submission.dueOn)}.`,
      `The check of record counts ${tally(submission.summary)}. Its seal is ${submission.seal}.`,
      `Follow it at ${submission.address}`,
    ],
  });
}

/** Word to the reviewers. */
export function reviewWantedMail(submission: Submission): MailContent {
  return mailContent({
    subject: `${reference(submission)}: submitted for review`,
    paragraphs: [
      `${submission.contractor} submitted ${submission.mixDesignation} revision ${submission.revision} for ${submission.project.number}, ${submission.project.title}, on ${formatDate(submission.submittedOn)}.`,
      `The answer is due by ${formatDate(submission.dueOn)}. The check of record counts ${tally(submission.summary)}.`,
      `Open it at ${submission.address}`,
    ],
  });
}

/** Word to a signing engineer that a return is ready. */
export function readyToSignMail({
  mixDesignation,
  revision,
  project,
  preparedBy,
  disposition,
  address,
}: {
  mixDesignation: string;
  revision: number;
  project: { number: string; title: string };
  preparedBy: string;
  disposition: string;
  address: string;
}): MailContent {
  return mailContent({
    subject: `${project.number} / ${mixDesignation} / r${revision}: ready to sign`,
    paragraphs: [
      `${preparedBy} prepared the return of ${mixDesignation} revision ${revision} for ${project.number}, ${project.title}: ${disposition}.`,
      `Open it to decide at ${address}`,
    ],
  });
}

function reference({ project, mixDesignation, revision }: Submission): string {
  return `${project.number} / ${mixDesignation} / r${revision}`;
}

function tally(summary: Summary): string {
  return `${summary.pass} pass, ${summary.fail} fail, ${summary.notShown} not shown, ${summary.undecided} undecided and ${summary.notApplicable} not applicable`;
}
