import type { ConditionName } from '#rules/reading/mapping';

/** In the order in which they are asked; a number with the unit that it is given in. */
export const conditionLabels: Record<ConditionName, string> = {
  trial: 'Trial',
  specimen: 'Specimen',
  blend: 'Blend',
  stockpile: 'Stockpile',
  sieve: 'Sieve',
  gyrations: 'Gyrations',
  temperature: 'Temperature, °C',
  time: 'Loading time, s',
  stress: 'Stress, kPa',
  frequency: 'Frequency, Hz',
  passes: 'Passes',
  variant: 'Form of the test',
  aging: 'Aging',
  laboratory: 'Laboratory',
};

export const conditionNames = Object.keys(conditionLabels) as ConditionName[];
