import type { RunPet } from './nextAction.ts';

/** In words, stops first. They never replace a veterinarian's word. */
export function Cautions({ pet }: { pet: Pick<RunPet, 'cautions' | 'cautionNote'> }) {
  const sorted = pet.cautions.toSorted((a, b) => Number(b.stop) - Number(a.stop));
  if (sorted.length === 0 && !pet.cautionNote) return null;
  return (
    <ul aria-label="Cautions" className="mt-2 grid gap-1.5">
      {pet.cautionNote && <Caution words={pet.cautionNote} stop={false} />}
      {sorted.map((caution) => (
        <Caution key={caution.key} words={caution.words} stop={caution.stop} />
      ))}
    </ul>
  );
}

function Caution({ words, stop }: { words: string; stop: boolean }) {
  return (
    <li
      className={`flex gap-2 rounded-lg px-2.5 py-1.5 text-[15px] leading-snug font-semibold ${
        stop ? 'bg-[#8f2826] text-white' : 'bg-rosette-soft text-[#8f2826]'
      }`}
    >
      <span aria-hidden="true">▲</span>
      <span>
        {stop && <span>Stop: </span>}
        {words}
      </span>
    </li>
  );
}
