import type { CoatType, Species, Temperament } from '#shared/grooming/types.ts';

/** Words of the coat types, as a form offers them. */
export const coatChoices: readonly { value: CoatType; label: string; species: Species }[] = [
  { value: 'smooth', label: 'Smooth', species: 'dog' },
  { value: 'double', label: 'Double, sheds undercoat', species: 'dog' },
  { value: 'curly', label: 'Curly, keeps growing', species: 'dog' },
  { value: 'drop', label: 'Drop: long and falling', species: 'dog' },
  { value: 'wire', label: 'Wire', species: 'dog' },
  { value: 'combination', label: 'Combination: short with feathers', species: 'dog' },
  { value: 'corded', label: 'Corded', species: 'dog' },
  { value: 'hairless', label: 'Hairless', species: 'dog' },
  { value: 'catShort', label: 'Short hair', species: 'cat' },
  { value: 'catLong', label: 'Long hair', species: 'cat' },
  { value: 'hairless', label: 'Hairless', species: 'cat' },
];

export function coatWords(coat: CoatType): string {
  return coatChoices.find((one) => one.value === coat)?.label ?? coat;
}

export const mattingChoices = [
  { value: '0', label: 'None' },
  { value: '1', label: 'Light' },
  { value: '2', label: 'Moderate' },
  { value: '3', label: 'Heavy' },
  { value: '4', label: 'Pelted' },
] as const;

export const undercoatChoices = [
  { value: '0', label: 'Usual' },
  { value: '1', label: 'Shedding' },
  { value: '2', label: 'Blowing coat' },
] as const;

export const soilChoices = [
  { value: '0', label: 'Usual' },
  { value: '1', label: 'Dirty' },
  { value: '2', label: 'Greasy or muddy' },
] as const;

export const temperamentChoices: readonly { value: Temperament; label: string }[] = [
  { value: 'calm', label: 'Calm' },
  { value: 'restless', label: 'Restless' },
  { value: 'anxious', label: 'Anxious' },
  { value: 'nippy', label: 'Nippy' },
];
