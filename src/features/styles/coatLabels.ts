import type { CoatType, Species } from '#shared/grooming/types.ts';

export const coatLabels: Record<Species, readonly { coat: CoatType; label: string }[]> = {
  dog: [
    { coat: 'smooth', label: 'smooth' },
    { coat: 'double', label: 'double' },
    { coat: 'curly', label: 'curly' },
    { coat: 'drop', label: 'drop' },
    { coat: 'wire', label: 'wire' },
    { coat: 'combination', label: 'combination' },
    { coat: 'corded', label: 'corded' },
    { coat: 'hairless', label: 'hairless' },
  ],
  cat: [
    { coat: 'catShort', label: 'short hair' },
    { coat: 'catLong', label: 'long hair' },
    { coat: 'hairless', label: 'hairless' },
  ],
};
