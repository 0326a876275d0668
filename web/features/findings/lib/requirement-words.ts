import type { Finding } from '#rules/engine/finding';

/** The requirement with its key words set apart: the quantity or document that it is about. */
export function requirementParts({ requirement, title }: Pick<Finding, 'requirement' | 'title'>): {
  before: string;
  key: string;
  after: string;
} {
  const start = requirement.toLowerCase().indexOf(title.toLowerCase());
  if (start >= 0 && start <= 3) {
    const end = start + title.length;
    return {
      before: requirement.slice(0, start),
      key: requirement.slice(start, end),
      after: requirement.slice(end),
    };
  }
  const end = keyEnd.exec(requirement);
  if (!end || end.index > mostKeyCharacters) return { before: '', key: '', after: requirement };
  const article = /^(?:An?|The) /.exec(requirement)?.[0] ?? '';
  return {
    before: article,
    key: requirement.slice(article.length, end.index),
    after: requirement.slice(end.index),
  };
}

/** Where the quantity's name ends and its conditions or its limit begin. */
const keyEnd = /, | (?:is|are|differ|has|have|at|after|on|of stockpile|not older) /;
const mostKeyCharacters = 60;
