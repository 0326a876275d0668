/** What a rule author should look at: where it is, what is wrong, and what to do. */
export interface LintRemark {
  /** An error bars publishing; a warning asks for a word. */
  level: 'error' | 'warning';
  /** Which check made it, in words of a list. */
  check:
    | 'gap'
    | 'never applies'
    | 'always applies'
    | 'always fails'
    | 'contradiction'
    | 'unused'
    | 'missing source'
    | 'from memory'
    | 'clause used twice'
    | 'rounding'
    | 'no case at the limit'
    | 'case';
  /** `rules/vma`, `tables/vma-min`, `cases/low-voids`. */
  part: string;
  detail: string;
  fix: string;
}
