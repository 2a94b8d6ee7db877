import type { FinishLevel, Service } from '#shared/grooming/types.ts';

export const serviceWords: Record<Service, string> = {
  bath: 'bath',
  deshed: 'undercoat out',
  nails: 'nails',
  ears: 'ears cleaned',
  sanitary: 'sanitary trim',
  pads: 'pads',
  teeth: 'teeth brushed',
};

export const serviceList = Object.keys(serviceWords) as Service[];

export const finishChoices: readonly { value: FinishLevel; label: string; hint: string }[] = [
  { value: 'tidy', label: 'Tidy', hint: 'Neat and quick.' },
  { value: 'pet', label: 'Pet', hint: 'The usual good finish.' },
  { value: 'full', label: 'Full', hint: 'Every surface finished by hand.' },
];
