/** Why a filled cell was not used. The list is closed: screens and letters count on these words. */
export const unreadReasons = {
  noRule: 'Nothing in the mapping reads this cell.',
  remark: 'Text beside the readings.',
  average: 'An average of specimens; it is recomputed from them.',
  spread: 'A spread or count of specimens, not a reading.',
  noValue: 'Says that there is no value.',
  leftOut: 'Left out by an answer.',
  saidToBeNone: 'Said not to be a reading.',
  keyInDoubt: 'What it belongs to is in doubt; answer that cell first.',
  limit: 'A limit, target or tolerance, not a reading.',
  otherBasis: 'The same result on another basis.',
  total: 'A total; it is recomputed.',
  difference: 'A difference between two results; it is recomputed.',
  identifier: 'A number that names or counts something.',
  rawData: 'Raw data of a test from which no quantity is read.',
  notRecognised: 'No heading that is known says what this is.',
  hidden: 'Hidden, and nothing in the mapping reads it.',
  comment: 'Only a remark on a cell that holds nothing.',
} as const;

export type UnreadReason = (typeof unreadReasons)[keyof typeof unreadReasons];
