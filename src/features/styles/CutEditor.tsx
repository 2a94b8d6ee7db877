import { blades, guideCombsTenthsMm, shortestDefaultTenthsMm } from '#shared/grooming/blades.ts';
import type { Region, RegionCut } from '#shared/grooming/types.ts';
import { NumberField } from '#src/components/NumberField.tsx';
import { Segmented } from '#src/components/Segmented.tsx';
import { SelectField } from '#src/components/SelectField.tsx';
import { leavesWords, writeMm } from './cutWords.ts';

type Tool = RegionCut['tool'] | 'none';
type Clipped = Extract<RegionCut, { tool: 'blade' | 'comb' }>;

/** Tool, length and direction of one region. */
export function CutEditor({
  region,
  cut,
  mayBeUntouched,
  onChange,
}: {
  region: Region;
  cut: RegionCut | undefined;
  /** Not where the style cuts the region: a pet's own version can only keep it long. */
  mayBeUntouched: boolean;
  onChange: (cut: RegionCut | null) => void;
}) {
  const tool: Tool = cut?.tool ?? 'none';
  const setTool = (next: Tool) => onChange(next === 'none' ? null : firstCut[next]);
  return (
    <div className="grid gap-3">
      <Segmented<Tool>
        label="Tool"
        choices={tools.filter(({ value }) => value !== 'none' || mayBeUntouched || !cut)}
        value={tool}
        onChange={setTool}
      />
      {cut && (cut.tool === 'blade' || cut.tool === 'comb') && (
        <ClipperFields cut={cut} onChange={onChange} />
      )}
      {cut?.tool === 'scissor' && (
        <NumberField
          key={region}
          label="Length"
          unit="mm"
          decimals={1}
          required={false}
          hint="Empty: by eye, at the usual length of the region."
          value={cut.lengthTenthsMm === null ? null : cut.lengthTenthsMm / 10}
          error={
            cut.lengthTenthsMm !== null && (cut.lengthTenthsMm < 2 || cut.lengthTenthsMm > 1500)
              ? 'must be 0.2 to 150 mm'
              : undefined
          }
          onChange={(mm) =>
            onChange({
              tool: 'scissor',
              lengthTenthsMm: mm === null || Number.isNaN(mm) ? null : Math.round(mm * 10),
            })
          }
        />
      )}
    </div>
  );
}

function ClipperFields({ cut, onChange }: { cut: Clipped; onChange: (cut: RegionCut) => void }) {
  const short = cut.tool === 'blade' && cut.lengthTenthsMm < shortestDefaultTenthsMm;
  return (
    <>
      <SelectField
        label={cut.tool === 'blade' ? 'Blade' : 'Guide comb'}
        choices={lengthChoices(cut)}
        value={String(cut.lengthTenthsMm)}
        onChange={(event) => onChange({ ...cut, lengthTenthsMm: Number(event.target.value) })}
        hint={
          short
            ? '◆ This blade reaches the skin: not on thin or sore skin, and never over mats by force.'
            : undefined
        }
      />
      <Segmented
        label="Direction"
        choices={[
          { value: 'with', label: 'With growth' },
          { value: 'against', label: 'Against growth' },
        ]}
        value={cut.direction}
        hint={leavesWords(cut)}
        onChange={(direction) => onChange({ ...cut, direction })}
      />
    </>
  );
}

const tools: readonly { value: Tool; label: string }[] = [
  { value: 'blade', label: 'Blade' },
  { value: 'comb', label: 'Guide comb' },
  { value: 'scissor', label: 'Scissors' },
  { value: 'strip', label: 'Hand-strip' },
  { value: 'leave', label: 'Keep long' },
  { value: 'none', label: 'Not touched' },
];

/** What a tool begins with: the usual blade and comb of a pet groom. */
const firstCut: Record<RegionCut['tool'], RegionCut> = {
  blade: { tool: 'blade', lengthTenthsMm: 32, direction: 'with' },
  comb: { tool: 'comb', lengthTenthsMm: 130, direction: 'with' },
  scissor: { tool: 'scissor', lengthTenthsMm: null },
  strip: { tool: 'strip' },
  leave: { tool: 'leave' },
};

/** The table's lengths, and the one it has where that is none of them. */
function lengthChoices(cut: Clipped): { value: string; label: string }[] {
  const lengths =
    cut.tool === 'blade' ? blades.map((one) => one.lengthTenthsMm) : guideCombsTenthsMm;
  const all = lengths.includes(cut.lengthTenthsMm) ? lengths : [...lengths, cut.lengthTenthsMm];
  return all
    .toSorted((a, b) => a - b)
    .map((length) => {
      const label = blades.find((one) => one.lengthTenthsMm === length)?.label;
      const mm = `${writeMm(length)} mm`;
      return {
        value: String(length),
        label: cut.tool === 'blade' && label ? `${label} · ${mm}` : mm,
      };
    });
}
