import { cutTenthsMm } from '#shared/grooming/coatLengths.ts';
import { groomModel } from '#shared/grooming/groomModel.ts';
import type { Region, Style } from '#shared/grooming/types.ts';
import { regionOrder } from './bodyShapes.ts';
import { lengthTint, scissorTint } from './lengthTint.ts';

/**
 * One pattern per region: the tint says how long, the lines with which tool. Blade plain, comb
 * upright lines, scissors the strips' hatch, hand-strip dots; what is not cut stays white.
 */
export function RegionPatterns({ id, cuts }: { id: string; cuts: Style['cuts'] }) {
  return (
    <defs>
      {regionOrder.map((region) => (
        <RegionPattern key={region} id={`${id}-${region}`} region={region} cuts={cuts} />
      ))}
    </defs>
  );
}

function RegionPattern({ id, region, cuts }: { id: string; region: Region; cuts: Style['cuts'] }) {
  const tool = cuts[region]?.tool ?? 'none';
  const length = cutTenthsMm(cuts, region, groomModel);
  if (length === null)
    return (
      <pattern id={id} width="8" height="8" patternUnits="userSpaceOnUse">
        <rect width="8" height="8" fill={tool === 'leave' ? '#fff' : 'var(--cream)'} />
      </pattern>
    );
  const tint = tool === 'scissor' ? scissorTint(length) : lengthTint(length);
  // Lines keep apart from the tint on both ends of the scale.
  const line = length < 70 ? '#cfe3dd' : 'var(--collar)';
  if (tool === 'scissor')
    return (
      <pattern
        id={id}
        width="7"
        height="7"
        patternUnits="userSpaceOnUse"
        patternTransform="rotate(35)"
      >
        <rect width="7" height="7" fill={tint} />
        <rect width="2" height="7" fill="#fdeee2" />
      </pattern>
    );
  return (
    <pattern id={id} width="8" height="8" patternUnits="userSpaceOnUse">
      <rect width="8" height="8" fill={tint} />
      {tool === 'comb' && <rect x="3" width="1.3" height="8" fill={line} />}
      {tool === 'strip' && <circle cx="4" cy="4" r="1.4" fill={line} />}
    </pattern>
  );
}
